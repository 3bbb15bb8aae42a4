/** `droprack odds`: chances of every pair and set, given how well each number is known. */

import {mattersSteps} from '../odds/matters.ts';
import {oddsOf} from '../odds/odds-steps.ts';
import {oneTooth} from '../odds/one-tooth.ts';
import {runAlone} from '../planning/run-alone.ts';
import {finish} from '../planning/run-rack.ts';
import {headingOf} from '../text/heading-view.ts';
import {oddsView} from '../text/odds-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {replyDone, replyRefused} from './reply.ts';
import {statedIn} from './stated-uncertainties.ts';

/** As many rows as a person compares. */
const shownUnlessAsked = 8;

export const odds: CommandRun = async (request, around) => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const {pair, gearbox, risk, seed} = request;
	const alone = runAlone(car, track, {pair, gearbox});
	if (!alone.ok) return replyRefused(refuseFaults(alone.faults, labels));
	const options = {risk, seed, stated: statedIn(loaded.value)};
	const outcome = oddsOf(car, track, options);
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const answer = outcome.value;
	const matters = finish(mattersSteps(car, track, answer, options));
	const {row} = alone.value;
	const asked = pair !== undefined || gearbox !== undefined ? `${row.pair} ${row.gearbox}` : answer.decision.row;
	const tooth = asked === null ? undefined : oneTooth(car, track, asked);
	const failed = request.strict && (answer.decision.row === null || !answer.decision.isDecided);
	if (request.json) {
		const told = {track: track.name, car: car.name, odds: answer, matters: matters ?? null, tooth: tooth ?? null};
		return replyDone(printJson(told, request), notes, failed);
	}
	const view = oddsView(
		{
			heading: headingOf(car, track, around.now),
			setting: alone.value.setting,
			odds: answer,
			matters,
			tooth,
			top: request.top ?? shownUnlessAsked,
		},
		unitsOf(request.units),
		request.units,
	);
	return replyDone(printText(view, request, around), notes, failed);
};
