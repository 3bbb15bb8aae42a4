import {describe, expect, test} from 'vitest';
import {actionFor} from '../../../source/screens/keys/key-table.ts';
import {withJson} from '../../../source/screens/session/documents.ts';
import {scopesOf} from '../../../source/screens/session/held-scopes.ts';
import {startHistory} from '../../../source/screens/session/history.ts';
import {intend} from '../../../source/screens/session/intend.ts';
import {reduce} from '../../../source/screens/session/reduce.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {linesOf, stateOf} from '../views/states.ts';
import {documents, oval, session} from './documents.ts';

const at = (change: Partial<Session> = {}, scroll = 0) => stateOf(session({place: {at: 'life', scroll}, ...change}));
const lines = (change: Partial<Session> = {}, size = {width: 140, height: 45, ascii: false}) =>
	linesOf(at(change), size);
const withTrack = (json: object) => ({
	history: startHistory(withJson(documents, 'track', {...oval.json, ...json})),
});

test('f leads to engine life and fuel from the ranking, r back', () => {
	const start = stateOf(session());
	expect(actionFor('f', scopesOf(start.session))).toBe('life');
	const action = intend('life', start.session, start.scene);
	expect(action).toEqual({do: 'go', place: {at: 'life', scroll: 0}});
	const there = reduce(start.session, action as Exclude<typeof action, string | undefined>);
	expect(there.place).toEqual({at: 'life', scroll: 0});
	expect(actionFor('r', scopesOf(there))).toBe('ranking');
});

describe('the place', () => {
	test('tells of the row under the cursor against the one in the car', () => {
		expect(lines({row: '34/37 A'}).join('\n')).toMatch(/34\/37 A against 36\/36 A\*/);
	});

	test('tells of the row in the car against the first of the ranking', () => {
		const first = at().scene.all[0]!.name;
		expect(lines({row: '36/36 A'}).join('\n')).toContain(`36/36 A* against ${first}`);
	});

	test('tells against the row that all are compared with, where there is one', () => {
		expect(lines({row: '34/37 A', comparison: '34/37 B'}).join('\n')).toContain('34/37 A against 34/37 B');
	});

	test('moves with an edit', () => {
		const turns = (all: string[]) => all.find(each => each.startsWith('engine turns a race'));
		const [short, long] = [withTrack({laps: 100}), withTrack({laps: 200})];
		expect(turns(lines(short))).toBeDefined();
		expect(turns(lines(short))).not.toBe(turns(lines(long)));
	});

	test('goes by the situation that is chosen', () => {
		expect(lines({situation: 'In the tow'}).join('\n')).toMatch(/against \S+ \S+ · In the tow/);
	});

	test('scrolls on a small screen to what it assumes', () => {
		const size = {width: 80, height: 24, ascii: false};
		expect(linesOf(at({}, 0), size).join('\n')).toMatch(/more lines, PgDn/);
		expect(linesOf(at({}, 200), size).join('\n')).toContain("the engine builder's limit");
	});

	test('says what it needs of a track without lengths', () => {
		const straights = [{name: 'Front', exit: '76 mph', end: '100 mph'}];
		expect(lines(withTrack({straights})).join('\n')).toContain('No straight of this track has a length');
	});
});
