/** `droprack load`: the fewest pairs to carry for the tracks ahead. */

import {loadList} from '../loading/load-list.ts';
import {type RankedTrack, rankedTrack} from '../loading/load-needs.ts';
import {defaultStepRatio, defaultSteps} from '../loading/load-results.ts';
import {gearboxFaults} from '../planning/document-faults.ts';
import {rankRack} from '../planning/rank-rack.ts';
import {localDay} from '../text/heading-view.ts';
import {loadView} from '../text/load-view.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {loadTracks} from './load-tracks.ts';
import {printJson, printText} from './print.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';

export const load: CommandRun = async (request, around) => {
	const loaded = await loadTracks(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {tracks, car, carLabel, notes} = loaded.value;
	const unknownSet = gearboxFaults('command', 'gearbox', car, request.gearbox);
	if (unknownSet.length > 0) return replyRefused(refuseFaults(unknownSet, {track: '', car: carLabel}));
	const ranked: RankedTrack[] = [];
	const refusals: string[] = [];
	for (const {name, track, label} of tracks) {
		const ranking = rankRack(car, track);
		if (ranking.ok) ranked.push(rankedTrack(name, track, ranking.value));
		else refusals.push(refuseFaults(ranking.faults, {track: label, car: carLabel}).message);
	}
	if (refusals.length > 0) return replyRefused(badInput([...new Set(refusals)].join('\n')));
	const list = loadList(car, ranked, {
		shorter: request.shorter ?? defaultSteps,
		taller: request.taller ?? defaultSteps,
		withinS: request.withinS,
		stepRatio: request.stepRatio ?? defaultStepRatio,
		gearbox: request.gearbox,
		eachSet: request.eachSet === true,
	});
	const failed = request.strict && list.short.length > 0;
	if (request.json) return replyDone(printJson({car: car.name, ...list}, request), notes, failed);
	const heading = {car: car.name, day: localDay(around.now)};
	return replyDone(printText(loadView(heading, list, unitsOf(request.units)), request, around), notes, failed);
};
