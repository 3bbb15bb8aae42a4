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
	const ranking = outcome.value;
	const failed = request.strict && ranking.rows[0]?.verdict === 'fail';
	if (request.json) {
		const {setting, remarks} = ranking;
		const rows = ranking.rows.slice(0, request.top);
		return replyDone(printJson({track: track.name, car: car.name, setting, rows, remarks}, request), notes, failed);
	}
	const heading = headingOf(car, track, around.now);
	const view = rankView({heading, ranking, top: request.top ?? shownUnlessAsked, situation}, unitsOf(request.units));
	return replyDone(printText(view, request, around), notes, failed);
};
