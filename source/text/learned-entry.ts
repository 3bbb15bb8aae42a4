/** The entry of a track's history that says what was learned, and what was taken back. */
import type {Takeable} from '../practice/learn/accept.ts';
import type {Learning} from '../practice/learn/learn.ts';
import type {Proposal} from '../practice/learn/proposals.ts';
import type {HistoryEntry, Written} from '../store/kept-documents.ts';

/** `day` is YYYY-MM-DD; `air` that of the track document. */
export const learnedEntry = (
	{candidate, readings, from}: Pick<Learning, 'candidate' | 'readings' | 'from'>,
	accepted: readonly Proposal[],
	air: Written | undefined,
	day: string,
): HistoryEntry => {
	const highest = readings
		.flatMap(({name, endRpm}) => (endRpm ? [{name, rpm: endRpm.value}] : []))
		.sort((a, b) => b.rpm - a.rpm)[0];
	const fields = accepted.flatMap(({rows}) =>
		rows.map(({label, value, now}) => `${label} ${value}${now === '' ? '' : ` (was ${now})`}`),
	);
	return {
		date: day,
		session: 'practice',
		...(candidate && {pair: candidate.pairName, gearbox: candidate.gearbox.name}),
		...(air && {air}),
		...(highest && {highestRpm: Math.ceil(highest.rpm), at: `${highest.name} end`}),
		remark: `learned from ${from}: ${fields.join('; ')}`,
	};
};

export const takenBackEntry = (taken: readonly Takeable[], day: string): HistoryEntry => ({
	date: day,
	remark: `taken back: ${taken.map(takenBackWords).join('; ')}`,
});

/** "car.dragArea: 0.95 m^2 ± 0.01 m^2 is 0.9 m^2 again", or "is taken out, as before". */
export const takenBackWords = ({entry: {field, value, before}, untouched}: Takeable): string =>
	untouched
		? before === undefined
			? `${field}: ${value} is taken out; it was not given before`
			: `${field}: ${value} is ${before} again`
		: `${field}: was changed since and stays; its record is gone`;
