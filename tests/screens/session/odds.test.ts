import {describe, expect, test, vi} from 'vitest';
import {rankSteps} from '../../../source/planning/rank-rack.ts';
import {finish} from '../../../source/planning/run-rack.ts';
import {actionFor} from '../../../source/screens/keys/key-table.ts';
import {editLine} from '../../../source/screens/parts/edit-line.ts';
import {readBoth} from '../../../source/screens/session/answer.ts';
import {scopesOf, takesText} from '../../../source/screens/session/held-scopes.ts';
import {intend} from '../../../source/screens/session/intend.ts';
import {Odder} from '../../../source/screens/session/odder.ts';
import {placedByRisk} from '../../../source/screens/session/odds-work.ts';
import type {Clock} from '../../../source/screens/session/ranker.ts';
import {reduce} from '../../../source/screens/session/reduce.ts';
import {riskEntry} from '../../../source/screens/session/reduce-risk.ts';
import {linesOf, stateOf} from '../views/states.ts';
import {after, documents, session, typed} from './documents.ts';

const inOdds = (change = {}) => session({place: {at: 'odds', scroll: 0}, ...change});

describe('the risk is typed', () => {
	const withRisk = (text: string, start = inOdds()) =>
		after(start, {do: 'cover', over: {...riskEntry(start), line: editLine('')}}, ...typed(text), {
			do: 'accept risk',
		});

	test.each([
		['5 %', 0.05],
		['2.5', 0.025],
		['0', 0],
	])('"%s" is a risk of %d', (text, risk) => {
		const accepted = withRisk(text);
		expect(accepted.risk).toBeCloseTo(risk, 12);
		expect(accepted.over).toBeUndefined();
	});

	test('nothing typed accepts none', () => {
		expect(withRisk('', inOdds({risk: 0.05})).risk).toBeUndefined();
	});

	test.each(['100 %', '-1', 'five', '5 mph'])('"%s" is refused', text => {
		const refused = withRisk(text);
		expect(refused.risk).toBeUndefined();
		expect(refused.over).toMatchObject({is: 'risk', wrong: expect.stringContaining('a percentage from 0')});
	});

	test('v leads to the odds, n to the risk, where letters are text', () => {
		const start = stateOf(session());
		expect(actionFor('v', scopesOf(start.session))).toBe('odds');
		expect(intend('odds', start.session, start.scene)).toEqual({do: 'go', place: {at: 'odds', scroll: 0}});
		expect(actionFor('n', scopesOf(inOdds()))).toBe('risk');
		const risky = inOdds({risk: 0.05});
		const typing = reduce(risky, {do: 'cover', over: riskEntry(risky)});
		expect(takesText(typing)).toBe(true);
		expect(typing.over).toMatchObject({is: 'risk', line: {text: '5 %'}});
	});
});

test('the place tells chances, what to measure and one tooth, for the row under the cursor', () => {
	const told = linesOf(stateOf(inOdds({row: '34/37 A'})), {width: 140, height: 60, ascii: false}).join('\n');
	expect(told).toMatch(/16 draws, the same for every row/);
	expect(told).toMatch(/▸ +\d+ +34\/37/);
	expect(told).toMatch(/over limit +fastest/);
	expect(told).toContain('One tooth: 34/37 A');
	expect(told).toContain('rollout ± 0.15 % of it');
});

test('before the first draw it says that chances come', () => {
	const state = stateOf(inOdds());
	const waiting = {...state, scene: {...state.scene, odds: undefined}};
	expect(linesOf(waiting, {width: 80, height: 24, ascii: false}).join('\n')).toContain('chances come in a moment');
});

/** A clock that a test turns; looks at it take no time unless told. */
function clock(lookMs: number) {
	let now = 0;
	const waiting: (() => void)[] = [];
	const made: Clock = {
		now: () => {
			now += lookMs;
			return now;
		},
		later: act => {
			waiting.push(act);
			return () => waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const letGo = () => {
		for (const act of waiting.splice(0)) act();
	};
	return {made, waiting, letGo};
}

function asked() {
	const read = readBoth(documents);
	if (!read.ok) throw new Error('the fixtures are not read');
	const ranked = finish(rankSteps(read.car, read.track));
	if (!ranked.ok) throw new Error('the fixtures are not ranked');
	return {documents, situation: undefined, risk: 0.05, ranked: ranked.value};
}

test('odds are worked out in slices after other things, and told when they are done', async () => {
	const time = clock(4);
	let told = 0;
	const odder = new Odder(time.made, () => told++);
	const ask = asked();
	expect(odder.soFar(ask)).toEqual({odds: undefined, matters: undefined, isDone: false});
	await vi.waitFor(() => expect(time.waiting.length).toBe(1));
	let slices = 0;
	let early: number | undefined;
	for (; !odder.soFar(ask).isDone; slices++) {
		time.letGo();
		early ??= odder.soFar(ask).odds?.draws;
		expect(time.waiting.length).toBeLessThanOrEqual(1);
	}
	expect(slices).toBeGreaterThan(20);
	expect(told).toBeGreaterThan(1);
	expect(early).toBeLessThan(512);
	const {odds, matters} = odder.soFar(ask);
	expect(odds).toMatchObject({isComplete: true, risk: 0.05});
	expect(matters!.rows.length).toBeGreaterThan(0);
	const placed = placedByRisk(ask.ranked, odds!, 0.05);
	expect(placed.map(({place}) => place)).toEqual(placed.map((_, i) => i + 1));
	expect(placed[0]!.name).toBe(odds!.decision.row);

	expect(odder.tooth(placed[0]!.name)).toBeUndefined();
	while (odder.tooth(placed[0]!.name) === undefined) time.letGo();
	expect(odder.tooth(placed[0]!.name)!.of.row).toBe(placed[0]!.name);
	expect(time.waiting.length).toBe(0);
});

test('asked about something else it begins anew', async () => {
	const time = clock(0);
	const odder = new Odder(time.made, () => {});
	const ask = asked();
	odder.soFar(ask);
	await vi.waitFor(() => expect(time.waiting.length).toBe(1));
	while (!odder.soFar(ask).isDone) time.letGo();
	expect(odder.soFar({...ask, risk: 0.1})).toEqual({odds: undefined, matters: undefined, isDone: false});
});
