import {describe, expect, test} from 'vitest';
import type {Matters, Odds, OddsRow} from '../../source/odds/results.ts';
import {decisionSentences, inputLines, mattersSentences, sdText} from '../../source/text/chances-view.ts';

const row = (pair: string, over: number, first: number): OddsRow => ({
	pair,
	gearbox: 'A',
	installed: false,
	barred: null,
	draws: 512,
	over: {value: over, error: 0.004},
	first: {value: first, error: 0.01},
	timeS: {mean: 20, sd: 0.1},
	highestRpm: {mean: 8900, sd: 50},
	lossS: 0.02,
});
const odds = (change: Partial<Odds> = {}): Odds => ({
	seed: 1,
	risk: null,
	rpmLimit: 9000,
	anchored: true,
	isComplete: true,
	draws: 512,
	inputs: [],
	notDrawn: [],
	rows: [row('33/38', 0.031, 0.8), row('32/39', 0.2, 0.2)],
	decision: {row: '33/38 A', next: '32/39 A', isDecided: true, open: []},
	...change,
});

describe('what is decided is said in a sentence', () => {
	test('without and with a risk', () => {
		expect(decisionSentences(odds())).toEqual([
			'33/38 A is most often the fastest that is allowed (80.0 ± 1.0 %); its chance of passing the limit is 3.1 ± 0.4 %.',
			'Next is 32/39 A: fastest in 20.0 ± 1.0 %, over the limit in 20.0 ± 0.4 %.',
		]);
		expect(decisionSentences(odds({risk: 0.05}))[0]).toBe(
			'33/38 A is the fastest on the mean within a risk of 5.0 %: its chance of passing the limit is 3.1 ± 0.4 %.',
		);
	});

	test('what is open is said', () => {
		const decision = {row: '33/38 A', next: '32/39 A', isDecided: false, open: ['whether 33/38 A is within the risk']};
		expect(decisionSentences(odds({decision})).at(-1)).toBe(
			'Not decided: whether 33/38 A is within the risk. More draws would not be worth it; better numbers would.',
		);
		expect(decisionSentences(odds({decision, isComplete: false})).at(-1)).toBe(
			'Not decided yet: whether 33/38 A is within the risk.',
		);
		const none = {row: null, next: null, isDecided: true, open: []};
		expect(decisionSentences(odds({risk: 0.01, decision: none}))).toEqual([
			'No row has a chance of passing the limit within 1.0 %.',
		]);
	});
});

test('what matters most says what to measure', () => {
	const matters: Matters = {
		rows: ['33/38 A', '32/39 A'],
		difference: [
			{name: 'rollout', kind: 'rollout', share: {value: 0.62, error: 0.05}},
			{name: 'grip', kind: 'grip', share: {value: 0.2, error: 0.05}},
		],
		margin: [{name: 'exit of Front', kind: 'exit', share: {value: 0.4, error: 0.3}}],
	};
	expect(mattersSentences(matters)).toEqual([
		'Roll the tires out again: it decides between 33/38 A and 32/39 A (62 % of what moves their difference in time).',
	]);
	expect(mattersSentences({...matters, difference: []})).toEqual([
		'No number by itself moves the margin or the choice much.',
	]);
});

test('a standard deviation is told in the units that are read', () => {
	expect(sdText({sd: 0.44704, unit: 'speed'}, 'us')).toBe('1.0 mph');
	expect(sdText({sd: 2, unit: 'temperature'}, 'us')).toBe('3.6°F');
	expect(sdText({sd: 2, unit: 'temperature'}, 'metric')).toBe('2.0°C');
	expect(sdText({sd: 0.0015, unit: 'share'}, 'us')).toBe('0.15 % of it');
	expect(sdText({sd: Math.PI / 9, unit: 'angle'}, 'us')).toBe('20 degrees');
});

test('inputs that are as well known for the same reason share a line', () => {
	const input = (name: string) =>
		({name, kind: 'exit', sd: 0.44704, unit: 'speed', source: 'default', why: 'laps differ'}) as const;
	expect(inputLines(['a', 'b'].map(input), 'us')).toEqual(['a, b ± 1.0 mph: laps differ']);
	expect(inputLines(['a', 'b', 'c', 'd', 'e'].map(input), 'us')).toEqual(['a, b, c and 2 more ± 1.0 mph: laps differ']);
});
