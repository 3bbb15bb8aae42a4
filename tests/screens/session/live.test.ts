import {expect, test} from 'vitest';
import {valueAt} from '../../../source/documents/json.ts';
import type {Keeper} from '../../../source/screens/keeper.ts';
import {current, type Documents, type OpenDocument} from '../../../source/screens/session/documents.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {errandsInMemory} from '../errands.ts';
import {catalog, session} from './documents.ts';
// What the session loads when it is first needed: loaded here, so that no load outlives a test.
import '../../../source/screens/session/handing.ts';
import '../../../source/screens/session/incoming.ts';

function started(start: Session = session()) {
	const kept: {documents: Documents | undefined; saved: OpenDocument[]} = {documents: undefined, saved: []};
	const {errands, done} = errandsInMemory();
	const keeper: Keeper = {
		keep: documents => {
			kept.documents = documents;
		},
		drop: () => {
			kept.documents = undefined;
		},
		earlier: undefined,
		dropEarlier() {},
		save: document => {
			kept.saved.push(document);
			return {ok: true, words: 'Saved.'};
		},
		where: () => undefined,
		errands,
	};
	const asked: string[] = [];
	const outside = {
		leave: () => asked.push('leave'),
		suspend: () => asked.push('suspend'),
		redraw: () => asked.push('redraw'),
	};
	const waiting: (() => void)[] = [];
	const clock = {
		now: () => 0,
		later: (act: () => void) => {
			waiting.push(act);
			return () => waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const live = new LiveSession(start, catalog, keeper, outside, clock);
	for (const act of waiting.splice(0)) act();
	const press = (keys: string) => {
		const decoder = new KeyDecoder();
		for (const event of [...decoder.push(keys), ...decoder.flush()]) live.press(event);
		return live.state();
	};
	return {live, press, kept, asked, done};
}
const [down, up, right, left, esc] = ['\x1B[B', '\x1B[A', '\x1B[C', '\x1B[D', '\x1B'];
const here = ({session: {row}}: {session: Session}) => row;

test('from a start to the ranking of another track in three keys', () => {
	const {press} = started();
	const state = press('tä\r');
	expect(current(state.session.history.present, 'track').id).toBe('track:other');
	expect(state.answer.is).toBe('ready');
	expect(state.session.place.at).toBe('ranking');
});

test('the arrows move along the ranking, and step to the shorter and the taller pair', () => {
	const {press, live} = started();
	const rows = live.state().scene.shown;
	expect(here(press(down))).toBe(rows[1]!.name);
	expect(here(press('jjk'))).toBe(rows[2]!.name);
	expect(here(press(up))).toBe(rows[1]!.name);
	const ratio = (name: string | undefined) => rows.find(row => row.name === name)!.row.pairRatio;
	const start = ratio(rows[1]!.name);
	const shorter = ratio(here(press(right)));
	expect(shorter).toBeGreaterThan(start);
	expect(ratio(here(press(left)))).toBe(start);
});

test('at the end of the rack a step says so', () => {
	const {press} = started();
	expect(press(right.repeat(9)).session.notice).toBe('No shorter pair on the rack for this set.');
});

test('an edit is kept for the next start, and undone it is not', () => {
	const {press, kept} = started();
	press(`e\t${down}80\r`);
	expect(valueAt(kept.documents!.open['track:oval']!.json, ['straights', 0, 'exit'])).toBe('80 mph');
	press('u');
	expect(kept.documents).toBeUndefined();
});

test('an edit is ranked anew, and the cursor stays on its pair', () => {
	const {press, live} = started();
	press(down);
	const before = here(live.state());
	const state = press(`e\t${down}60\r${esc}`);
	expect(state.answer).toMatchObject({is: 'ready', ranked: {ranking: {rows: expect.any(Array)}}});
	expect(here(state)).toBe(before);
	expect(state.scene.all[0]!.row.situations[0]!.straights[0]!.exitSpeedMps).toBeCloseTo(60 * 0.44704, 9);
});

test('situations go round, and one alone is ranked alone', () => {
	const {press} = started();
	expect(press('s').session.situation).toBe('Base');
	const tow = press('s');
	expect(tow.session.situation).toBe('In the tow');
	expect(tow.scene.all[0]!.row.situations.map(({name}) => name)).toEqual(['In the tow']);
	expect(press('s').session.situation).toBeUndefined();
});

test('comparison, plan, order, filter and units are switched by their keys', () => {
	const {press} = started();
	expect(press('c').session.comparison).toBeDefined();
	expect(press('c').session.comparison).toBeUndefined();
	expect(press('p').session.plan).toBeDefined();
	expect(press('o').session.order).toBe('ratio');
	expect(press('h').session.filter.hideFailing).toBe(true);
	expect(press('b').session.filter.gearbox).toBe('A');
	expect(press('m').session.units).toBe('metric');
});

test('the pair under the cursor goes into the car', () => {
	const {press} = started();
	press(down);
	const state = press('i');
	const {row} = state.scene.all.find(({row}) => row.installed)!;
	expect(`${row.pair} ${row.gearbox}`).toBe(here(state));
});

test('leaving with unsaved changes asks first; saving then leaves', () => {
	const {press, kept, asked, live} = started();
	press(`e\t${down}80\r${esc}`);
	expect(press('q').session.over?.is).toBe('quitting');
	expect(asked).toEqual([]);
	press('s');
	expect(asked).toEqual(['leave']);
	expect(kept.saved.map(({id}) => id)).toEqual(['track:oval']);
	expect(live.state().session.notice).toBe('Saved.');
	expect(kept.documents).toBeUndefined();
});

test('without changes leaving does not ask; Ctrl+C never does, and keeps what was changed', () => {
	const {press, asked, kept} = started();
	press('q');
	expect(asked).toEqual(['leave']);
	press(`e\t${down}80\r\x03`);
	expect(asked).toEqual(['leave', 'leave']);
	expect(kept.documents).toBeDefined();
});

test('what was discarded is not kept', () => {
	const {press, kept} = started();
	press(`e\t${down}80\r${esc}`);
	press('qd');
	expect(kept.documents).toBeUndefined();
});

test('any key that is not known changes nothing, in any place', () => {
	const {press, live} = started();
	const unknown = [
		'\x1B[1;5P',
		'\x1B[1;5R',
		'\x1B[25;5~',
		'\x1B[24~',
		'\x1B[97;5u',
		'\x1Bx',
		'\x07',
		'\x1B[<0;3;3M',
		'\x1B]0;x\x07',
	];
	for (const open of ['', 'e', '1', `${esc}${esc}t`, `${esc}w`, 'g', '?', esc]) {
		press(open);
		const before = live.state().session;
		for (const keys of unknown) press(keys);
		expect(live.state().session).toEqual({...before, notice: live.state().session.notice});
	}
});

test('a paste where nothing is typed is passed over', () => {
	const {press, live} = started();
	const before = live.state().session;
	expect(press('\x1B[200~q\ru\x1B[201~').session).toBe(before);
	expect(live.state().session.history.past).toEqual([]);
});

test('thousands of keys in every place end in a session that still ranks', () => {
	const {press, live} = started();
	const keys = [
		'j',
		'k',
		right,
		left,
		'\r',
		'\t',
		esc,
		'e',
		'g',
		'w',
		't',
		'c',
		's',
		'o',
		'h',
		'b',
		'a',
		'x',
		'u',
		'U',
		']',
		'[',
		'7',
		' ',
		'\x7F',
		'?',
		'm',
		'p',
		'n',
		'l',
		'd',
		'f',
		'y',
	];
	let state = 12345;
	for (let i = 0; i < 2000; i++) {
		state = (Math.imul(state, 1103515245) + 12345) >>> 0;
		press(keys[(state >>> 16) % keys.length]!);
	}
	expect(['ready', 'faulty']).toContain(live.state().answer.is);
});
