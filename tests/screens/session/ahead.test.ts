import {expect, test, vi} from 'vitest';
import type {Keeper} from '../../../source/screens/keeper.ts';
import {Ahead} from '../../../source/screens/session/ahead.ts';
import {gearsPlace, loadPlace} from '../../../source/screens/session/ahead-place.ts';
import {choicesFor} from '../../../source/screens/session/catalog.ts';
import {withJson} from '../../../source/screens/session/documents.ts';
import {startHistory} from '../../../source/screens/session/history.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {errandsInMemory} from '../errands.ts';
import {car, catalog, documents, session, withGears} from './documents.ts';

function started(start: Session = session()) {
	const keeper: Keeper = {
		keep() {},
		drop() {},
		earlier: undefined,
		dropEarlier() {},
		save: () => ({ok: true, words: 'Saved.'}),
		where: () => undefined,
		errands: errandsInMemory().errands,
	};
	const waiting: (() => void)[] = [];
	const clock = {
		now: () => 0,
		later: (act: () => void) => {
			waiting.push(act);
			return () => waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const live = new LiveSession(start, catalog, keeper, {leave() {}, suspend() {}, redraw() {}}, clock);
	const work = () => {
		while (waiting.length > 0) for (const act of waiting.splice(0)) act();
	};
	const press = (keys: string) => {
		const decoder = new KeyDecoder();
		for (const event of [...decoder.push(keys), ...decoder.flush()]) live.press(event);
		return live.state();
	};
	/** When what is asked for has been loaded and worked out. */
	const told = () =>
		vi.waitFor(() => {
			work();
			const {ahead} = live.state().scene;
			expect(ahead?.is).toMatch(/^(load|gears|faulty|empty)$/);
			return ahead!;
		}, 10_000);
	work();
	return {press, told};
}
const [down, right, left] = ['\x1B[B', '\x1B[C', '\x1B[D'];

test('the load list begins with the track that is looked at, and follows what lies ahead and how many steps', async () => {
	const {press, told} = started();
	press('T');
	const one = await told();
	if (one.is !== 'load') throw new Error(one.is);
	expect(one.list.tracks.map(({track}) => track)).toEqual(['Fixture Oval']);
	expect(press(' ').session.ahead).toEqual([]);
	expect(await told()).toEqual({is: 'empty'});
	press(` ${down} ${right}${left}`);
	const two = await told();
	if (two.is !== 'load') throw new Error(two.is);
	expect(two.list).toMatchObject({shorter: 2, taller: 2});
	expect(two.list.tracks.map(({track}) => track)).toEqual(['Fixture Oval', 'Äußere Bahn']);
});

test('steps start again from none after five, and the cursor stays in the list', () => {
	const {press} = started(session({place: loadPlace}));
	expect(press(right.repeat(5)).session.place).toMatchObject({shorter: 0, taller: 1});
	expect(press(down.repeat(9)).session.place).toMatchObject({cursor: 1});
	expect(press('b').session.place).toMatchObject({eachSet: true});
});

test('gears to build need single gears; with them there are sets, and one for all where that is asked for', async () => {
	const bare = started();
	bare.press('G');
	expect(await bare.told()).toMatchObject({is: 'faulty', words: [expect.stringContaining('no single gears')]});
	const stocked = started(session({history: startHistory(withJson(documents, 'car', withGears(car.json)))}));
	stocked.press('G');
	const each = await stocked.told();
	if (each.is !== 'gears') throw new Error(each.is);
	expect(each.answer.sets).toBe(16);
	expect(each.answer.common).toEqual([]);
	stocked.press('b');
	const together = await stocked.told();
	if (together.is !== 'gears') throw new Error(together.is);
	expect(together.answer.common.length).toBeGreaterThan(0);
});

test('moving the cursor and scrolling work nothing out again, another place does', () => {
	const acts: (() => void)[] = [];
	const clock = {
		now: () => 100 * acts.length,
		later: (act: () => void) => {
			acts.push(act);
			return () => {};
		},
	};
	const ahead = new Ahead(clock, () => {});
	const choices = choicesFor(catalog, documents, 'track', '');
	const first = ahead.of(session({place: loadPlace}), choices);
	expect(ahead.of(session({place: {...loadPlace, cursor: 1, scroll: 8}}), choices)).toBe(first);
	expect(acts).toHaveLength(1);
	ahead.of(session({place: gearsPlace}), choices);
	expect(acts).toHaveLength(2);
});
