/** The numbers of one draw. */
import {indexOf, replicateOf} from '../estimates.ts';
import type {Input} from '../input.ts';
import {noShift, type Shift, shifted, type World} from '../world.ts';
import {normalQuantile} from './normal-quantile.ts';
import {coordinate} from './sobol.ts';

/** How far each input is off in a draw, counted from 0: each normal, all independent of each other. */
export function offsOf(inputs: readonly Input[], draw: number, seed: number): number[] {
	return inputs.map(
		({sd}, dimension) => sd * normalQuantile(coordinate(indexOf(draw), dimension, replicateOf(draw), seed)),
	);
}

export function shiftOf(world: World, inputs: readonly Input[], offs: readonly number[]): Shift {
	const shift = noShift(world.track);
	inputs.forEach(({move}, i) => {
		move(shift, offs[i]!);
	});
	return shift;
}

/** The world of a draw. */
export function worldOfDraw(world: World, inputs: readonly Input[], draw: number, seed: number): World {
	return shifted(world, shiftOf(world, inputs, offsOf(inputs, draw, seed)));
}
