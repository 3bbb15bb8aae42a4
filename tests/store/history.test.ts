import {readFileSync, writeFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {addMissing, addToHistory} from '../../source/store/history.ts';
import {keptNamed} from '../../source/store/list-kept.ts';
import {temporaryHome} from './temporary-home.ts';

const home = temporaryHome();
const practice = {
	date: '2026-03-01',
	session: 'practice 1',
	pair: '33/38',
	gearbox: 'A',
	air: {temperature: '75 degF'},
	highestRpm: 8840,
	at: 'Front end',
	situation: 'In the tow',
	remark: 'pulls well',
};
const race = {date: '2026-03-02', session: 'race', highestRpm: 8900};
const entries = () => keptNamed(home(), 'history', 'Oval')?.document.entries;

test('entries are kept in the order in which they came, one file a track', () => {
	addToHistory(home(), 'Oval', [practice]);
	addToHistory(home(), 'Other', [race]);
	const answer = addToHistory(home(), 'Oval', [race, practice]);
	expect(answer).toMatchObject({ok: true, value: {document: {track: 'Oval', entries: [practice, race, practice]}}});
	expect(entries()).toEqual([practice, race, practice]);
});

test('fields that this version does not know stay', () => {
	const answer = addToHistory(home(), 'Oval', [practice]);
	const file = answer.ok ? answer.value.file : '';
	writeFileSync(file, readFileSync(file, 'utf8').replace('"track"', '"by": "hand", "track"'));
	addToHistory(home(), 'Oval', [race]);
	expect(keptNamed(home(), 'history', 'Oval')?.document).toMatchObject({by: 'hand', entries: [practice, race]});
});

test('only entries that are not there are added, in whatever order their fields stand', () => {
	addToHistory(home(), 'Oval', [practice]);
	const turned = Object.fromEntries(Object.entries(practice).reverse()) as typeof practice;
	expect(addMissing(home(), 'Oval', [turned, race])).toEqual({ok: true, value: 1});
	expect(addMissing(home(), 'Oval', [turned, race])).toEqual({ok: true, value: 0});
	expect(entries()).toEqual([practice, race]);
});

test('a broken history is left as it is, and the entry is not taken for kept', () => {
	const first = addToHistory(home(), 'Oval', [practice]);
	const file = first.ok ? first.value.file : '';
	writeFileSync(file, '{"kind": "history", "version": 1, "track": "Oval", "entries": [');
	expect(addToHistory(home(), 'Oval', [race])).toMatchObject({ok: false, problem: {reason: 'broken', file}});
	expect(readFileSync(file, 'utf8')).toMatch(/\[$/);
});
