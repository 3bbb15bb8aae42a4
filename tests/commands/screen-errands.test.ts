import {mkdirSync, mkdtempSync, readFileSync, rmSync, symlinkSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {afterEach, beforeEach, expect, test} from 'vitest';
import {screenErrands} from '../../source/commands/screen-errands.ts';
import {screenKeeper} from '../../source/commands/screen-keeper.ts';
import type {OpenDocument} from '../../source/screens/session/documents.ts';
import {keptNamed} from '../../source/store/list-kept.ts';

let place: string;
let home: string;
beforeEach(() => {
	place = mkdtempSync(join(tmpdir(), 'droprack-errands-'));
	home = join(place, 'home');
});
afterEach(() => rmSync(place, {recursive: true}));

const written: string[] = [];
const errands = () => screenErrands(home, {}, bytes => written.push(bytes));
const at = (name: string) => join(place, name);

test('a new file is written; one that is there gives way only when that is said', () => {
	expect(errands().write(at('a.txt'), 'one\n', false)).toEqual({ok: true, words: `Written to ${at('a.txt')}.`});
	expect(errands().write(at('a.txt'), 'two\n', false)).toBe('exists');
	expect(readFileSync(at('a.txt'), 'utf8')).toBe('one\n');
	expect(errands().write(at('a.txt'), 'two\n', true)).toMatchObject({ok: true});
	expect(readFileSync(at('a.txt'), 'utf8')).toBe('two\n');
});

test('a directory, a link and a path that is not there are told, and nothing is written', () => {
	mkdirSync(at('dir'));
	writeFileSync(at('kept'), 'kept');
	symlinkSync(at('kept'), at('link'));
	expect(errands().write(at('dir'), 'x', true)).toEqual({
		ok: false,
		words: `${at('dir')} is a directory; a file is needed.`,
	});
	expect(errands().write(at('link'), 'x', true)).toMatchObject({ok: false});
	expect(readFileSync(at('kept'), 'utf8')).toBe('kept');
	expect(errands().write(at('none/a.txt'), 'x', false)).toEqual({
		ok: false,
		words: `${at('none/a.txt')}: there is no such file or directory (ENOENT).`,
	});
});

test('what is copied goes to the terminal as OSC 52', () => {
	expect(errands().copy('hello')).toBe("sent to the terminal's clipboard; not every terminal takes it.");
	expect(written.at(-1)).toBe('\u001b]52;c;aGVsbG8=\u0007');
});

test('entries are added to the history and read back, and all that is kept is exported', () => {
	expect(errands().history('Oval')).toEqual([]);
	expect(errands().addToHistory('Oval', {date: '2026-05-31', remark: 'loose'})).toMatchObject({ok: true});
	expect(errands().history('Oval')).toEqual([{date: '2026-05-31', remark: 'loose'}]);
	expect(errands().exportTo(at('team'))).toEqual({ok: true, words: `1 written, 0 as they were, in ${at('team')}.`});
	expect(errands().exportTo(home)).toMatchObject({ok: false});
});

test('a file that is not there is told', async () => {
	expect(await errands().read(at('none'))).toEqual({ok: false, words: `${at('none')}: there is no such file.`});
});

const track = (change: Partial<OpenDocument> = {}): OpenDocument => ({
	id: 'track:oval',
	kind: 'track',
	from: 'new',
	json: {name: 'Oval'},
	saved: undefined,
	shipped: undefined,
	plan: undefined,
	...change,
});
const chosen = {car: 'Ours', plan: '33/38 Set A'};

test('a track is saved with pair, set and notes; forgotten, it is gone and can be saved anew', () => {
	const keeper = screenKeeper(home, errands());
	expect(keeper.save(track({notes: 'loose'}), chosen)).toMatchObject({ok: true});
	expect(keptNamed(home, 'preset', 'Oval')?.document).toMatchObject({pair: '33/38', gearbox: 'Set A', notes: 'loose'});
	expect(keeper.errands.forget('track', 'Oval')).toMatchObject({ok: true});
	expect(keptNamed(home, 'preset', 'Oval')).toBeUndefined();
	expect(keeper.errands.forget('track', 'Oval')).toEqual({ok: false, words: 'Oval is not saved.'});
	expect(keeper.save(track(), chosen)).toMatchObject({ok: true});
});

test('what another copy saved meanwhile is not forgotten', () => {
	const keeper = screenKeeper(home, errands());
	keeper.save(track(), chosen);
	screenKeeper(home, errands()).save(track({notes: 'theirs'}), chosen);
	expect(keeper.errands.forget('track', 'Oval')).toEqual({
		ok: false,
		words: 'Oval was changed elsewhere meanwhile: nothing was taken away.',
	});
	expect(keptNamed(home, 'preset', 'Oval')?.document.notes).toBe('theirs');
});

test('a log with two speeds asks for one of them where its name is typed, and the answer is remembered', async () => {
	const row = (i: number) => `${i / 10},${100 + i},${101 + i},${5000 + 50 * i}`;
	const rows = Array.from({length: 60}, (_, i) => row(i));
	writeFileSync(at('run.csv'), ['Time [s],GPS Speed [mph],Wheel Speed [mph],RPM', ...rows, ''].join('\n'));
	const read = (columns = {}) =>
		errands().readLog(at('run.csv'), columns, 'Car', () => {}, new AbortController().signal);
	expect(await read()).toMatchObject({
		ok: false,
		channel: 'speed',
		words: expect.stringContaining('type behind the name "; speed=GPS Speed [mph]" or "; speed=Wheel Speed [mph]"'),
	});
	expect(await read({speed: 'Wheel Speed'})).toMatchObject({ok: true});
	const again = await read();
	expect(again.ok && again.reading.run.speedMps[0]).toBeCloseTo(101 * 0.44704, 4);
});
