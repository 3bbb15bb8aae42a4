import {expect, test} from 'vitest';
import {actionFor, type Binding, bindings, bindingsOf, workingIn} from '../../../source/screens/keys/key-table.ts';
import {keyTableMarkdown} from '../../../source/screens/keys/key-table-markdown.ts';
import {keyWords} from '../../../source/screens/keys/key-words.ts';
import {type Scope, scopes} from '../../../source/screens/keys/scopes.ts';

const table: readonly Binding[] = bindings;

test('no key means two things in one scope', () => {
	for (const scope of Object.keys(scopes) as Scope[]) {
		const keys = bindingsOf(scope).flatMap(({keys}) => keys);
		expect(keys, scope).toEqual([...new Set(keys)]);
	}
});

test('the place comes before what holds everywhere', () => {
	expect(actionFor('e', ['edit', 'everywhere'])).toBe('other form');
	expect(actionFor('e', ['ranking', 'everywhere'])).toBe('edit');
});

test('where something is typed only its own keys are taken, and those that always work', () => {
	expect(actionFor('q', ['field'])).toBeUndefined();
	expect(actionFor('enter', ['field'])).toBe('accept');
	expect(actionFor('ctrl+c', ['field'])).toBe('leave');
	expect(actionFor('ctrl+z', ['choose'])).toBe('suspend');
});

test('a key that the place takes is not shown for what it does elsewhere', () => {
	const forms = workingIn(['edit', 'everywhere']);
	expect(forms.find(({does}) => does === 'edit')).toBeUndefined();
	expect(forms.find(({does}) => does === 'shorter')?.keys).toEqual(['+']);
});

test('an unknown key does nothing anywhere', () => {
	for (const scope of Object.keys(scopes) as Scope[])
		expect(actionFor('ctrl+f1', [scope, 'everywhere'])).toBeUndefined();
});

test('keys as a person reads them', () => {
	expect(['up', 'shift+tab', 'ctrl+s', '+', 'S', 'ctrl+_'].map(keyWords)).toEqual([
		'↑',
		'Shift+Tab',
		'Ctrl+S',
		'+',
		'S',
		'Ctrl+_',
	]);
});

test('the table for the README has every binding', () => {
	const lines = keyTableMarkdown().split('\n');
	expect(lines.slice(0, 4)).toEqual([
		'| key | what it does |',
		'| --- | --- |',
		'| **In the ranking** |  |',
		'| ↑, k | the row above |',
	]);
	expect(lines).toHaveLength(2 + Object.keys(scopes).length + table.length);
});
