import {expect, test} from 'vitest';
import {editLine} from '../../../source/screens/parts/edit-line.ts';
import {isChanged, withNotes} from '../../../source/screens/session/documents.ts';
import {restored} from '../../../source/screens/session/restore.ts';
import {type DraftField, entryOf, startDraft} from '../../../source/screens/session/track-history.ts';
import {documents} from './documents.ts';

const begun = startDraft('Oval', '2026-05-31', '33/38 Set A');
const withTexts = (texts: Partial<Record<DraftField, string>>) => ({
	...begun,
	lines: {...begun.lines, ...Object.fromEntries(Object.entries(texts).map(([field, text]) => [field, editLine(text)]))},
});

test('an entry has what was typed, the air of the day, and nothing of what was left empty', () => {
	expect(entryOf(withTexts({highestRpm: '8840', remark: ' loose '}), {temperature: '75 degF'})).toEqual({
		ok: true,
		entry: {
			date: '2026-05-31',
			session: undefined,
			pair: '33/38',
			gearbox: 'Set A',
			air: {temperature: '75 degF'},
			highestRpm: 8840,
			at: undefined,
			situation: undefined,
			remark: 'loose',
		},
	});
});

test.each([
	[{session: 'race', date: '2026-02-30'}, 'date'],
	[{session: 'race', date: 'today'}, 'date'],
	[{session: 'race', pair: '33'}, 'pair'],
	[{highestRpm: '88x4'}, 'highestRpm'],
	[{highestRpm: '-1'}, 'highestRpm'],
	[{highestRpm: '90000'}, 'highestRpm'],
	[{}, 'session'],
] as const)('%j is refused at %s', (texts, field) => {
	expect(entryOf(withTexts(texts), undefined)).toMatchObject({ok: false, field});
});

test('notes are a change of the track, and come back with a session that was kept', () => {
	const noted = withNotes(documents, ' loose on old tires ');
	expect(isChanged(noted.open[noted.track]!)).toBe(true);
	const back = restored(JSON.parse(JSON.stringify(noted)));
	expect(back?.open[noted.track]).toMatchObject({notes: 'loose on old tires', savedNotes: undefined});
	expect(withNotes(noted, '').open[noted.track]).toMatchObject({notes: undefined});
});
