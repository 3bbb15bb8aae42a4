/** `droprack run`: each straight with one pair and set, and all checks. */
import {runPair} from '../planning/run-pair.ts';
import {headingOf} from '../text/heading-view.ts';
import {runView} from '../text/run-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {replyDone, replyRefused} from './reply.ts';

export const run: CommandRun = async (request, around) => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const outcome = runPair(car, track, {pair: request.pair, gearbox: request.gearbox});
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const answer = outcome.value;
	const failed = request.strict && answer.row.verdict === 'fail';
	if (request.json) {
		const {setting, row, remarks} = answer;
		return replyDone(printJson({track: track.name, car: car.name, setting, row, remarks}, request), notes, failed);
	}
	const view = runView(headingOf(car, track, around.now), answer, unitsOf(request.units));
	return replyDone(printText(view, request, around), notes, failed);
};
