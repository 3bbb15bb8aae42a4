/** `droprack rank`: every pair and gearbox set, best first. */
import {oddsOf} from '../odds/odds-steps.ts';
import {riskOrder} from '../odds/risk-order.ts';
import {rankRack, rowName} from '../planning/rank-rack.ts';
import {headingOf} from '../text/heading-view.ts';
import {riskView} from '../text/odds-words.ts';
import {rankView} from '../text/rank-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {replyDone, replyRefused} from './reply.ts';
import {statedIn} from './stated-uncertainties.ts';

/** As many rows as a person compares. */
const shownUnlessAsked = 8;

export const rank: CommandRun = async (request, around) => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const {situation, risk, seed} = request;
	const outcome = rankRack(car, track, {situation});
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const order = outcome.value.rows.map(rowName);
	const odds =
		risk === undefined ? undefined : oddsOf(car, track, {risk, seed, situation, order, stated: statedIn(loaded.value)});
	if (odds !== undefined && !odds.ok) return replyRefused(refuseFaults(odds.faults, labels));
	const byRisk = odds && riskView(riskOrder(outcome.value.rows, odds.value, risk!), odds.value);
	const ranking = byRisk === undefined ? outcome.value : {...outcome.value, rows: byRisk.rows};
	const failed = request.strict && ranking.rows[0]?.verdict === 'fail';
	if (request.json) {
		const {setting, remarks} = ranking;
		const rows = ranking.rows.slice(0, request.top);
		const told = {track: track.name, car: car.name, setting, rows, remarks};
		return replyDone(printJson(odds === undefined ? told : {...told, odds: odds.value}, request), notes, failed);
	}
	const heading = headingOf(car, track, around.now);
	const view = rankView(
		{heading, ranking, top: request.top ?? shownUnlessAsked, situation, chances: byRisk?.chances},
		unitsOf(request.units),
	);
	return replyDone(printText(view, request, around), notes, failed);
};
