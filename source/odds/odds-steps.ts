/** The odds of every pair and set, draw by draw, for a caller that has other things to do in between. */
import type {Car} from '../drivetrain/car.ts';
import {samePair} from '../drivetrain/gear-pair.ts';
import type {Track} from '../drivetrain/track.ts';
import {candidatesOf} from '../planning/candidates.ts';
import {done} from '../planning/faults.ts';
import {planFor} from '../planning/plan.ts';
import type {Outcome} from '../planning/results.ts';
import {finish, groundOf, type Progress} from '../planning/run-rack.ts';
import {barredBy} from './barred.ts';
import {type Day, dayOf} from './day.ts';
import {decide, ordered, type Standing} from './decide.ts';
import {worldOfDraw} from './draws/draw.ts';
import {chanceOf, replicates, spreadOf} from './estimates.ts';
import {inputsOf} from './inputs.ts';
import {drawsUnlessGiven, mostDrawsUnlessGiven, type OddsOptions, seedUnlessGiven} from './options.ts';
import type {Odds, OddsRow} from './results.ts';
import {type RowDraw, RowDraws} from './row-draw.ts';
import {nothingStated} from './stated.ts';
import {type Best, bestOf, deviationsBehind, firstPart, lossOf, RowTally} from './tally.ts';
import {noShift, shifted, worldOf} from './world.ts';

/** The rows that a first answer is about, and the draws for it. */
const firstRows = 8;
const firstDraws = replicates;
/** After so many draws it is seen which rows matter. */
const pilotDraws = 3 * replicates;
/** A row waits where it was never first or over the limit in the pilot and is so many standard deviations of the difference behind. */
const farBehind = 1.5;
/** So far behind it is dropped; see `oddsSteps`. */
const hopeless = 10;
const safeMargin = 5;
/** So many rows at a time: a few milliseconds on the longest tracks. */
const rowsAtOnce = 12;

export type OddsProgress = Progress & {
	/** The answer so far, worked out when it is asked for; undefined before there is one. */
	readonly answer: () => Odds | undefined;
	/** Whether every row that matters has been through the draws; what follows makes up for the others. */
	readonly isSettled: boolean;
};

/** All steps at once. */
export function oddsOf(car: Car, track: Track, options: OddsOptions = {}): Outcome<Odds> {
	return finish(oddsSteps(car, track, options));
}

/**
 * Every row that can be mounted goes through the same draws. First a few draws of the rows that are best as the documents
 * stand; then a pilot of all rows; then the rest for the rows that matter: first in a draw, over the limit in some draws and
 * not in others, or not far behind; then those that could wait. More draws follow, doubled each time up to `mostDraws`, for
 * the rows that can be first or decide, until `decide` has no doubt. Bad input comes back as faults.
 *
 * What is dropped, and why it changes nothing:
 * - A row that a rule, the case, the stock or its miles rule out is not allowed in any draw.
 * - In a draw in which a row is over the limit at one place it is over and not allowed, whatever it does at the others. Once
 *   it has been over in its first draws, that place is looked at first, and the rest only where it is not over there.
 * - A safe row that on the mean is `hopeless` standard deviations of its own lag behind the best safe row of each draw. Safe:
 *   never over in the pilot, and the highest RPM `safeMargin` standard deviations below the limit on the mean. To
 *   be first in a draw, either the safe rows are over in it, or the lag is 0 or less. Whatever the distributions, Cantelli's
 *   inequality bounds the chance of what lies k standard deviations off the mean by 1/(1 + k²): together below 5 %; for
 *   distributions anywhere near normal, as sums of many small effects are, below 1e-6. The row keeps its pilot draws and the
 *   standard error that they have. `tests/odds/odds.test.ts` compares with all rows in all draws.
 */
export function* oddsSteps(
	car: Car,
	track: Track,
	options: OddsOptions = {},
): Generator<OddsProgress, Outcome<Odds>, void> {
	const plan = planFor(car, track, {situation: options.situation});
	if (!plan.ok) return plan;
	const run = new OddsRun(car, track, plan.value, options);
	for (const _ of run.steps()) yield {...run.progress, answer: () => run.answer(false), isSettled: run.isSettled};
	return done(run.answer(true)!);
}

type Plan = Parameters<typeof groundOf>[0];

class OddsRun {
	readonly #plan: Plan;
	readonly #options: OddsOptions;
	readonly #seed: number;
	readonly #draws: number;
	readonly #most: number;
	readonly #world;
	readonly #ground;
	readonly #inputs;
	readonly #rows: readonly RowTally[];
	readonly #rowDraws: RowDraws;
	readonly #asItStands: Day;
	#day: {readonly draw: number; readonly day: Day} | undefined;
	#pilotBest: {readonly neverOver: Best; readonly safe: Best} | undefined;
	#done = 0;
	isSettled = false;

	constructor(car: Car, track: Track, plan: Plan, options: OddsOptions) {
		this.#plan = plan;
		this.#options = options;
		this.#seed = options.seed ?? seedUnlessGiven;
		this.#draws = options.draws ?? drawsUnlessGiven;
		this.#most = Math.max(this.#draws, options.mostDraws ?? mostDrawsUnlessGiven);
		this.#world = worldOf(car, track);
		this.#ground = groundOf(plan);
		const stated = options.stated ?? nothingStated;
		this.#inputs = inputsOf(plan.car, plan.track, plan.engine, this.#ground.anchored, stated);
		this.#rows = candidatesOf(plan.car).map(
			candidate => new RowTally(candidate, barredBy(candidate, this.#ground), this.#most),
		);
		this.#rowDraws = new RowDraws({plan, measured: this.#ground.measured});
		this.#asItStands = dayOf(plan, shifted(this.#world, noShift(this.#world.track)));
	}

	/** Rows that are to go through all draws ÷ those that have. */
	get progress(): Progress {
		return {done: this.#done, total: this.#open.length * this.#draws};
	}

	get #open(): RowTally[] {
		return this.#rows.filter(({barred}) => barred === null);
	}

	*steps(): Generator<void, void, void> {
		const rows = this.#inKnownOrder() ?? (yield* this.#byNominalTime());
		if (this.#options.inFull) {
			yield* this.#advance(rows, this.#draws);
			return;
		}
		yield;
		yield* this.#advance(rows.slice(0, firstRows), Math.min(firstDraws, this.#draws));
		yield* this.#advance(rows, Math.min(pilotDraws, this.#draws));
		yield* this.#advance(
			rows.filter(row => this.#standing(row, rows) === 'matters'),
			this.#draws,
		);
		this.isSettled = true;
		yield;
		yield* this.#advance(
			rows.filter(row => this.#standing(row, rows) !== 'dropped'),
			this.#draws,
		);
		for (let draws = 2 * this.#draws; draws <= this.#most && !this.answer(false)!.decision.isDecided; draws *= 2)
			yield* this.#advance(this.#thatDecide(rows), draws);
	}

	#inKnownOrder(): RowTally[] | undefined {
		const {order} = this.#options;
		if (order === undefined) return undefined;
		const places = new Map(order.map((name, place) => [name, place]));
		const placeOf = ({name}: RowTally) => places.get(name) ?? Number.POSITIVE_INFINITY;
		return this.#open.sort((one, other) => placeOf(one) - placeOf(other) || 0);
	}

	/** The rows in the order of the documents' own numbers: those within the limit first, by time. */
	*#byNominalTime(): Generator<void, RowTally[], void> {
		const keyed: {row: RowTally; nominal: RowDraw}[] = [];
		for (const row of this.#open) {
			row.worthwhile = this.#rowDraws.worthwhile(this.#asItStands, row.candidate);
			keyed.push({row, nominal: this.#rowDraws.run(this.#asItStands, row)});
			if (keyed.length % rowsAtOnce === 0) yield;
		}
		return keyed
			.sort(
				({nominal: one}, {nominal: other}) =>
					Number(one.isOver) - Number(other.isOver) || (one.timeS < other.timeS ? -1 : one.timeS > other.timeS ? 1 : 0),
			)
			.map(({row}) => row);
	}

	/** Takes the rows to so many draws, draw by draw. */
	*#advance(rows: readonly RowTally[], draws: number): Generator<void, void, void> {
		const from = Math.min(...rows.map(row => row.draws));
		for (let draw = from; draw < draws; draw++) {
			const behind = rows.filter(row => row.draws === draw);
			for (let i = 0; i < behind.length; i += rowsAtOnce) {
				for (const row of behind.slice(i, i + rowsAtOnce)) this.#draw(row, draw);
				yield;
			}
		}
	}

	#draw(row: RowTally, draw: number): void {
		row.worthwhile ??= this.#rowDraws.worthwhile(this.#asItStands, row.candidate);
		const day = this.#dayOf(draw);
		this.#done++;
		if (row.isBrief && this.#rowDraws.isOverAt(day, row, row.spot))
			row.add({timeS: Number.NaN, highestRpm: Number.NaN, isOver: true, isAllowed: false});
		else row.add(this.#rowDraws.run(day, row, row.spot));
	}

	#dayOf(draw: number): Day {
		if (this.#day?.draw !== draw)
			this.#day = {draw, day: dayOf(this.#plan, worldOfDraw(this.#world, this.#inputs.inputs, draw, this.#seed))};
		return this.#day.day;
	}

	#isSafe({overCount, highestRpm, draws}: RowTally): boolean {
		const rpm = spreadOf(highestRpm, Math.min(draws, pilotDraws));
		return overCount === 0 && rpm !== null && this.#plan.limitRpm - rpm.mean > safeMargin * rpm.sd;
	}

	/** After the pilot: what a row is worth. */
	#standing(row: RowTally, rows: readonly RowTally[]): 'matters' | 'can wait' | 'dropped' {
		const {overCount, draws} = row;
		if (overCount > 0) return overCount < draws ? 'matters' : 'can wait';
		this.#pilotBest ??= {
			neverOver: bestOf(
				rows.filter(one => one.overCount === 0),
				pilotDraws,
			),
			safe: bestOf(
				rows.filter(one => this.#isSafe(one)),
				pilotDraws,
			),
		};
		const {neverOver, safe} = this.#pilotBest;
		if (this.#isSafe(row) && deviationsBehind(row, safe) > hopeless) return 'dropped';
		return deviationsBehind(row, neverOver) > farBehind ? 'can wait' : 'matters';
	}

	/** Rows that may be first, or whose chance may be on either side of the risk. */
	#thatDecide(rows: readonly RowTally[]): RowTally[] {
		const {risk} = this.#options;
		const standings = this.#standings(rows);
		const named = new Set<string | null>(standings.filter(({first}) => first.value > 0).map(({row}) => row.name));
		const {row, next} = decide(standings, risk ?? null);
		named.add(row).add(next);
		const nearRisk = ({over}: Standing) => risk !== undefined && Math.abs(over.value - risk) <= farBehind * over.error;
		return standings.filter(one => named.has(one.row.name) || nearRisk(one)).map(one => one.row);
	}

	#standings(rows: readonly RowTally[], best = bestOf(rows, this.#drawn)): Standing[] {
		return rows.map(row => ({
			row,
			over: chanceOf(row.draws, draw => row.isOver[draw]!),
			first: chanceOf(row.draws, draw => firstPart(row, best, draw)),
		}));
	}

	get #drawn(): number {
		return Math.max(0, ...this.#rows.map(({draws}) => draws));
	}

	answer(isComplete: boolean): Odds | undefined {
		const drawn = this.#drawn;
		if (drawn === 0 && !isComplete) return undefined;
		const risk = this.#options.risk ?? null;
		const best = bestOf(this.#rows, drawn);
		const standings = this.#standings(this.#rows, best);
		const {inputs, notDrawn} = this.#inputs;
		return {
			seed: this.#seed,
			risk,
			rpmLimit: this.#plan.limitRpm,
			anchored: this.#ground.anchored,
			isComplete,
			draws: drawn,
			inputs: inputs.map(({move: _, ...told}) => told),
			notDrawn,
			rows: ordered(standings, risk).map(standing => this.#rowOf(standing, best)),
			decision: decide(standings, risk),
		};
	}

	#rowOf({row, over, first}: Standing, best: Best): OddsRow {
		const {pair, pairName, gearbox} = row.candidate;
		const {installed} = this.#plan.car;
		return {
			pair: pairName,
			gearbox: gearbox.name,
			installed: installed !== undefined && samePair(installed.pair, pair) && installed.gearbox === gearbox.name,
			barred: row.barred,
			draws: row.draws,
			over: row.draws > 0 ? over : null,
			first: row.draws > 0 ? first : null,
			timeS: spreadOf(row.timeS, row.draws),
			highestRpm: spreadOf(row.highestRpm, row.draws),
			lossS: lossOf(row, best),
		};
	}
}
