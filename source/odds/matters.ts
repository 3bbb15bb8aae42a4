/** What matters most: which input moves the margin of the first row, and the difference between the first two. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {type Candidate, candidatesOf} from '../planning/candidates.ts';
import {planFor} from '../planning/plan.ts';
import {groundOf} from '../planning/run-rack.ts';
import {dayOf} from './day.ts';
import {shiftOf} from './draws/draw.ts';
import {normalQuantile} from './draws/normal-quantile.ts';
import {firstOrderSteps} from './first-order.ts';
import type {Input} from './input.ts';
import {inputsOf} from './inputs.ts';
import {type OddsOptions, seedUnlessGiven} from './options.ts';
import type {Estimate, Matters, Odds, Share} from './results.ts';
import {RowDraws} from './row-draw.ts';
import {nothingStated} from './stated.ts';
import {noShift, shifted, worldOf} from './world.ts';

/** A share is then known to some 8 %, which tells what to measure first. */
const pointsUnlessGiven = 64;
/** Draws of their own: not those that the odds stand on. */
const otherSeed = 0x5eed;

export type MattersOptions = OddsOptions & {readonly points?: number | undefined};

/** The first-order shares for the row that the odds put first and the one after it; undefined where they put none first. */
export function* mattersSteps(
	car: Car,
	track: Track,
	odds: Pick<Odds, 'decision'>,
	options: MattersOptions = {},
): Generator<void, Matters | undefined, void> {
	const planned = planFor(car, track, {situation: options.situation});
	const {row, next} = odds.decision;
	if (!planned.ok || row === null) return undefined;
	const plan = planned.value;
	const {measured, anchored} = groundOf(plan);
	const {inputs} = inputsOf(plan.car, plan.track, plan.engine, anchored, options.stated ?? nothingStated);
	const candidates = candidatesOf(plan.car);
	const named = (name: string) => candidates.find(one => `${one.pairName} ${one.gearbox.name}` === name)!;
	const pair: Candidate[] = [row, ...(next === null ? [] : [next])].map(named);
	const world = worldOf(car, track);
	const draws = new RowDraws({plan, measured});
	const asItStands = dayOf(plan, shifted(world, noShift(world.track)));
	const drawn = pair.map(candidate => ({candidate, worthwhile: draws.worthwhile(asItStands, candidate)}));
	const outcomesAt = (point: readonly number[]) => {
		const offs = inputs.map(({sd}, i) => sd * normalQuantile(point[i]!));
		const day = dayOf(plan, shifted(world, shiftOf(world, inputs, offs)));
		const [first, second] = drawn.map(one => draws.run(day, one));
		const margin = plan.limitRpm - first!.highestRpm;
		return second === undefined ? [margin] : [margin, second.timeS - first!.timeS];
	};
	const seed = (options.seed ?? seedUnlessGiven) ^ otherSeed;
	const shares = yield* firstOrderSteps(inputs.length, outcomesAt, options.points ?? pointsUnlessGiven, seed);
	return {
		rows: next === null ? [row] : [row, next],
		margin: sharesOf(inputs, shares[0]),
		difference: sharesOf(inputs, shares[1]),
	};
}

/** The largest first. */
function sharesOf(inputs: readonly Input[], shares: readonly Estimate[] = []): Share[] {
	return shares
		.map((share, i) => ({name: inputs[i]!.name, kind: inputs[i]!.kind, share}))
		.sort((one, other) => other.share.value - one.share.value);
}
