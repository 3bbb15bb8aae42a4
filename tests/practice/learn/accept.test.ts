import {describe, expect, test} from 'vitest';
import {withEdits} from '../../../source/documents/edits.ts';
import {type JsonObject, valueAt, withValue} from '../../../source/documents/json.ts';
import {learnedIn} from '../../../source/documents/learned.ts';
import {mphMps} from '../../../source/drivetrain/constants.ts';
import {rankRack} from '../../../source/planning/rank-rack.ts';
import type {Ranking} from '../../../source/planning/results.ts';
import {acceptEdits, pathOf, takeablesIn, takeBackEdits} from '../../../source/practice/learn/accept.ts';
import {effectOf} from '../../../source/practice/learn/effect.ts';
import {candidateFor, learnFromSeen} from '../../../source/practice/learn/learn.ts';
import {type DocumentsAsWritten, type Proposal, proposalsOf} from '../../../source/practice/learn/proposals.ts';
import type {Held, Seen} from '../../../source/practice/learn/seen.ts';
import {demoDocuments, subjectOf} from './subject.ts';

const documents = demoDocuments();
const subject = subjectOf(documents);
const mounted = candidateFor(subject.car, {driving: 34, driven: 35}, 'C');
if (!mounted.ok) throw new Error('34/35 and set C are not on the demo rack');
const candidate = mounted.value;
const known: Seen = {index: 1, rpm: 8650, speedMps: 180 * mphMps, gear: 5, candidate};

function proposed(seen: readonly Seen[], held: Held, of: DocumentsAsWritten = documents): Proposal[] {
	const here = subjectOf(of);
	const outcome = learnFromSeen(here, seen, held);
	if (!outcome.ok) throw new Error('no plan');
	return proposalsOf(here, of, outcome.value, undefined, 'us');
}

const origin = {from: '1 number seen by hand', date: '2026-05-02'};
const accept = (proposals: readonly Proposal[], of: DocumentsAsWritten): DocumentsAsWritten => {
	const edits = acceptEdits(proposals, of, origin);
	return {track: withEdits(of.track, edits.track), car: withEdits(of.car, edits.car)};
};
const takeBack = (of: DocumentsAsWritten, name?: string): DocumentsAsWritten => {
	const edits = takeBackEdits(
		takeablesIn(of).filter(one => name === undefined || one.name === name),
		of,
	);
	return {track: withEdits(of.track, edits.track), car: withEdits(of.car, edits.car)};
};
const at = (document: JsonObject, path: string) => valueAt(document, pathOf(path));

describe('what is proposed', () => {
	test('says what stands there, what would, and where', () => {
		const rows = proposed([known], 'speed').map(({name, rows}) => [
			name,
			...rows.map(row => [row.label, row.now, row.value]),
		]);
		expect(rows).toEqual([
			[
				'rollout',
				['rollout left', '87.3 in', '86.10 in ± 0.31 in'],
				['rollout right', '88.1 in', '86.89 in ± 0.31 in'],
			],
			['drag', ['drag area', '0.9 m^2', '0.907 m^2 ± 0.020 m^2']],
			[
				'measured:Back',
				['measured speed Back', '180.0 mph', '180.0 mph ± 0.5 mph'],
				['measured RPM Back', '', '8650 ± 20'],
				['measured with pair Back', '34/34', '34/35'],
			],
		]);
	});

	test('keeps the stagger in proportion', () => {
		const [left, right] = proposed([known], 'speed')[0]!.rows.map(({value}) => Number.parseFloat(String(value)));
		expect(right! / left!).toBeCloseTo(88.1 / 87.3, 4);
	});

	test('of a speed that is only what the RPM says leaves no older measurement beside it', () => {
		const [measured] = proposed([{index: 1, rpm: 8650, candidate}], 'circumference').slice(-1);
		expect(measured?.rows.map(({path, value}) => [path.at(-1), value])).toEqual([
			['end', '182.7 mph ± 0.5 mph'],
			['rpm', '8650 ± 20'],
			['pair', '34/35'],
		]);
	});
});

describe('accepting', () => {
	test('writes each field with the record of where it came from, and nothing else', () => {
		const after = accept(proposed([known], 'speed'), documents);
		expect(after.car).toEqual(documents.car);
		expect(at(after.track, 'car.tires.left')).toBe('86.10 in ± 0.31 in');
		expect(learnedIn(after.track)[0]).toEqual({field: 'car.tires.left', value: '86.10 in ± 0.31 in', ...origin});
		expect(learnedIn(after.track)[3]).toEqual({
			field: 'straights[1].measured.end',
			value: '180.0 mph ± 0.5 mph',
			before: '180.0 mph',
			...origin,
		});
		const {learned: _, car: __, straights: ___, ...rest} = after.track;
		const {car: _____, straights: ____, ...before} = documents.track;
		expect(rest).toEqual(before);
	});

	test('field by field leaves the others alone', () => {
		const drag = proposed([known], 'speed').filter(({name}) => name === 'drag');
		const after = accept(drag, documents);
		expect(after.track.car).toEqual({dragArea: '0.907 m^2 ± 0.020 m^2'});
		expect(learnedIn(after.track)).toHaveLength(1);
	});

	test('gives documents that their readers take, with the uncertainties', () => {
		const {uncertainties} = subjectOf(accept(proposed([known], 'speed'), documents));
		expect(uncertainties.track.get('car.tires.left')).toBeCloseTo(0.31 * 0.0254, 10);
		expect(uncertainties.track.get('straights[1].measured.rpm')).toBe(20);
	});

	test('what practice then says again is no change', () => {
		const after = accept(proposed([known], 'speed'), documents);
		expect(proposed([known], 'speed', after)).toEqual([]);
		expect(proposed([{...known, rpm: 8500}], 'speed', after).map(({name}) => name)).toContain('rollout');
	});
});

describe('taking back', () => {
	test('all puts the documents back as they were', () => {
		expect(takeBack(accept(proposed([known], 'speed'), documents))).toEqual(documents);
	});

	test('one field leaves the others', () => {
		const after = takeBack(accept(proposed([known], 'speed'), documents), 'rollout');
		expect(after.track.car).toEqual({dragArea: '0.907 m^2 ± 0.020 m^2'});
		expect(takeablesIn(after).map(({name}) => name)).not.toContain('rollout');
	});

	test('goes back one acceptance at a time', () => {
		const once = accept(proposed([known], 'speed'), documents);
		const twice = accept(proposed([{...known, rpm: 8600}], 'speed', once), once);
		expect(at(takeBack(twice, 'rollout').track, 'car.tires.left')).toBe('86.10 in ± 0.31 in');
		expect(takeBack(takeBack(twice))).toEqual(documents);
	});

	test('keeps what somebody typed since, and drops the record', () => {
		const accepted = accept(proposed([known], 'speed'), documents);
		const typed = {...accepted, track: withValue(accepted.track, ['car', 'dragArea'], '0.95 m^2')};
		expect(takeablesIn(typed).find(({name}) => name === 'drag')?.untouched).toBe(false);
		const after = takeBack(typed);
		expect(after.track.car).toEqual({dragArea: '0.95 m^2'});
		expect(learnedIn(after.track)).toEqual([]);
	});
});

describe('the effect on the ranking', () => {
	const rankingOf = (of: DocumentsAsWritten): Ranking => {
		const {car, track} = subjectOf(of);
		const ranked = rankRack(car, track);
		if (!ranked.ok) throw new Error('no ranking');
		return ranked.value;
	};
	const before = rankingOf(documents);

	test('names the first before and after, and the RPM between them at the end where it counts', () => {
		const rows = proposed([known], 'speed').filter(({name}) => name === 'rollout');
		const {changed, words} = effectOf(before, rankingOf(accept(rows, documents)));
		expect(changed).toBe(true);
		expect(words).toMatch(
			/^First was 34\/35 C, now 35\/33 B: 2\d\d rpm less at the end of Front \(In the tow\)\. 34\/35 C now fails, over the limit: /,
		);
	});

	test('says so where the first stays, with what it turns now', () => {
		const {changed, words} = effectOf(before, before);
		expect(changed).toBe(false);
		expect(words).toMatch(/^34\/35 C stays first: \d{4} rpm at the end of Front \(In the tow\), as before\.$/);
	});
});

test('a path is the inverse of its text', () => {
	expect(pathOf('straights[1].measured.end')).toEqual(['straights', 1, 'measured', 'end']);
	expect(pathOf('car.tires.left')).toEqual(['car', 'tires', 'left']);
});
