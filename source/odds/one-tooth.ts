/** What one tooth is worth: a pair beside the next shorter and the next taller one, and what would change the choice. */
import {brentRoot} from '../drivetrain/brent.ts';
import type {Car} from '../drivetrain/car.ts';
import {mphMps} from '../drivetrain/constants.ts';
import {pairRatio} from '../drivetrain/gear-pair.ts';
import type {Track} from '../drivetrain/track.ts';
import {type Candidate, candidatesOf} from '../planning/candidates.ts';
import {type Plan, planFor} from '../planning/plan.ts';
import type {Row} from '../planning/results.ts';
import {rowOf} from '../planning/row.ts';
import {finish, groundOf} from '../planning/run-rack.ts';
import {runRow} from '../planning/run-row.ts';
import {barredBy} from './barred.ts';
import {dayOf} from './day.ts';
import {RowDraws} from './row-draw.ts';
import {noShift, type Shift, shifted, type World, worldOf} from './world.ts';

/** Highest RPM on a straight: as the track stands, and the most over the situations. */
export type ToothEnd = {readonly straight: string; readonly rpm: number; readonly mostRpm: number};

export type ToothRow = {
	readonly row: string;
	readonly pairRatio: number;
	readonly timeS: number | null;
	readonly highestRpm: number | null;
	readonly marginRpm: number | null;
	readonly ends: readonly ToothEnd[];
};

/** What is changed on every straight, m/s, or in every tow, a share of the drag; null where no change in reach does it. */
export type BreakEven = {readonly exitMps: number | null; readonly towShare: number | null};

export type Neighbor = ToothRow & {
	readonly direction: 'shorter' | 'taller';
	/** Where the two are as fast as each other. */
	readonly sameTime: BreakEven;
	/** Where the shorter of the two is just at the RPM limit. */
	readonly atLimit: BreakEven;
};

export type OneTooth = {readonly of: ToothRow; readonly neighbors: readonly Neighbor[]};

/** How far a break-even is looked for. */
const reach = {exitMps: 8 * mphMps, towShare: 0.2} as const;
/** Closer than this no one can say: 0.01 mph, a hundredth of a percent. */
const tolerance = {exitMps: 0.01 * mphMps, towShare: 1e-4} as const;
const looks = 8;

/** All steps at once. */
export function oneTooth(car: Car, track: Track, name: string): OneTooth | undefined {
	return finish(oneToothSteps(car, track, name));
}

/** The row beside its neighbors with the same set that can be mounted; undefined for a row that is not there, or bad input. */
export function* oneToothSteps(car: Car, track: Track, name: string): Generator<void, OneTooth | undefined, void> {
	const planned = planFor(car, track);
	if (!planned.ok) return undefined;
	const plan = planned.value;
	const ground = groundOf(plan);
	const candidates = candidatesOf(plan.car);
	const candidate = candidates.find(one => nameOf(one) === name);
	if (candidate === undefined) return undefined;
	const world = worldOf(car, track);
	const others = candidates
		.filter(one => one.gearbox === candidate.gearbox && barredBy(one, ground) === null)
		.sort((one, other) => pairRatio(one.pair) - pairRatio(other.pair));
	const ratio = pairRatio(candidate.pair);
	const shorter = others.find(one => pairRatio(one.pair) > ratio);
	const taller = others.findLast(one => pairRatio(one.pair) < ratio);
	const draws = new RowDraws({plan, measured: ground.measured});
	const runIn = (shift: Shift, one: Candidate) => draws.run(dayOf(plan, shifted(world, shift)), {candidate: one});
	const neighbors: Neighbor[] = [];
	for (const [direction, other] of [
		['shorter', shorter],
		['taller', taller],
	] as const) {
		if (other === undefined) continue;
		const told = toothRow(plan, other);
		const sameTime = yield* breakEvenSteps(world, shift => runIn(shift, other).timeS - runIn(shift, candidate).timeS);
		const shorterOne = direction === 'shorter' ? other : candidate;
		const atLimit = yield* breakEvenSteps(world, shift => plan.limitRpm - runIn(shift, shorterOne).highestRpm);
		neighbors.push({direction, ...told, sameTime, atLimit});
	}
	return {of: toothRow(plan, candidate), neighbors};
}

const nameOf = ({pairName, gearbox}: Candidate) => `${pairName} ${gearbox.name}`;

const rowIn = (plan: Plan, candidate: Candidate): Row => rowOf(runRow(plan, candidate), groundOf(plan));

function toothRow(plan: Plan, candidate: Candidate): ToothRow {
	const row = rowIn(plan, candidate);
	const limit = row.checks.find(({check}) => check === 'limit');
	return {
		row: nameOf(candidate),
		pairRatio: pairRatio(candidate.pair),
		timeS: row.fastestS,
		highestRpm: limit?.value ?? null,
		marginRpm: limit?.margin ?? null,
		ends: plan.track.straights.map(({name}, i) => {
			const rpms = row.situations.map(({straights}) => straights[i]!.reachRpm ?? straights[i]!.endRpm);
			return {straight: name, rpm: rpms[0]!, mostRpm: Math.max(...rpms)};
		}),
	};
}

function* breakEvenSteps(world: World, value: (shift: Shift) => number): Generator<void, BreakEven, void> {
	const hasTow = world.track.situations.some(({drag}) => drag?.kind === 'scale');
	const alongExit = (mps: number) => {
		const shift = noShift(world.track);
		for (const straight of shift.straights) straight.exitMps = mps;
		return value(shift);
	};
	const alongTow = (share: number) => {
		const shift = noShift(world.track);
		world.track.situations.forEach(({drag}, i) => {
			if (drag?.kind === 'scale') shift.situations[i]!.drag = share;
		});
		return value(shift);
	};
	return {
		exitMps: yield* nearestRootSteps(alongExit, reach.exitMps, tolerance.exitMps),
		towShare: hasTow ? yield* nearestRootSteps(alongTow, reach.towShare, tolerance.towShare) : null,
	};
}

/** The root nearest to 0 within reach, looked for in steps on both sides and then solved by Brent's method. */
function* nearestRootSteps(f: (x: number) => number, far: number, near: number): Generator<void, number | null, void> {
	const atZero = f(0);
	const roots: number[] = [];
	for (const end of [far, -far]) {
		let [from, before] = [0, atZero];
		for (let i = 1; i <= looks; i++) {
			const to = (end * i) / looks;
			const after = f(to);
			yield;
			const crosses = before > 0 !== after > 0 && !Number.isNaN(before) && !Number.isNaN(after);
			const root = crosses ? brentRoot(f, Math.min(from, to), Math.max(from, to), near) : undefined;
			if (root !== undefined) roots.push(root);
			if (crosses) break;
			[from, before] = [to, after];
		}
	}
	yield;
	return roots.length === 0 ? null : roots.reduce((best, root) => (Math.abs(root) < Math.abs(best) ? root : best));
}
