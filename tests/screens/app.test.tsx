import {EventEmitter} from 'node:events';
import {render} from 'ink-testing-library';
import {afterEach, expect, test, vi} from 'vitest';
import {App} from '../../source/screens/app.tsx';
import {LiveSession} from '../../source/screens/session/live.ts';
import {errandsInMemory} from './errands.ts';
import {catalog, session} from './session/documents.ts';
import {bare, widest} from './views/states.ts';

const keeper = {
	keep() {},
	drop() {},
	earlier: undefined,
	dropEarlier() {},
	save: () => ({ok: true, words: 'Saved.'}),
	where: () => undefined,
	errands: errandsInMemory().errands,
};
const outside = {leave() {}, suspend() {}, redraw() {}};
const clock = {
	now: () => performance.now(),
	later: (act: () => void) => {
		const waiting = setImmediate(act);
		return () => clearImmediate(waiting);
	},
};

/** A window that a test makes larger or smaller. */
class Window extends EventEmitter {
	size: {width: number; height: number};

	constructor(width: number, height: number) {
		super();
		this.size = {width, height};
	}

	resize(width: number, height: number): void {
		this.size = {width, height};
		this.emit('resize');
	}
}

let unmount = () => {};
afterEach(() => unmount());

function opened(width: number, height: number) {
	const live = new LiveSession(session(), catalog, keeper, outside, clock);
	const theme = {color: false, ascii: false};
	const app = render(<App live={live} theme={theme} screen={new Window(width, height)} />);
	unmount = app.unmount;
	const lines = () => bare(app.lastFrame() ?? '').split('\n');
	/** The frame once it shows what is waited for; never a sleep. */
	const frame = (text: string | RegExp) =>
		vi.waitFor(() => {
			const shown = bare(app.lastFrame() ?? '');
			expect(shown).toMatch(text);
			return shown;
		}, 5000);
	return {press: (keys: string) => app.stdin.write(keys), lines, frame};
}

const [down, right, esc] = ['\x1B[B', '\x1B[C', '\x1B'];

test.each([
	[80, 24],
	[100, 30],
	[140, 45],
])('the whole ranking at %d × %d', async (width, height) => {
	const {frame, lines} = opened(width, height);
	await frame('10 rows');
	await frame(/▸ +1 /);
	expect(lines()).toHaveLength(height);
	expect(widest(lines())).toBeLessThanOrEqual(width);
	expect(lines().join('\n')).toContain('Fixture Oval · short · limit 9200');
});

test('a key moves the cursor, and the reason with it', async () => {
	const {press, frame} = opened(80, 24);
	await frame('34/37 A near Fastest of 10');
	press(down);
	await frame(/▸ +2 /);
	await frame('35/36 A near 0.031 s a lap slower than 34/37 A');
});

test('keys that come at once are all taken', async () => {
	const {press, frame} = opened(80, 24);
	await frame('10 rows');
	press('jjj');
	await frame(/▸\* +4 /);
});

test('a field is typed, refused, mended and taken; the ranking follows', async () => {
	const {press, frame} = opened(100, 30);
	await frame('10 rows');
	press(`e\t${down}`);
	await frame(/▸ +exit/);
	press('8000');
	await frame('Understood 8000 mph');
	press('\r');
	await frame('Not taken: found "8000 mph"');
	press('\x7F\x7F\x7F\x7F60\r');
	await frame(/exit +~60 mph/);
	await frame('Fixture Oval (changed)');
	press('u');
	await frame(/exit +76 mph/);
});

test('a resize while typing keeps what was typed', async () => {
	const live = new LiveSession(session(), catalog, keeper, outside, clock);
	const theme = {color: false, ascii: false};
	const screen = new Window(100, 30);
	const app = render(<App live={live} theme={theme} screen={screen} />);
	unmount = app.unmount;
	app.stdin.write(`e\t${down}123`);
	await vi.waitFor(() => expect(bare(app.lastFrame() ?? '')).toContain('Understood 123 mph'));
	screen.resize(60, 10);
	await vi.waitFor(() => expect(app.lastFrame()).toContain('Droprack needs 80 columns'));
	screen.resize(140, 45);
	await vi.waitFor(() => expect(bare(app.lastFrame() ?? '')).toContain('Understood 123 mph'));
});

test('pictures, help and back', async () => {
	const {press, frame} = opened(100, 30);
	await frame('10 rows');
	press('g');
	await frame('RPM over speed');
	press('\t');
	await frame('Thrust and resistance');
	press('\t');
	await frame('Speed along Front');
	press(right);
	await frame('No shorter pair on the rack');
	press('?');
	await frame('In the pictures');
	press(esc);
	await frame('Speed along Front');
});

test.each([
	[80, 24],
	[100, 30],
	[140, 45],
])('handing over, the history and the differences at %d × %d', async (width, height) => {
	const {press, frame, lines} = opened(width, height);
	await frame('10 rows');
	const isWhole = () => {
		expect(lines()).toHaveLength(height);
		expect(widest(lines())).toBeLessThanOrEqual(width);
	};
	press('x');
	await frame('DROPRACK PLAN 1: date 2026-05-31T18:05:00Z');
	isWhole();
	press('jjj');
	await frame(/[█▀▄]{7}[\s\S]*▸ QR of line/);
	isWhole();
	press('j');
	await frame('NEVER above');
	isWhole();
	press('y');
	await frame('Fixture Oval: nothing is kept of it yet.');
	press('a');
	await frame(/▸ session/);
	isWhole();
	press(esc);
	await frame('nothing is kept');
	press('d');
	await frame('It says the same as the shipped one.');
	isWhole();
});

test('Ctrl with F1 and a pasted esc sequence do no harm', async () => {
	const {press, frame} = opened(80, 24);
	await frame('10 rows');
	press('\x1B[1;5P\x1B[1;5R\x1B[25;5~\x1B[200~\x1B[31m\x1B[201~');
	press(down);
	await frame(/▸ +2 /);
});
