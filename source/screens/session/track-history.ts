/** An entry for the history of a track while it is typed, field by field. */

import {parsePair} from '../../drivetrain/gear-pair.ts';
import type {HistoryEntry, Written} from '../../store/kept-documents.ts';
import {isSeenRpm, seenRpmWords} from '../../store/seen-rpm.ts';
import {type EditLine, editLine} from '../parts/edit-line.ts';

export const draftFields = ['date', 'session', 'pair', 'gearbox', 'highestRpm', 'at', 'situation', 'remark'] as const;
export type DraftField = (typeof draftFields)[number];

export type Draft = {
	/** Name of the track that it is about. */
	readonly track: string;
	readonly lines: Readonly<Record<DraftField, EditLine>>;
	readonly field: DraftField;
	readonly wrong: string | undefined;
};

/** Of today, with a pair and set: "33/38 A". */
export function startDraft(track: string, today: string, row: string | undefined): Draft {
	const [pair = '', ...set] = (row ?? '').split(' ');
	const texts: Partial<Record<DraftField, string>> = {date: today, pair, gearbox: set.join(' ')};
	const lines = Object.fromEntries(draftFields.map(field => [field, editLine(texts[field] ?? '')]));
	return {track, lines: lines as Draft['lines'], field: 'session', wrong: undefined};
}

export type DraftReading =
	| {readonly ok: true; readonly entry: HistoryEntry}
	| {readonly ok: false; readonly field: DraftField; readonly wrong: string};

/** The entry that was typed, with the day's air as the track has it; or what is wrong with which field. */
export function entryOf({lines}: Draft, air: Written | undefined): DraftReading {
	const texts = Object.fromEntries(draftFields.map(field => [field, lines[field].text.trim()])) as Record<
		DraftField,
		string
	>;
	const refused = (field: DraftField, wrong: string): DraftReading => ({ok: false, field, wrong});
	if (!isDay(texts.date)) return refused('date', 'a day like 2026-05-31');
	if (texts.pair !== '' && parsePair(texts.pair) === undefined)
		return refused('pair', 'driving/driven teeth, such as 33/38');
	const rpm = Number(texts.highestRpm);
	if (texts.highestRpm !== '' && !isSeenRpm(rpm)) return refused('highestRpm', seenRpmWords);
	if (seen.every(field => texts[field] === ''))
		return refused('session', 'one of session, highest RPM, where, situation and remark is needed');
	const given = (field: DraftField) => (texts[field] === '' ? undefined : texts[field]);
	return {
		ok: true,
		entry: {
			date: texts.date,
			session: given('session'),
			pair: given('pair'),
			gearbox: given('gearbox'),
			air,
			highestRpm: texts.highestRpm === '' ? undefined : rpm,
			at: given('at'),
			situation: given('situation'),
			remark: given('remark'),
		},
	};
}

/** What says more than which day and pair it was. */
const seen: readonly DraftField[] = ['session', 'highestRpm', 'at', 'situation', 'remark'];

const isDay = (text: string): boolean =>
	/^\d{4}-\d{2}-\d{2}$/.test(text) && new Date(`${text}T00:00Z`).toJSON()?.slice(0, 10) === text;
