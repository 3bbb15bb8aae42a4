import {describe, expect, test, vi} from 'vitest';
import {learnedIn} from '../../../source/documents/learned.ts';
import {checkCar, checkTrack} from '../../../source/documents/read.ts';
import {planFor} from '../../../source/planning/plan.ts';
import {candidateFor} from '../../../source/practice/learn/learn.ts';
import type {Keeper} from '../../../source/screens/keeper.ts';
import {current} from '../../../source/screens/session/documents.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import {practiceOf} from '../../../source/screens/session/practice-of.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {csvOf} from '../../practice/csv.ts';
import {generateLog} from '../../practice/log-generator.ts';
import {errandsInMemory} from '../errands.ts';
import {car, catalog, oval, session} from './documents.ts';

/** `tickMs` passes each time the clock is looked at: with it a slice is one step. */
function started(start: Session = session(), tickMs = 0) {
	const {errands, done} = errandsInMemory();
	const keeper: Keeper = {
		keep() {},
		drop() {},
		earlier: undefined,
		dropEarlier() {},
		save: () => ({ok: true, words: 'Saved.'}),
		where: () => undefined,
		errands,
	};
	const waiting: (() => void)[] = [];
	let nowMs = 0;
	const clock = {
		now: () => {
			nowMs += tickMs;
			return nowMs;
		},
		later: (act: () => void) => {
			waiting.push(act);
			return () => {
				if (waiting.includes(act)) waiting.splice(waiting.indexOf(act), 1);
			};
		},
	};
	const live = new LiveSession(start, catalog, keeper, {leave() {}, suspend() {}, redraw() {}}, clock);
	/** What was put off until keys and drawing have had their turn. */
	const settle = () => {
		for (let act = waiting.shift(); act !== undefined; act = waiting.shift()) act();
	};
	settle();
	const press = (keys: string) => {
		for (const part of keys.split(new RegExp(`(${esc}(?!\\[))`))) {
			const decoder = new KeyDecoder();
			for (const event of [...decoder.push(part), ...decoder.flush()]) live.press(event);
		}
		settle();
		return live.state();
	};
	const until = (holds: () => unknown) =>
		vi.waitFor(() => {
			settle();
			expect(holds()).toBeTruthy();
		}, 10_000);
	const atPractice = async () => {
		press('l');
		await until(() => live.state().scene.practice?.taught);
	};
	/** Keys without what was put off; and one slice of that. */
	const type = (keys: string) => {
		const decoder = new KeyDecoder();
		for (const event of [...decoder.push(keys), ...decoder.flush()]) live.press(event);
	};
	const slice = () => waiting.shift()?.();
	return {live, press, until, atPractice, done, type, slice, waiting};
}
const [down, esc, enter, tab, del] = ['\x1B[B', '\x1B', '\r', '\t', '\x1B[3~'];
const trackOf = (live: LiveSession) => current(live.state().session.history.present, 'track').json;
const taughtIn = (live: LiveSession) => live.state().scene.practice?.taught;

test('from a measured peak RPM to the next pick in at most ten keys', async () => {
	const {live, press, until, atPractice} = started();
	await atPractice();
	const keys = ['l', down, '8', '4', '2', '0', enter];
	expect(keys.length).toBeLessThanOrEqual(10);
	press(keys.slice(1).join(''));
	expect(practiceOf(live.state().session).seen).toEqual([{straight: 'Back', text: '8420'}]);
	await until(() => typeof live.state().scene.practice?.effect === 'object');
	const {effect} = live.state().scene.practice!;
	expect(effect === 'working' ? '' : effect?.words).toMatch(/first/i);
});

test('a digit begins the number of the straight under the cursor, and Enter opens it again', async () => {
	const {live, press, atPractice} = started();
	await atPractice();
	press('84');
	expect(live.state().session.over).toMatchObject({is: 'entry', asks: 'seen', line: {text: '84'}});
	press(`20 gear 4 118 mph${enter}`);
	expect(practiceOf(live.state().session).seen).toEqual([{straight: 'Front', text: '8420 gear 4 118 mph'}]);
	press(enter);
	expect(live.state().session.over).toMatchObject({line: {text: '8420 gear 4 118 mph'}});
});

test('what cannot be understood stays open with what is wrong', async () => {
	const {live, press, atPractice} = started();
	await atPractice();
	press(`8420 gear 9${enter}`);
	expect(live.state().session.over).toMatchObject({is: 'entry', wrong: 'found gear 9; allowed from 1 to 5'});
	press(esc);
	expect(practiceOf(live.state().session).seen).toEqual([]);
});

test('h holds the other, Del takes the number away', async () => {
	const {live, press, atPractice} = started();
	await atPractice();
	press(`8420${enter}h`);
	expect(taughtIn(live)?.lesson?.learning).toMatchObject({held: 'speed', circumference: {withHeldSpeed: 1}});
	press(del);
	expect(taughtIn(live)?.lesson).toBeUndefined();
});

test('nothing changes before it is accepted; a line is, then taken back, and undone', async () => {
	const {live, press, atPractice, done} = started();
	await atPractice();
	press(`${down}8200${enter}`);
	expect(trackOf(live)).toBe(oval.json);
	press(`${tab}${enter}`);
	expect(learnedIn(trackOf(live)).map(({field, from}) => [field, from])).toEqual([
		['car.power', '1 number seen by hand'],
	]);
	expect(live.state().session.notice).toMatch(/^power is in the documents\. Ctrl\+S saves, u undoes\.$/);
	expect(done.entries.at(-1)?.remark).toMatch(/^learned from 1 number seen by hand: power /);
	press('b');
	expect(trackOf(live)).toEqual(oval.json);
	expect(done.entries.at(-1)?.remark).toMatch(/^taken back: car\.power/);
	press('u');
	expect(learnedIn(trackOf(live))).toHaveLength(1);
	press('u');
	expect(trackOf(live)).toBe(oval.json);
});

test('all is accepted at once, and what is ranked follows', async () => {
	const {live, press, until, atPractice} = started();
	await atPractice();
	press(`${down}8200${enter}a`);
	expect(trackOf(live).car).toEqual({power: expect.stringMatching(/ ± /)});
	await until(() => live.state().answer.is === 'ready');
	const {answer} = live.state();
	expect(answer.is === 'ready' && answer.ranked.ranking.setting.anchored).toBe(true);
});

test('grip asks for a log', async () => {
	const {live, press, atPractice} = started();
	await atPractice();
	press('g');
	expect(live.state().session.notice).toBe('Grip is learned from a logged run: f reads one.');
});

test('numbers belong to their track', async () => {
	const {live, press, atPractice} = started();
	await atPractice();
	press(`8420${enter}`);
	press(`${esc}tÄuß${enter}l`);
	expect(practiceOf(live.state().session).seen).toEqual([]);
});

function oneLog(): string {
	const [track, ours] = [checkTrack({...oval.json}), checkCar({...car.json})];
	if (!track.ok || !ours.ok) throw new Error('fixtures');
	const plan = planFor(ours.value, track.value);
	const mounted = candidateFor(ours.value, undefined, undefined);
	if (!plan.ok || !mounted.ok) throw new Error('fixtures');
	return csvOf(generateLog({seed: 2, plan: plan.value, mounted: mounted.value, driving: {laps: 6}}).run);
}

test('a log is read while keys are answered, and put away again', async () => {
	const {live, press, until, atPractice, done} = started();
	done.files.set('run.csv', oneLog());
	await atPractice();
	press(`frun.csv${enter}`);
	expect(live.state().session.notice).toMatch(/^Reading run\.csv/);
	press('m');
	expect(live.state().session.units).toBe('metric');
	await until(() => practiceOf(live.state().session).log);
	const {lesson} = taughtIn(live)!;
	expect(lesson?.learning.from).toBe('practice, 6 laps');
	expect(lesson?.learning.compared.map(({reading}) => reading.name)).toEqual(['Front', 'Back']);
	press('8');
	expect(live.state().session.notice).toMatch(/run\.csv is shown; Del puts it away/);
	expect(lesson?.learning.grip).toBeUndefined();
	press('g');
	expect(taughtIn(live)?.lesson?.learning.grip).toMatchObject({straights: expect.any(Array)});
	press(`g${tab}${tab}${tab}`);
	expect(taughtIn(live)?.lesson?.learning.grip).toBeUndefined();
	expect(live.state().session.place).toMatchObject({pane: 'gears'});
	press(del);
	expect(practiceOf(live.state().session).log).toBeUndefined();
	expect(live.state().session.place).toMatchObject({pane: 'numbers'});
});

test('a log that is not there, and columns that are none, are told', async () => {
	const {live, press, until, atPractice} = started();
	await atPractice();
	press(`fnone.csv${enter}`);
	await until(() => live.state().session.notice?.includes('there is no such file'));
	press(`frun.csv; tempo=Speed${enter}`);
	expect(live.state().session.over).toMatchObject({is: 'entry', wrong: expect.stringMatching(/tempo=Speed/)});
});

test('a log that says too little keeps the entry open, with what is asked for behind its name', async () => {
	const {live, press, until, atPractice, done} = started();
	done.files.set('run.csv', 'Time [s],GPS Speed [mph],Wheel Speed [mph],RPM\n0,100,101,5000\n0.1,100,101,5010\n');
	await atPractice();
	press(`frun.csv${enter}`);
	await until(() => live.state().session.over);
	const {over} = live.state().session;
	expect(over).toMatchObject({is: 'entry', asks: 'log', wrong: expect.stringContaining('2 columns')});
	expect(over?.is === 'entry' && over.line.text).toBe('run.csv; speed=');
});

describe('a log is looked through in slices', () => {
	const aSliceEach = 50;

	async function reading() {
		const screen = started(session(), aSliceEach);
		screen.done.files.set('run.csv', oneLog());
		await screen.atPractice();
		screen.type(`frun.csv${enter}`);
		await vi.waitFor(() => expect(screen.waiting.length).toBeGreaterThan(0));
		return screen;
	}

	test('between which keys are answered and what is looked for is told', async () => {
		const {live, type, slice} = await reading();
		const told = new Set<string | undefined>();
		let slices = 0;
		while (practiceOf(live.state().session).log === undefined) {
			slice();
			slices++;
			told.add(live.state().session.notice);
		}
		expect(slices).toBeGreaterThan(20);
		expect([...told]).toContain('run.csv: finding gears … Esc stops.');
		// What it teaches is worked out in slices too.
		expect(live.state().scene.practice?.taught).toBeUndefined();
		type('m');
		expect(live.state().session.units).toBe('metric');
		while (live.state().scene.practice?.taught === undefined) slice();
		expect(taughtIn(live)?.lesson?.learning.from).toBe('practice, 6 laps');
	});

	test('and Esc leaves it; another Esc leaves the place', async () => {
		const {live, type, slice, waiting} = await reading();
		for (let i = 0; i < 5; i++) slice();
		type(esc);
		expect(live.state().session).toMatchObject({
			place: {at: 'practice'},
			notice: 'The log is left; nothing of it was taken.',
		});
		while (waiting.length > 0) slice();
		expect(practiceOf(live.state().session).log).toBeUndefined();
		type(esc);
		expect(live.state().session.place.at).toBe('ranking');
	});
});

test('Esc leaves a log that is still being read, and what was read is not looked at', async () => {
	const {live, press, atPractice, done} = started();
	done.files.set('run.csv', oneLog());
	await atPractice();
	press(`frun.csv${enter}`);
	press(esc);
	expect(live.state().session.notice).toBe('The log is left; nothing of it was taken.');
	await new Promise(resolve => setImmediate(resolve));
	press('m');
	expect(live.state().session).toMatchObject({place: {at: 'practice'}, units: 'metric'});
	expect(practiceOf(live.state().session).log).toBeUndefined();
});
