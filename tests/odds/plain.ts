/** The plain way: for each draw the whole ranking of the documents as the draw has them. */
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {offsOf, shiftOf} from '../../source/odds/draws/draw.ts';
import type {Input} from '../../source/odds/input.ts';
import {inputsOf} from '../../source/odds/inputs.ts';
import {nothingStated, type Stated} from '../../source/odds/stated.ts';
import {shifted, type World, worldOf} from '../../source/odds/world.ts';
import {planFor} from '../../source/planning/plan.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Row} from '../../source/planning/results.ts';
import {groundOf} from '../../source/planning/run-rack.ts';

export type PlainRow = {
	readonly name: string;
	readonly isOver: boolean;
	readonly isAllowed: boolean;
	readonly timeS: number;
};

export function setupOf(car: Car, track: Track, stated: Stated = nothingStated) {
	const plan = planFor(car, track);
	if (!plan.ok) throw new Error(JSON.stringify(plan.faults));
	const {anchored, measured} = groundOf(plan.value);
	const {inputs} = inputsOf(plan.value.car, plan.value.track, plan.value.engine, anchored, stated);
	return {plan: plan.value, inputs, measured, world: worldOf(car, track)};
}

/** The rows of the ranking in a world. */
export function plainRows({car, track}: World): PlainRow[] {
	const ranking = rankRack(car, track);
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows.map(plainRow);
}

function plainRow(row: Row): PlainRow {
	const fails = (name: string) => row.checks.some(({check, verdict}) => check === name && verdict === 'fail');
	const mountable = !['permitted', 'housing', 'stock', 'mileage'].some(fails);
	const isOver = fails('limit');
	const isAllowed = mountable && !isOver && !fails('limiter') && !fails('band');
	return {name: `${row.pair} ${row.gearbox}`, isOver, isAllowed, timeS: row.fastestS ?? Number.NaN};
}

/** Draws by a generator of random numbers in place of the sequence: uniform numbers above 0 and below 1. */
export function randomWorld(world: World, inputs: readonly Input[], uniform: () => number): World {
	const offs = inputs.map(({sd}) => {
		// G. E. P. Box and M. E. Muller, 1958.
		return sd * Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
	});
	return shifted(world, shiftOf(world, inputs, offs));
}

export {offsOf};

/** Mulberry32: the same numbers for the same seed. */
export function seeded(seed: number): () => number {
	let state = seed;
	return () => {
		state = (state + 0x6d2b79f5) | 0;
		let bits = Math.imul(state ^ (state >>> 15), 1 | state);
		bits = (bits + Math.imul(bits ^ (bits >>> 7), 61 | bits)) ^ bits;
		return (((bits ^ (bits >>> 14)) >>> 0) + 0.5) / 2 ** 32;
	};
}
