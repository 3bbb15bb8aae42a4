import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {readShortForm, shortForm} from '../../source/sharing/short-form.ts';
import {runs} from '../runs.ts';
import {arbitraryPlan} from './arbitrary-plan.ts';
import {samplePlan} from './sample.ts';

const plan = await samplePlan();
const {line, fields} = shortForm(plan);
const alphanumeric = /^[0-9A-Z $%*+\-./:]*$/;
const size = (text: string) => Buffer.byteLength(text);

describe('the short form', () => {
	test('says what is needed to act on the plan', () => {
		expect(line).toMatch(
			/^DR1 Pine Hollow short: 34\/37 A: shift 2-9100: pit 2-3531: limit 9200: top \d{4}: restart 2: [0-9a-f]{8}$/,
		);
	});

	test('reads back over its own fields, inside a message too', () => {
		expect(readShortForm(line)).toEqual({ok: true, fields});
		expect(readShortForm(`Hi,\n> ${line.replaceAll(' ', '\u00a0\n> ')}  \r\n-- \nJo`)).toEqual({ok: true, fields});
	});

	test('of any plan fits its bounds and reads back', {timeout: 900_000}, () => {
		fc.assert(
			fc.property(arbitraryPlan, any => {
				const short = shortForm(any);
				expect(size(short.line) <= 134 || (alphanumeric.test(short.line) && short.line.length <= 195)).toBe(true);
				expect(short.line).not.toMatch(/[\p{Cc}\u202a-\u202e]/u);
				expect(readShortForm(short.line)).toEqual({ok: true, fields: short.fields});
			}),
			{numRuns: runs(500, 20_000)},
		);
	});

	test('holds nineteen shifts of a twenty-gear box in capitals', () => {
		const shifts = Array.from({length: 19}, (_, i) => ({from: i + 1, rpm: 29_000 + i, light: 1}));
		const long = shortForm({...plan, gearbox: 'Long name of a set', results: {...plan.results, shifts}});
		expect(long.line).toMatch(alphanumeric);
		expect(long.line.length).toBeLessThanOrEqual(195);
		expect(long.fields.shifts.length).toBe(19);
		expect(readShortForm(long.line)).toEqual({ok: true, fields: long.fields});
	});

	test('marks a name that was cut', () => {
		const track = {
			...plan.track,
			name: 'The very long name of a speedway somewhere in the hills, by the lake and the mill',
		};
		expect(shortForm({...plan, track}).fields.track).toMatch(/^The very long name of .*\+$/);
	});

	test('with one changed letter or digit is refused', {timeout: 900_000}, () => {
		const characters = fc.constantFrom(...'0123456789abcdefgXYZ');
		fc.assert(
			fc.property(fc.nat(line.length - 1), characters, (at, character) => {
				fc.pre(line[at] !== character);
				const reading = readShortForm(line.slice(0, at) + character + line.slice(at + 1));
				if (reading.ok) expect(reading.fields).toEqual(fields);
			}),
			{numRuns: runs(1000, 100_000), seed: 6},
		);
	});
});
