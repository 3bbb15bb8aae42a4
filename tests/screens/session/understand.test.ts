import {expect, test} from 'vitest';
import type {Json} from '../../../source/documents/json.ts';
import type {FieldKind} from '../../../source/screens/session/field-kind.ts';
import {inOtherUnits, understand, valueText} from '../../../source/screens/session/understand.ts';

const speed: FieldKind = {is: 'quantity', dimensions: ['speed'], change: false};
const speedChange: FieldKind = {is: 'quantity', dimensions: ['speed', 'share'], change: true};
const rollout: FieldKind = {is: 'quantity', dimensions: ['length'], change: false};
const grip: FieldKind = {is: 'quantity', dimensions: ['number', 'share'], change: true};

const us = (text: string, kind: FieldKind, before?: Json) => understand(text, kind, before, 'us');

test('a quantity is told in the units that are read, and as it was written where that is another', () => {
	expect(us('118 mph', speed)).toEqual({ok: true, value: '118 mph', words: '118 mph'});
	expect(us('190 km/h', speed)).toEqual({ok: true, value: '190 km/h', words: '190 km/h = 118.06 mph'});
	expect(understand('118 mph', speed, undefined, 'metric')).toMatchObject({words: '118 mph = 189.9 km/h'});
	expect(understand('86.5 in', rollout, undefined, 'metric')).toMatchObject({words: '86.5 in = 2197.1 mm'});
});

test('arithmetic is worked out, and stays in the document as it was written', () => {
	expect(us('86.5+0.25 in', rollout)).toEqual({ok: true, value: '86.5+0.25 in', words: '86.75 in'});
});

test('a number alone gets the unit that stood there, else the one that is read', () => {
	expect(us('120', speed, '190 km/h')).toEqual({ok: true, value: '120 km/h', words: '120 km/h = 74.565 mph'});
	expect(us('118*1.02', speed, '118 mph')).toMatchObject({value: '118*1.02 mph', words: '120.36 mph'});
	expect(us('120', speed)).toMatchObject({value: '120 mph'});
});

test('how well a number is known is told with it, and stays as it was written', () => {
	expect(us('118 mph ± 1.5 mph', speed)).toEqual({ok: true, value: '118 mph ± 1.5 mph', words: '118 ± 1.5 mph'});
	expect(us('118 ± 1.5', speed, '117 mph')).toEqual({ok: true, value: '118 ± 1.5 mph', words: '118 ± 1.5 mph'});
	expect(understand('86.5 in +/- 0.1 in', rollout, undefined, 'metric')).toMatchObject({
		words: '86.5 ± 0.1 in = 2197.1 ± 2.54 mm',
	});
	const coefficient: FieldKind = {is: 'quantity', dimensions: ['number'], change: false};
	expect(us('1.25', coefficient)).toMatchObject({value: 1.25});
	expect(us('1.25 ± 0.05', coefficient)).toEqual({ok: true, value: '1.25 ± 0.05', words: '1.25 ± 0.05'});
	expect(us('118 mph ± 1 in', speed)).toMatchObject({ok: false, words: expect.stringMatching(/in is a length/)});
});

test('fuel is told in gallons and pounds, or in liters and kilograms', () => {
	const [tank, consumption] = (['volume', 'consumption'] as const).map(
		(dimension): FieldKind => ({is: 'quantity', dimensions: [dimension], change: false}),
	);
	expect(us('75 L', tank!)).toMatchObject({words: '75 L = 19.813 gal'});
	expect(us('20', tank!)).toMatchObject({value: '20 gal'});
	expect(us('0.3 kg/kWh', consumption!)).toMatchObject({words: '0.3 kg/kWh = 0.4932 lb/(hp h)'});
});

test('a change says what it does', () => {
	expect(us('+2 mph', speedChange)).toMatchObject({value: '+2 mph', words: 'adds: 2 mph'});
	expect(us('-3 %', speedChange)).toMatchObject({value: '-3 %', words: 'times 0.9700: -3 %'});
	expect(us('88 mph', speedChange)).toMatchObject({value: '88 mph', words: 'replaces: 88 mph'});
	expect(us('-2', speedChange, '-3 mph')).toMatchObject({value: '-2 mph', words: 'takes away: -2 mph'});
});

test('a coefficient without a sign is a number, with one a change as text', () => {
	expect(us('1.2', grip)).toMatchObject({ok: true, value: 1.2});
	expect(us('+0.05', grip)).toMatchObject({ok: true, value: '+0.05'});
});

test('a plain number is worked out', () => {
	expect(us('8900-50', {is: 'number'})).toEqual({ok: true, value: 8850, words: '8850'});
	expect(us('8900 rpm', {is: 'number'})).toMatchObject({ok: false});
});

test('a choice is understood by its beginning, where that is clear', () => {
	const type: FieldKind = {is: 'choice', among: ['short', 'intermediate', 'superspeedway', 'road']};
	expect(us('ro', type)).toMatchObject({ok: true, value: 'road'});
	expect(us('s', type)).toEqual({ok: false, words: 'one of short, intermediate, superspeedway, road'});
});

test('yes and no', () => {
	expect(us('Yes', {is: 'flag'})).toMatchObject({value: true});
	expect(us('maybe', {is: 'flag'})).toEqual({ok: false, words: 'yes or no'});
});

test('a list is parted by blanks or commas, names by commas', () => {
	expect(us('2.9 2.04, 1.58', {is: 'list', of: {is: 'number'}})).toMatchObject({value: [2.9, 2.04, 1.58]});
	expect(us('Set A, B', {is: 'list', of: {is: 'text'}})).toMatchObject({value: ['Set A', 'B']});
	expect(us('2.9 x', {is: 'list', of: {is: 'number'}})).toMatchObject({ok: false});
});

test('what is wrong says what was found and what is allowed', () => {
	expect(us('118 mhp', speed)).toEqual({
		ok: false,
		words:
			'found "118 mhp" (unknown unit mhp); allowed a speed with its unit (mph, km/h, m/s, ft/s, kn), like "118 mph". Did you mean "mph"?',
		unknownUnits: ['mhp'],
	});
});

test('a value is shown in the other units only where it is written in others', () => {
	expect(inOtherUnits('118 mph', speed, 'us')).toBe('');
	expect(inOtherUnits('118 mph', speed, 'metric')).toBe('189.9 km/h');
	expect(inOtherUnits('nonsense', speed, 'us')).toBe('');
});

test('values as they are shown', () => {
	expect([valueText(undefined), valueText(true), valueText([2.9, 1]), valueText('86 in')]).toEqual([
		'',
		'yes',
		'2.9, 1',
		'86 in',
	]);
});
