/** The ranking in the order of an accepted risk; loaded only where one is asked for. */

import {oddsOf} from '../odds/odds-steps.ts';
import type {Odds} from '../odds/results.ts';
import {riskOrder} from '../odds/risk-order.ts';
import {done} from '../planning/faults.ts';
import {rowName} from '../planning/rank-rack.ts';
import type {Outcome, Ranking} from '../planning/results.ts';
import {doubtsOf, riskView} from '../text/chances-view.ts';
import type {Loaded} from './load-documents.ts';
import type {Request} from './request.ts';
import {statedIn} from './stated-uncertainties.ts';

export type ByRisk = {
	readonly ranking: Ranking;
	readonly odds: Odds;
	/** By the name of the row. */
	readonly chances: ReadonlyMap<string, string>;
};

export function rankByRisk(
	ranking: Ranking,
	loaded: Loaded,
	{risk, seed, situation}: Pick<Request, 'risk' | 'seed' | 'situation'>,
): Outcome<ByRisk> {
	const order = ranking.rows.map(rowName);
	const odds = oddsOf(loaded.car, loaded.track, {risk, seed, situation, order, stated: statedIn(loaded)});
	if (!odds.ok) return odds;
	const {rows, chances} = riskView(riskOrder(ranking.rows, odds.value, risk ?? 0), odds.value);
	const remarks = [...ranking.remarks, ...doubtsOf(odds.value)];
	return done({ranking: {...ranking, rows, remarks}, odds: odds.value, chances});
}
