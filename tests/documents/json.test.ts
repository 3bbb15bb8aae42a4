import {expect, test} from 'vitest';
import {
	type JsonObject,
	sameJson,
	valueAt,
	withEntry,
	without,
	withSwapped,
	withValue,
} from '../../source/documents/json.ts';

const document: JsonObject = {
	name: 'Oval',
	air: {temperature: '20 degC'},
	straights: [{name: 'Front'}, {name: 'Back', exit: '74 mph'}],
};

test('a value is found by its path, and nothing where there is none', () => {
	expect(valueAt(document, ['straights', 1, 'exit'])).toBe('74 mph');
	expect(valueAt(document, ['straights', 5, 'exit'])).toBeUndefined();
	expect(valueAt(document, ['name', 'first'])).toBeUndefined();
	expect(valueAt(document, ['constructor'])).toBeUndefined();
});

test('a value is set without touching the rest, which is shared', () => {
	const next = withValue(document, ['straights', 0, 'exit'], '76 mph');
	expect(next.straights).toEqual([
		{name: 'Front', exit: '76 mph'},
		{name: 'Back', exit: '74 mph'},
	]);
	expect(valueAt(next, ['straights', 1])).toBe(valueAt(document, ['straights', 1]));
	expect(valueAt(document, ['straights', 0, 'exit'])).toBeUndefined();
});

test('a missing group is made', () => {
	expect(withValue({}, ['wind', 'speed'], '5 mph')).toEqual({wind: {speed: '5 mph'}});
});

test('with its last field a group goes, an entry of a list does not', () => {
	expect(without(document, ['air', 'temperature'])).not.toHaveProperty('air');
	expect(without(document, ['straights', 0, 'name']).straights).toEqual([{}, {name: 'Back', exit: '74 mph'}]);
});

test('what is not there cannot be taken away', () => {
	expect(without(document, ['wind', 'speed'])).toBe(document);
});

test('entries of a list are added, removed and exchanged', () => {
	expect(valueAt(withEntry(document, ['straights'], 1, {name: 'Chute'}), ['straights', 1, 'name'])).toBe('Chute');
	expect(withEntry({}, ['situations'], 0, {name: 'Tow'})).toEqual({situations: [{name: 'Tow'}]});
	expect(without(document, ['straights', 0]).straights).toEqual([{name: 'Back', exit: '74 mph'}]);
	expect(valueAt(withSwapped(document, ['straights'], 0, 1), ['straights', 0, 'name'])).toBe('Back');
	expect(withSwapped(document, ['straights'], 1, 2)).toBe(document);
});

test('documents say the same in whatever order their fields stand', () => {
	expect(sameJson({name: 'Oval', lap: '1 mi'}, {lap: '1 mi', name: 'Oval'})).toBe(true);
	expect(sameJson(withValue(without(document, ['name']), ['name'], 'Oval'), document)).toBe(true);
	expect(sameJson(document, withValue(document, ['straights', 1, 'exit'], '75 mph'))).toBe(false);
	expect(sameJson({name: 'Oval'}, {name: 'Oval', lap: '1 mi'})).toBe(false);
	expect(sameJson(JSON.parse('{"__proto__": {}}'), {other: {}})).toBe(false);
	expect(sameJson([1, 2], [1])).toBe(false);
	expect(sameJson(null, {})).toBe(false);
});
