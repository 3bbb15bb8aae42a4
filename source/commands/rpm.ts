/** `droprack rpm`: RPM at every point in every gear. */
import {rpmTable} from '../planning/rpm-table.ts';
import {headingOf} from '../text/heading-view.ts';
import {isAboveLimit, rpmView} from '../text/rpm-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {replyDone, replyRefused} from './reply.ts';

export const rpm: CommandRun = async (request, around) => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const outcome = rpmTable(car, track, {pair: request.pair, gearbox: request.gearbox});
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const answer = outcome.value;
	const overLimit = answer.points.some(
		point => point.gear !== null && isAboveLimit(point, point.gear, answer.setting.rpmLimit),
	);
	const failed = request.strict && overLimit;
	if (request.json) return replyDone(printJson({track: track.name, car: car.name, ...answer}, request), notes, failed);
	const view = rpmView(headingOf(car, track, around.now), answer, unitsOf(request.units));
	return replyDone(printText(view, request, around), notes, failed);
};
