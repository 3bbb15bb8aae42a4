/** `droprack gearbox`: which gears to build into the box. */
import {chooseGearbox} from '../loading/choose-gearbox.ts';
import {pairFaults} from '../planning/document-faults.ts';
import {planFor} from '../planning/plan.ts';
import {gearboxView} from '../text/gearbox-view.ts';
import {localDay} from '../text/heading-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadTracks} from './load-tracks.ts';
import {printJson, printText} from './print.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';

/** The best and the next best ones. */
const toldUnlessAsked = 3;

export const gearbox: CommandRun = async (request, around) => {
	const loaded = await loadTracks(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {tracks, car, carLabel, notes} = loaded.value;
	const unknownPair = pairFaults('command', 'pair', car, request.pair);
	if (unknownPair.length > 0) return replyRefused(refuseFaults(unknownPair, {track: '', car: carLabel}));
	const refusals = tracks.flatMap(({track, label}) => {
		const plan = planFor(car, track);
		return plan.ok ? [] : [refuseFaults(plan.faults, {track: label, car: carLabel}).message];
	});
	if (refusals.length > 0) return replyRefused(badInput([...new Set(refusals)].join('\n')));
	const together = request.together === true;
	const answer = chooseGearbox(car, tracks, {pair: request.pair, together, count: request.top ?? toldUnlessAsked});
	if (!answer.ok) return replyRefused(refuseFaults(answer.faults, {track: '', car: carLabel}));
	const best = together
		? (answer.value.common[0]?.tracks.map(({row}) => row) ?? [])
		: answer.value.tracks.map(({rows}) => rows[0]);
	const failed = request.strict && (best.length === 0 || best.some(row => row === undefined || row.verdict === 'fail'));
	if (request.json) return replyDone(printJson({car: car.name, ...answer.value}, request), notes, failed);
	const view = gearboxView({car: car.name, day: localDay(around.now)}, answer.value, unitsOf(request.units));
	return replyDone(printText(view, request, around), notes, failed);
};
