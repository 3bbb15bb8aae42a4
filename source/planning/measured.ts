/** What was measured at the track beside what the model says there: whether the track is anchored. */
import {mphMps} from '../drivetrain/constants.ts';
import {speedAtRpmMps} from '../drivetrain/tire.ts';
import type {Straight} from '../drivetrain/track.ts';
import {type Candidate, candidateOf, gearboxNamed, onRack} from './candidates.ts';
import type {Plan} from './plan.ts';
import {type PlaceRun, rpmAt, runPlace} from './run-place.ts';

export type MeasuredPoint = {
	/** Index among the track's straights, and the name. */
	readonly index: number;
	readonly straight: string;
	/** At the end of the straight: as measured, else from the measured RPM; undefined where neither can be had. */
	readonly speedMps: number | undefined;
	readonly rpm: number | undefined;
	/** What it was measured with; undefined where the track does not say and the car has nothing installed. */
	readonly candidate: Candidate | undefined;
	/** As given, else the model's gear there. */
	readonly gear: number | undefined;
	/** The model's highest speed and RPM on the straight in the base; undefined where it has no length or does not run. */
	readonly model: {readonly speedMps: number; readonly rpm: number} | undefined;
};

/** How far measured and modeled speed may be apart for the track to count as anchored: 0.2 mph. */
export const anchorToleranceMps = 0.2 * mphMps;

/** Each straight with measured data, in the track's order. */
export function measuredPoints(plan: Plan): MeasuredPoint[] {
	return plan.track.straights.flatMap((straight, index) =>
		straight.measured === undefined ? [] : [measuredPoint(plan, straight, index)],
	);
}

/** At least one measured speed can be compared with the model, and every one that can agrees with it. */
export function isAnchored(points: readonly MeasuredPoint[]): boolean {
	const compared = points.filter(point => point.model !== undefined && point.speedMps !== undefined);
	return compared.length > 0 && compared.every(agrees);
}

export function agrees({model, speedMps}: MeasuredPoint): boolean {
	return Math.abs(model!.speedMps - speedMps!) <= anchorToleranceMps;
}

function measuredPoint(plan: Plan, straight: Straight, index: number): MeasuredPoint {
	const {endMps, rpm, gear} = straight.measured!;
	const candidate = measuredWith(plan, straight);
	const run = candidate && runAlone(plan, candidate, index);
	const ran = run?.state === 'ran' ? run.result : undefined;
	const inGear = gear ?? (run?.state === 'ran' || run?.state === 'held' ? run.result.endGear : undefined);
	return {
		index,
		straight: straight.name,
		speedMps: endMps ?? speedOf(plan, rpm, candidate, inGear),
		rpm,
		candidate,
		gear: inGear,
		model: ran && {speedMps: ran.endSpeedMps, rpm: ran.endRpm},
	};
}

function runAlone(plan: Plan, {train}: Candidate, index: number): PlaceRun {
	const place = plan.base.places[index]!;
	return runPlace(plan.base, place, plan.roads.gearsFor(train)(place.road));
}

function speedOf(plan: Plan, rpm?: number, candidate?: Candidate, gear?: number): number | undefined {
	const overall = candidate?.train.overall[(gear ?? 0) - 1];
	if (rpm === undefined || overall === undefined) return undefined;
	const {rolloutM, growth, slip} = plan.base.vehicle;
	const speedMps = speedAtRpmMps(rpm, overall, rolloutM, growth, slip);
	return Number.isFinite(speedMps) ? speedMps : undefined;
}

/** The pair and set named beside the measurement, else the installed ones, else the only ones there are. */
function measuredWith({car}: Plan, {measured}: Straight): Candidate | undefined {
	const pair = measured?.pair ?? car.installed?.pair ?? only(car.rack.pairs);
	const name = measured?.gearbox ?? car.installed?.gearbox ?? only(car.gearboxes)?.name;
	const mounted = pair && onRack(car, pair);
	const gearbox = name === undefined ? undefined : gearboxNamed(car, name);
	return mounted && gearbox && candidateOf(car, mounted, gearbox);
}

function only<T>(list: readonly T[]): T | undefined {
	return list.length === 1 ? list[0] : undefined;
}

/** The measured points as readings of a row: the measured speed in its own end gear, and the RPM seen with this very pair. */
export function measuredRpm(plan: Plan, point: MeasuredPoint, row: Candidate, endGear: number): number | undefined {
	const {speedMps, rpm, candidate} = point;
	const overall = row.train.overall[endGear - 1]!;
	const atSpeed = speedMps === undefined ? undefined : rpmAt(plan.base.vehicle, overall, speedMps);
	const seen = rpm !== undefined && candidate && sameRow(candidate, row) ? rpm : undefined;
	return seen === undefined ? atSpeed : Math.max(seen, atSpeed ?? 0);
}

export function sameRow(one: Candidate, other: Candidate): boolean {
	return one.pairName === other.pairName && one.gearbox.name === other.gearbox.name;
}
