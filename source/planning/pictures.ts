/** The numbers behind the pictures of a row: RPM and forces over speed in every gear, and the run along a straight. */
import {gripLimitN, resistanceN} from '../drivetrain/forces.ts';
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {speedTrace, type TracePoint} from '../drivetrain/speed-trace.ts';
import type {Ground} from './checks/check.ts';
import type {PlaceRun} from './run-place.ts';
import type {RowRun, SituationRun} from './run-row.ts';

/** `[speed in m/s, RPM or N]`. */
export type Curve = readonly (readonly [number, number])[];

export type GearCurves = {
	/** Gear 1 first. */
	readonly rpm: readonly Curve[];
	readonly thrustN: readonly Curve[];
	readonly resistanceN: Curve;
	/** What the driven tires can hold. */
	readonly gripN: Curve;
};

/** Points of a curve; more than a terminal has dots across. */
const samples = 160;

/** The straight of that number in a situation of a row that has been run. */
function placeIn(
	run: RowRun,
	situation: string,
	straight: number,
): {place: PlaceRun; within: SituationRun} | undefined {
	const within = run.situations.find(({condition}) => condition.name === situation) ?? run.situations[0];
	const place = within?.places[straight];
	return within === undefined || place === undefined ? undefined : {place, within};
}

/** In every gear from standstill to the limiter; undefined where there is no such straight. */
export function gearCurves(run: RowRun, ground: Ground, situation: string, straight: number): GearCurves | undefined {
	const found = placeIn(run, situation, straight);
	if (found === undefined) return undefined;
	const gears = gearsOn(run, ground, found.place);
	const motions = run.candidate.train.overall.map((_, i) => gears.motion(i + 1));
	const fastestMps = Math.max(...motions.map(({limiterMps}) => limiterMps).filter(Number.isFinite));
	return {
		rpm: motions.map(motion => curve(motion.limiterMps, speed => motion.rpmAt(speed))),
		thrustN: motions.map(motion => curve(motion.limiterMps, speed => motion.thrustN(speed))),
		resistanceN: curve(fastestMps, speed => resistanceN(gears.forces, speed)),
		gripN: curve(fastestMps, speed => gripLimitN(gears.forces, speed)),
	};
}

/** Speed and time along a straight; undefined where the car does not run there, or where it has no length. */
export function traceOf(run: RowRun, ground: Ground, situation: string, straight: number): TracePoint[] | undefined {
	const found = placeIn(run, situation, straight);
	if (found?.place.sequence === undefined || found.place.course === undefined) return undefined;
	return speedTrace(gearsOn(run, ground, found.place), found.place.course, found.place.sequence, samples);
}

function gearsOn({candidate}: RowRun, {plan}: Ground, {place}: PlaceRun): RoadGears {
	return plan.roads.gearsFor(candidate.train)(place.road);
}

function curve(toMps: number, value: (speedMps: number) => number): Curve {
	return Array.from({length: samples}, (_, i) => {
		const speed = (toMps * i) / (samples - 1);
		return [speed, value(speed)] as const;
	});
}
