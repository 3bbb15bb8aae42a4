/** `droprack learn TRACK --take-back`: what stood there before it was learned. */

import {visible} from '../documents/visible.ts';
import {type Takeable, takeablesIn, takeBackEdits} from '../practice/learn/accept.ts';
import {asWritten} from '../practice/learn/lesson.ts';
import {localDay} from '../text/heading-view.ts';
import {takenBackEntry, takenBackWords} from '../text/learned-entry.ts';
import {keepLearned, unwritable} from './keep-learned.ts';
import type {Loaded} from './load-documents.ts';
import {printJson} from './print.ts';
import {badInput, type Reply, replyDone, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

/** A name takes back its latest acceptance; `all` every one there is. */
export const takeBack = (loaded: Loaded, names: readonly string[], request: Request, around: Surroundings): Reply => {
	const writes = unwritable(loaded);
	if (writes) return replyRefused(writes);
	const documents = {track: asWritten(loaded.documents.track), car: asWritten(loaded.documents.car)};
	const takeables = takeablesIn(documents);
	const known = [...new Set(takeables.map(({name}) => name))];
	if (known.length === 0)
		return replyRefused(
			badInput(`droprack learn: nothing learned is in ${visible(loaded.track.name)} or ${visible(loaded.car.name)}.`),
		);
	const unknown = names.find(name => name !== 'all' && !takeables.some(one => isCalled(one, name)));
	if (unknown !== undefined)
		return replyRefused(
			badInput(
				`droprack learn: --take-back knows no ${visible(unknown)}. There is: all, ${known.map(visible).join(', ')}.`,
			),
		);
	const taken = takeables.filter(one => names.some(name => name === 'all' || isCalled(one, name)));
	const kept = keepLearned(
		loaded,
		takeBackEdits(taken, documents),
		takenBackEntry(taken, localDay(around.now)),
		request,
		around,
	);
	if (!kept.ok) return replyRefused(kept);
	const told = taken.map(({document, entry, name, untouched}) => ({
		name,
		document,
		field: entry.field,
		from: entry.from,
		learned: entry.value,
		now: untouched ? (entry.before ?? null) : null,
		changedSince: !untouched,
	}));
	if (request.json)
		return replyDone(printJson({track: loaded.track.name, car: loaded.car.name, takenBack: told}, request), kept.value);
	return replyDone(`${taken.map(one => visible(takenBackWords(one))).join('\n')}\n`, kept.value);
};

const isCalled = ({name, entry}: Takeable, asked: string): boolean =>
	name.toLowerCase() === asked.toLowerCase() || entry.field === asked;
