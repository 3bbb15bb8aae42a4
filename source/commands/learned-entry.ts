/** The entry of a track's history that says what was learned, and what was taken back. */

import type {Takeable} from '../practice/learn/accept.ts';
import type {Lesson} from '../practice/learn/lesson.ts';
import type {Proposal} from '../practice/learn/proposals.ts';
import type {HistoryEntry, Written} from '../store/kept-documents.ts';
import {localDay} from '../text/heading-view.ts';
import type {Loaded} from './load-documents.ts';
import type {Surroundings} from './surroundings.ts';

export const learnedEntry = (
	{documents}: Pick<Loaded, 'documents'>,
	{learning}: Pick<Lesson, 'learning'>,
	accepted: readonly Proposal[],
	around: Pick<Surroundings, 'now'>,
): HistoryEntry => {
	const {candidate, readings, from} = learning;
	const highest = readings
		.flatMap(({name, endRpm}) => (endRpm ? [{name, rpm: endRpm.value}] : []))
		.sort((a, b) => b.rpm - a.rpm)[0];
	const fields = accepted.flatMap(({rows}) =>
		rows.map(({label, value, now}) => `${label} ${value}${now === '' ? '' : ` (was ${now})`}`),
	);
	return {
		date: localDay(around.now),
		session: 'practice',
		...(candidate && {pair: candidate.pairName, gearbox: candidate.gearbox.name}),
		...(documents.track.air !== undefined && {air: documents.track.air as Written}),
		...(highest && {highestRpm: Math.ceil(highest.rpm), at: `${highest.name} end`}),
		remark: `learned from ${from}: ${fields.join('; ')}`,
	};
};

export const takenBackEntry = (taken: readonly Takeable[], around: Pick<Surroundings, 'now'>): HistoryEntry => ({
	date: localDay(around.now),
	remark: `taken back: ${taken.map(({entry, untouched}) => (untouched ? `${entry.field} ${entry.value} (again ${entry.before ?? 'not given'})` : `the record of ${entry.field}, which was changed since`)).join('; ')}`,
});
