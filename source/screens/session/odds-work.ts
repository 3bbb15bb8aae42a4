/** What the place of odds shows, worked out bit by bit. Loaded when it is first looked at. */
import {mattersSteps} from '../../odds/matters.ts';
import {oddsSteps} from '../../odds/odds-steps.ts';
import {oneToothSteps} from '../../odds/one-tooth.ts';
import {type RiskRow, riskOrder} from '../../odds/risk-order.ts';
import type {Stated} from '../../odds/stated.ts';
import {type Ranked, rowName} from '../../planning/rank-rack.ts';
import {riskView} from '../../text/chances-view.ts';
import {current} from './documents.ts';
import {readCarOf, readTrackOf} from './forms.ts';
import type {OddsAsked, OddsSoFar} from './odds-asked.ts';
import {type Placed, placedRows} from './rows.ts';

export type OddsSteps = Generator<() => OddsSoFar, OddsSoFar, void>;

/** First the chances, then what matters most. Each step gives what makes the answer so far. */
export function* workOn({documents, situation, risk, ranked}: OddsAsked): OddsSteps {
	const track = readTrackOf(current(documents, 'track').json);
	const car = readCarOf(current(documents, 'car').json);
	if (!track.ok || !car.ok) return {odds: undefined, matters: undefined, isDone: true};
	const stated: Stated = {
		car: car.uncertainties,
		track: track.uncertainties,
		situations: namesOf(current(documents, 'track').json.situations),
	};
	const options = {risk, situation, stated, order: ranked.ranking.rows.map(rowName)};
	const steps = oddsSteps(car.value, track.value, options);
	let step = steps.next();
	while (!step.done) {
		const {answer} = step.value;
		yield () => ({odds: answer(), matters: undefined, isDone: false});
		step = steps.next();
	}
	if (!step.value.ok) return {odds: undefined, matters: undefined, isDone: true};
	const odds = step.value.value;
	const matters = mattersSteps(car.value, track.value, odds, options);
	let next = matters.next();
	while (!next.done) {
		yield () => ({odds, matters: undefined, isDone: false});
		next = matters.next();
	}
	return {odds, matters: next.value, isDone: true};
}

/** One tooth of a row, after the rest. */
export function toothOf({documents}: Pick<OddsAsked, 'documents'>, row: string) {
	const track = readTrackOf(current(documents, 'track').json);
	const car = readCarOf(current(documents, 'car').json);
	return track.ok && car.ok ? oneToothSteps(car.value, track.value, row) : undefined;
}

const namesOf = (situations: unknown): string[] =>
	Array.isArray(situations) ? situations.map(situation => String((situation as {name?: unknown}).name)) : [];

/** The rows of a ranking in the order of the risk. */
export function placedByRisk(ranked: Ranked, odds: NonNullable<OddsSoFar['odds']>, risk: number): Placed[] {
	const ordered: RiskRow[] = riskOrder(ranked.ranking.rows, odds, risk);
	return placedRows(riskView(ordered, odds).rows);
}
