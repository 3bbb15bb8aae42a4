/** One pair and set in one draw: its time, the highest RPM over all situations, and whether it is allowed. */
import {RoadGears} from '../drivetrain/road-gears.ts';
import {outcomeOf} from '../drivetrain/run-straight.ts';
import {speedAtRpmMps} from '../drivetrain/tire.ts';
import type {Candidate} from '../planning/candidates.ts';
import type {Condition, Place} from '../planning/conditions.ts';
import {type MeasuredPoint, measuredRpm} from '../planning/measured.ts';
import type {Plan} from '../planning/plan.ts';
import {runPlace} from '../planning/run-place.ts';
import {roundingRpm} from '../planning/words.ts';
import type {Day, DayCondition} from './day.ts';
import {QuickGears} from './quick/quick-gears.ts';
import {type QuickRun, quickPlace} from './quick/quick-place.ts';
import type {RoadTable} from './quick/road-table.ts';
import {ThrustTables} from './quick/vehicle-table.ts';
import {type Worthwhile, worthwhileOn} from './quick/worthwhile.ts';

/** What does not change from draw to draw. */
export type Setup = {readonly plan: Plan; readonly measured: readonly MeasuredPoint[]};

export type RowDraw = {
	/** Share-weighted mean over the situations in the fastest gears; NaN where a straight does not run or none has a length. */
	readonly timeS: number;
	/** NaN where nothing runs. */
	readonly highestRpm: number;
	/** Whether it passes the RPM limit anywhere, by the limit check's own rule. */
	readonly isOver: boolean;
	/** Whether it runs everywhere, never touches the limiter and stays within the limit. */
	readonly isAllowed: boolean;
};

/** A row that is drawn; without `worthwhile` every sequence is tried. */
export type Drawn = {
	readonly candidate: Candidate;
	readonly worthwhile?: readonly (readonly (Worthwhile | undefined)[])[] | undefined;
};

/** Where a row passed the limit last: it is looked at first the next time. */
export type Spot = {condition: number; place: number};

export class RowDraws {
	readonly #setup: Setup;
	readonly #tables = new ThrustTables();

	constructor(setup: Setup) {
		this.#setup = setup;
	}

	/** Of each situation and straight, the sequences worth trying; undefined where the solver of the ranking runs it. */
	worthwhile(day: Day, {train}: Candidate): (Worthwhile | undefined)[][] {
		return day.conditions.map(({condition, table, roads}) => {
			this.#tables.take(table, train);
			return condition.places.map((place, p) => {
				const course = place.courses.get(train.overall.length);
				const road = roads[p];
				if (road === undefined || course === undefined) return undefined;
				const gears = new QuickGears(this.#tables, road);
				let found: Worthwhile | undefined;
				outcomeOf(gears, course, startGears => {
					found = worthwhileOn(gears, course, startGears);
					return [];
				});
				return found;
			});
		});
	}

	/** The row in full. */
	run(day: Day, {candidate, worthwhile}: Drawn, spot?: Spot): RowDraw {
		const {limitRpm} = this.#setup.plan;
		let timeS = 0;
		let timed = false;
		let highestRpm = Number.NaN;
		let isOver = false;
		let isAllowed = true;
		const raise = (rpm: number) => {
			if (rpm > highestRpm || Number.isNaN(highestRpm)) highestRpm = rpm;
		};
		day.conditions.forEach((dayCondition, c) => {
			const {condition, roads} = dayCondition;
			this.#tables.take(dayCondition.table, candidate.train);
			let conditionS = 0;
			condition.places.forEach((place, p) => {
				const run = this.#place(condition, place, candidate, roads[p], worthwhile?.[c]?.[p]);
				if (run.overLimit || (run.runs && run.highestRpm - limitRpm > roundingRpm)) {
					isOver = true;
					if (spot !== undefined) [spot.condition, spot.place] = [c, p];
				}
				if (!run.runs || run.onLimiter) isAllowed = false;
				if (place.straight.lengthM !== undefined) timed = true;
				conditionS += run.fastestS;
				if (run.runs) raise(run.highestRpm);
				if (run.runs && condition.name === day.base.name) raise(this.#measuredRpm(day, candidate, p, run));
			});
			timeS += condition.weight * conditionS;
			const restart = this.#restartRpm(dayCondition, candidate);
			if (restart === overEverywhere) isOver = true;
			else raise(restart);
		});
		isOver ||= highestRpm - limitRpm > roundingRpm;
		return {timeS: timed ? timeS : Number.NaN, highestRpm, isOver, isAllowed: isAllowed && !isOver};
	}

	/** Whether it passes the limit at one place, which is enough to rule it out. */
	isOverAt(day: Day, {candidate, worthwhile}: Drawn, {condition: c, place: p}: Spot): boolean {
		const {condition, table, roads} = day.conditions[c]!;
		this.#tables.take(table, candidate.train);
		const run = this.#place(condition, condition.places[p]!, candidate, roads[p], worthwhile?.[c]?.[p]);
		return run.overLimit || (run.runs && run.highestRpm - this.#setup.plan.limitRpm > roundingRpm);
	}

	#place(
		condition: Condition,
		place: Place,
		candidate: Candidate,
		road: RoadTable | undefined,
		worthwhile: Worthwhile | undefined,
	): QuickRun {
		const course = place.courses.get(candidate.train.overall.length);
		if (road === undefined || course === undefined) return exactly(condition, place, candidate);
		return quickPlace(condition, place, course, new QuickGears(this.#tables, road), worthwhile);
	}

	/** The measured points of a straight in this row's own gear; NaN where there is none. */
	#measuredRpm({base}: Day, candidate: Candidate, place: number, {endGear}: QuickRun): number {
		const {plan, measured} = this.#setup;
		const point = measured.find(({index}) => index === place);
		if (point === undefined) return Number.NaN;
		return measuredRpm({...plan, base}, point, candidate, endGear) ?? Number.NaN;
	}

	/**
	 * The highest RPM that a restart can show, where it may pass the limit. A restart counts up to its end or its shifts, so
	 * with a limiter no higher than the limit it never does, but for a pace above what the highest gear may turn.
	 */
	#restartRpm({condition}: DayCondition, candidate: Candidate): number {
		const {restart, vehicle} = condition;
		if (restart === undefined) return Number.NaN;
		const highest = candidate.train.overall.at(-1)!;
		const {rolloutM, growth, slip, topRpm, limiterRpm} = vehicle;
		const topMps = speedAtRpmMps(topRpm, highest, rolloutM, growth, slip);
		if (limiterRpm <= this.#setup.plan.limitRpm && restart.straight.exitMps <= topMps) return Number.NaN;
		const run = exactly(condition, restart, candidate);
		return run.overLimit ? overEverywhere : run.highestRpm;
	}
}

const overEverywhere = Number.POSITIVE_INFINITY;

/** By the solver of the ranking: a straight without length, a gearbox without the gears, a restart. */
function exactly(condition: Condition, place: Place, {train}: Candidate): QuickRun {
	const course = [...place.courses.values()].find(one => one !== undefined);
	const road = course ?? {grade: 0, headwindMps: 0, load: 1, extraDragN: 0};
	const {state, result, sequence} = runPlace(condition, place, new RoadGears(condition.vehicle, train, road));
	const runs = state === 'ran' || state === 'held';
	const rpms = [result.exitRpm, result.endRpm, result.minimumRpm ?? 0, ...result.shifts.map(({rpm}) => rpm)];
	const reachRpm = place.isRestart ? 0 : (sequence?.reachRpm ?? 0);
	return {
		fastestS: state === 'held' ? 0 : (result.fastestS ?? Number.NaN),
		highestRpm: runs ? Math.max(...rpms, reachRpm) : Number.NaN,
		endGear: result.endGear,
		onLimiter: result.limiterM > 0,
		runs,
		overLimit: state === 'overLimit',
	};
}
