import {expect, test, vi} from 'vitest';
import type {Keeper} from '../../../source/screens/keeper.ts';
import {current} from '../../../source/screens/session/documents.ts';
import {items} from '../../../source/screens/session/hand-over.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import type {Session} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {readShared} from '../../../source/sharing/read-shared.ts';
import {readShortForm} from '../../../source/sharing/short-form.ts';
import {errandsInMemory} from '../errands.ts';
import {catalog, oval, session} from './documents.ts';

function started(start: Session = session()) {
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
	const clock = {
		now: () => 0,
		later: (act: () => void) => {
			waiting.push(act);
			return () => waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const live = new LiveSession(start, catalog, keeper, {leave() {}, suspend() {}, redraw() {}}, clock);
	for (const act of waiting.splice(0)) act();
	const press = (keys: string) => {
		// A lone Esc comes by itself, as from a person.
		for (const part of keys.split(new RegExp(`(${esc}(?!\\[))`))) {
			const decoder = new KeyDecoder();
			for (const event of [...decoder.push(part), ...decoder.flush()]) live.press(event);
		}
		return live.state();
	};
	const until = (holds: () => unknown) => vi.waitFor(() => expect(holds()).toBeTruthy(), 5000);
	/** At the place, with what is handed over made. */
	const handing = async (keys = '') => {
		press(`${keys}x`);
		await until(() => live.state().scene.handed);
	};
	return {live, press, until, handing, done};
}
const [down, esc] = ['\x1B[B', '\x1B'];
const paste = (text: string) => `\x1B[200~${text}\x1B[201~`;
const notice = ({session: {notice}}: {session: Session}) => notice;

test('the row under the cursor is handed over, and the plan where one is chosen', async () => {
	const {press, handing, live} = started();
	await handing();
	const first = live.state().scene.shown[0]!.row;
	expect(live.state().scene.handed!.text).toContain(`pair ${first.pair},`);
	press(`${esc}${down}${down}p${esc}`);
	await handing('k');
	const planned = live.state().scene.shown[2]!.row;
	expect(live.state().scene.handed!.text).toContain(`pair ${planned.pair},`);
});

test('what is handed over reads back as the same pair, set and day', async () => {
	const {live, handing} = started();
	await handing();
	const {pair, gearbox} = live.state().scene.shown[0]!.row;
	const reading = await readShared(live.state().scene.handed!.text);
	expect(reading).toMatchObject({ok: true, form: 'plan', plan: {pair, gearbox, date: '2026-05-31T18:05:00Z'}});
});

test('each of the list is there, and the list goes round', async () => {
	const {live, press, handing} = started();
	await handing();
	const texts = items.map(() => {
		const {text} = live.state().scene.handed!;
		press('j');
		return text.split('\n')[0]!;
	});
	expect(texts[1]).toMatch(/^DR1 Fixture Oval short: /);
	expect(texts[2]).toBe(texts[0]);
	expect(texts[3]).toBe(texts[1]);
	expect(texts.slice(4)).toEqual(['DRIVER CARD', 'SWAP SHEET', "ENGINE BUILDER'S SHEET"]);
	expect(live.state().session.place).toMatchObject({item: 'plan as text'});
});

test('with one situation looked at alone, plans are about all of them', async () => {
	const {live, handing} = started();
	await handing();
	const whole = live.state().scene.handed!.text;
	const alone = started();
	await alone.handing('ss');
	expect(alone.live.state().session.situation).toBe('In the tow');
	const text = alone.live.state().scene.handed!.text;
	const highest = (plan: string) => plan.split('\n').filter(line => line.startsWith('Highest')).length;
	expect(highest(text)).toBe(highest(whole));
});

test('it is copied as it is shown', async () => {
	const {press, handing, done, live} = started();
	await handing();
	press('j');
	const {text} = live.state().scene.handed!;
	expect(notice(press('c'))).toBe('Sent.');
	expect(done.copied).toEqual([text]);
	expect(readShortForm(text).ok).toBe(true);
});

test('a file is written under the name that is proposed, or that is typed', async () => {
	const {press, handing, done} = started();
	await handing();
	expect(press('jjjjf').session.over).toMatchObject({is: 'entry', line: {text: 'fixture-oval-driver-card.txt'}});
	expect(notice(press('\r'))).toBe('Written to fixture-oval-driver-card.txt.');
	press('f\x15other.txt\r');
	expect([...done.files.keys()]).toEqual(['fixture-oval-driver-card.txt', 'other.txt']);
	expect(done.files.get('other.txt')).toMatch(/^DRIVER CARD\n/);
});

test('a file that is there is written over only when that is said, and the typed name is not lost', async () => {
	const {press, handing, done} = started();
	await handing();
	done.files.set('a.txt', 'before');
	expect(press('f\x15a.txt\r').session.over).toEqual({is: 'overwriting', file: 'a.txt'});
	expect(press('\r').session.over?.is).toBe('overwriting');
	expect(press(esc).session.over).toMatchObject({is: 'entry', line: {text: 'a.txt'}});
	expect(done.files.get('a.txt')).toBe('before');
	expect(press('\ry').session.over).toBeUndefined();
	expect(done.files.get('a.txt')).toMatch(/^DROPRACK PLAN 1/);
});

test('what cannot be written is told where it was typed', async () => {
	const {press, handing} = started();
	await handing();
	expect(press('f\x15/full/a\r').session.over).toMatchObject({is: 'entry', wrong: 'the disk is full (ENOSPC).'});
	expect(press('\x15\r').session.over).toMatchObject({wrong: 'a name is needed; Esc goes back'});
	expect(press(esc).session.place.at).toBe('hand over');
});

test('notes belong to the track: they are in the plan, undone and saved with it', async () => {
	const {press, handing, live} = started();
	await handing();
	press('nloose on old tires\r');
	expect(live.state().scene.handed!.text).toContain('Notes: loose on old tires');
	expect(live.state().session.history.present.open['track:oval']).toMatchObject({notes: 'loose on old tires'});
	expect(press('q').session.over?.is).toBe('quitting');
	press(`${esc}u`);
	expect(current(live.state().session.history.present, 'track').notes).toBeUndefined();
	press('U\x13');
	expect(current(live.state().session.history.present, 'track')).toMatchObject({savedNotes: 'loose on old tires'});
});

test('all that is kept goes to a directory', async () => {
	const {press, handing, done} = started();
	await handing();
	expect(notice(press('bteam\r'))).toBe('2 written.');
	expect(done.exported).toEqual(['team']);
});

async function planOf(keys = '') {
	const {live, handing} = started();
	await handing(keys);
	return live.state().scene.handed!.text;
}

test('a pasted plan is read, held against what is there, and taken over undoably', async () => {
	const text = await planOf('jj');
	const {press, until, live} = started();
	press(`a${paste(`Hello,\n\n> ${text.replaceAll('\n', '\r\n> ')}\n-- \nCrew`)}`);
	await until(() => (live.state().session.place as {incoming?: unknown}).incoming);
	const {place} = live.state().session;
	expect(place).toMatchObject({
		incoming: {form: 'plan', differences: {track: [], car: []}, own: {track: {id: 'track:oval'}}},
	});
	const taken = press('\r').session;
	expect(taken.place.at).toBe('ranking');
	expect(taken.plan).toBe(live.state().scene.all.find(({name}) => name === taken.row)!.name);
	expect(current(taken.history.present, 'track').json).toBe(oval.json);
});

test('a plan that differs changes the track, unsaved; undone it is as before', async () => {
	const text = await planOf(`e\t${down}80\r${esc}`);
	const {press, until, live} = started();
	press(`a${paste(text)}`);
	await until(() => (live.state().session.place as {incoming?: unknown}).incoming);
	expect(live.state().session.place).toMatchObject({
		incoming: {differences: {track: [{path: 'straights.Front.exit', a: '76 mph', b: '80 mph'}]}},
	});
	press('\r');
	const track = () => current(live.state().session.history.present, 'track');
	expect(track()).toMatchObject({id: 'track:oval', saved: oval.json, json: {straights: [{exit: '80 mph'}, {}]}});
	press('u');
	expect(track().json).toBe(oval.json);
});

test('a plan of a track that is not there becomes one, from its file', async () => {
	const text = await planOf(`e${'\r'} Two\r${esc}`);
	expect(text).toContain('Track Fixture Oval Two');
	const {press, until, live, done} = started();
	done.files.set('plan.txt', text);
	press('aplan.txt\r');
	await until(() => (live.state().session.place as {incoming?: unknown}).incoming);
	expect(press('\r').session.history.present.track).toBe('track:new 1');
	expect(current(live.state().session.history.present, 'track').from).toBe('plan');
});

test('a file that is not there, and a changed digit, are told; the name stays', async () => {
	const {press, until, live, done} = started();
	const wrong = () => (live.state().session.place as {wrong?: string}).wrong;
	press('anone.txt\r');
	await until(wrong);
	expect(live.state().session.place).toMatchObject({
		wrong: 'none.txt: there is no such file.',
		line: {text: 'none.txt'},
	});
	done.files.set('bad.txt', (await planOf()).replace('rpm 9200', 'rpm 9300'));
	press('\x15bad.txt\r');
	await until(() => wrong()?.startsWith('bad.txt'));
	expect(wrong()).toMatch(/^bad\.txt:3: Limit: found/);
});

test('the one line is shown and cannot be taken over', async () => {
	const line = await planOf();
	const {live, handing, press, until} = started();
	await handing('');
	press('j');
	const {text} = live.state().scene.handed!;
	press(`${esc}a${paste(text)}`);
	await until(() => (live.state().session.place as {incoming?: unknown}).incoming);
	const before = live.state().session.history;
	expect(press('\r').session.history).toBe(before);
	expect(line).not.toBe(text);
});

test('an entry is added to the history; what is begun is there again after Esc', () => {
	const {press, done, live} = started();
	expect(press('ya').session.draft).toMatchObject({track: 'Fixture Oval', field: 'session'});
	press(`race${down}${down}${down}88x4`);
	expect(press('\r').session.draft).toMatchObject({field: 'highestRpm', wrong: 'RPM up to 30000'});
	press(esc);
	expect(press(esc).session.place.at).toBe('ranking');
	expect(press('ya').session.draft?.lines.highestRpm.text).toBe('88x4');
	press(`\x158840${down}Front end\r`);
	expect(done.entries).toMatchObject([
		{date: '2026-05-31', session: 'race', pair: '36/36', gearbox: 'A', highestRpm: 8840, at: 'Front end'},
	]);
	expect(live.state().session).toMatchObject({draft: undefined, place: {adding: false, entries: [{session: 'race'}]}});
});

test('the track returns to the shipped one as a whole, and that is undone', () => {
	const {press, live} = started();
	press(`e\t${down}80\r${esc}`);
	const track = () => current(live.state().session.history.present, 'track');
	expect(notice(press('do'))).toBe('The shipped track is back. u undoes it.');
	expect(track().json).toBe(oval.json);
	press('u');
	expect(track().json).not.toBe(oval.json);
	expect(notice(press('b'))).toBe('There is no saved track of this name.');
});

test('what is saved is forgotten only when that is said, and stays in the session to undo to', () => {
	const {press, done, live} = started();
	expect(notice(press('df'))).toBe('This track is not saved: there is nothing to forget.');
	press(`${esc}e\t${down}80\r${esc}\x13d`);
	expect(press('f').session.over?.is).toBe('forgetting');
	press(esc);
	expect(done.forgotten).toEqual([]);
	press('fy');
	expect(done.forgotten).toEqual(['track Fixture Oval']);
	const track = () => current(live.state().session.history.present, 'track');
	expect(track()).toMatchObject({from: 'shipped', json: oval.json, saved: oval.json});
	press('u');
	expect(track()).toMatchObject({saved: oval.json, json: {straights: [{exit: '80 mph'}, {}]}});
});
