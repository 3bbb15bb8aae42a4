/** `droprack rank`: every pair and gearbox set, best first. */
import {rankRack} from '../planning/rank-rack.ts';
import {headingOf} from '../text/heading-view.ts';
import {rankView} from '../text/rank-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {replyDone, replyRefused} from './reply.ts';

/** As many rows as a person compares. */
const shownUnlessAsked = 8;

export const rank: CommandRun = async (request, around) => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const {situation} = request;
	const outcome = rankRack(car, track, {situation});
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const byRisk = request.risk === undefined ? undefined : await orderedByRisk(outcome.value, loaded.value, request);
	if (byRisk !== undefined && !byRisk.ok) return replyRefused(refuseFaults(byRisk.faults, labels));
	const {ranking, odds, chances} = byRisk?.value ?? {ranking: outcome.value};
	const failed = request.strict && ranking.rows[0]?.verdict === 'fail';
	if (request.json) {
		const {setting, remarks} = ranking;
		const rows = ranking.rows.slice(0, request.top);
		const told = {track: track.name, car: car.name, setting, rows, remarks};
		return replyDone(printJson(odds === undefined ? told : {...told, odds}, request), notes, failed);
	}
	const heading = headingOf(car, track, around.now);
	const view = rankView(
		{heading, ranking, top: request.top ?? shownUnlessAsked, situation, chances},
		unitsOf(request.units),
	);
	return replyDone(printText(view, request, around), notes, failed);
};

const orderedByRisk = async (...asked: Parameters<typeof import('./rank-by-risk.ts').rankByRisk>) =>
	(await import('./rank-by-risk.ts')).rankByRisk(...asked);
