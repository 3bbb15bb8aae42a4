import {describe, expect, test} from 'vitest';
import {mphMps} from '../../../source/drivetrain/constants.ts';
import {readSeen} from '../../../source/practice/learn/seen-text.ts';
import {demoDocuments, subjectOf} from './subject.ts';

const {car, track} = subjectOf(demoDocuments());
const installed = {pair: {driving: 34, driven: 35}, gearbox: 'C'};
const read = (text: string) => readSeen(text, car, track, installed);
const seen = (text: string) => {
	const reading = read(text);
	if (!reading.ok) throw new Error(`${reading.found}; ${reading.allowed}`);
	const {candidate, ...rest} = reading.seen;
	return {...rest, with: `${candidate.pairName} ${candidate.gearbox.name}`};
};
const given = (fields: object) => ({
	rpmSe: undefined,
	speedMps: undefined,
	speedSe: undefined,
	gear: undefined,
	with: '34/35 C',
	...fields,
});

describe('a line says what was seen', () => {
	test.each<[string, object]>([
		['Back 8420', {index: 1, rpm: 8420}],
		['back: 8420 rpm', {index: 1, rpm: 8420}],
		['Front 8420 rpm gear 5', {index: 0, rpm: 8420, gear: 5}],
		['Back 8420 rpm gear 4 185 mph', {index: 1, rpm: 8420, gear: 4, speedMps: 185 * mphMps}],
		['Back 8420 185 mph', {index: 1, rpm: 8420, speedMps: 185 * mphMps}],
		['Back 8420, 185 mph, gear 4', {index: 1, rpm: 8420, gear: 4, speedMps: 185 * mphMps}],
		['Back 8400+20 rpm 180+5 mph', {index: 1, rpm: 8420, speedMps: 185 * mphMps}],
		['Back 8420 ± 15 rpm', {index: 1, rpm: 8420, rpmSe: 15}],
		['Back 8420 +/- 15, 185 mph ± 1 mph', {index: 1, rpm: 8420, rpmSe: 15, speedMps: 185 * mphMps, speedSe: mphMps}],
		['Back 8420 pair 33/35 set A', {index: 1, rpm: 8420, with: '33/35 A'}],
		['Back 8420 gearbox "B", 300 km/h', {index: 1, rpm: 8420, speedMps: 300 / 3.6, with: '34/35 B'}],
	])('%s', (text, fields) => {
		const {speedMps, ...rest} = given(fields) as {speedMps: number | undefined};
		const got = seen(text);
		expect(got).toMatchObject(rest);
		if (speedMps === undefined) expect(got.speedMps).toBeUndefined();
		else expect(got.speedMps).toBeCloseTo(speedMps, 9);
	});

	test.each<[string, RegExp]>([
		['Bakc 8420', /"Bakc"; a straight of this track: Front, Back.*Did you mean "Back"/],
		['8420', /no straight/],
		['Back', /no RPM after Back/],
		['Back fast', /no RPM after Back/],
		['Back 84 rpm', /84 rpm; from 500 to 30000 rpm/],
		['Back 8420 rpm gear 9', /gear 9; from 1 to 5/],
		['Back 8420 rpm 185', /no unit/],
		['Back 8420 rpm 185 lb', /lb is a mass/],
		['Back 8420 rpm pair 33-35', /pair 33-35; driving\/driven/],
		['Back 8420 rpm pair 12/13', /a pair of this rack/],
		['Back 8420 rpm set Q', /"Q"; one of A, B, C/],
		['Backwards 8420', /"Backwards"/],
	])('%s is refused', (text, problem) => {
		const reading = read(text);
		const words = reading.ok ? 'read' : [reading.found, reading.allowed, reading.hint].filter(Boolean).join('; ');
		expect(words).toMatch(problem);
	});

	test('where there is one straight its name may be left out', () => {
		const one = {...track, straights: track.straights.slice(0, 1)};
		expect(readSeen('8420', car, one, installed)).toMatchObject({ok: true, seen: {index: 0, rpm: 8420}});
	});
});
