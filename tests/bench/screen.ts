/** What a person feels at the screen, in a pseudo-terminal: the start, a key, an accepted edit, a key held down, memory. */
import {cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';
import {Pty} from '../screens/pty.ts';
import type {Figures} from './budgets.ts';
import {line, median} from './harness.ts';

const window = {columns: 100, rows: 35};
const pairs = 76;
const startRounds = 11;
const keys = 150;
/** What comes before the counted ones, until the code is optimized. */
const warmUp = 40;
const edits = 40;
const heldKeys = 100;
const manyKeys = 2000;
const repeatMs = 33;

export async function benchScreen(root: string, figures: Figures): Promise<void> {
	line(`The screen at ${window.columns} × ${window.rows}, ${pairs} pairs × 1 set × 2 straights × 4 situations`);
	const place = makePlace(root);
	try {
		await benchStart(place, figures);
		await benchKeys(root, place, figures);
	} finally {
		rmSync(place, {recursive: true});
	}
}

/** The program with a car and a track of its own to start on. */
function makePlace(root: string): string {
	const place = mkdtempSync(join(tmpdir(), 'droprack-bench-'));
	const fixture = (name: string) => JSON.parse(readFileSync(join(root, 'tests', 'fixtures', `${name}.json`), 'utf8'));
	const [oval, car] = [fixture('oval'), fixture('car')];
	const situations = [
		...oval.situations,
		{name: 'Long run', exit: '-2 mph'},
		{name: 'Cool night', air: {temperature: '55 degF'}},
	];
	const rack = Array.from({length: pairs}, (_, i) => ({driving: 30 + (i % 38), driven: 30 + Math.floor(i / 2)}));
	const whole = {
		...car,
		gearboxes: car.gearboxes.slice(0, 1),
		rack: {pairs: rack},
		installed: {pair: `${rack[10]!.driving}/${rack[10]!.driven}`, gearbox: 'A'},
	};
	cpSync(join(root, 'dist'), join(place, 'dist'), {recursive: true});
	mkdirSync(join(place, 'tracks', 'cars'), {recursive: true});
	writeFileSync(join(place, 'tracks', 'tarrowdale.json'), JSON.stringify({...oval, situations}));
	writeFileSync(join(place, 'tracks', 'cars', 'demo.json'), JSON.stringify(whole));
	return place;
}

const open = (place: string) =>
	new Pty(process.execPath, [join(place, 'dist', 'droprack.js')], {
		...window,
		environment: {DROPRACK_HOME: join(place, 'home')},
	});

async function since(start: number, pty: Pty, what: string | RegExp | (() => boolean)): Promise<number> {
	await pty.waitFor(what);
	return performance.now() - start;
}

async function benchStart(place: string, figures: Figures): Promise<void> {
	const [bare, first, whole, memory]: [number[], number[], number[], number[]] = [[], [], [], []];
	for (let i = 0; i < startRounds; i++) {
		let start = performance.now();
		const node = new Pty(process.execPath, ['-e', 'console.log(1)'], window);
		bare.push(await since(start, node, '1'));
		node.close();
		start = performance.now();
		const pty = open(place);
		first.push(await since(start, pty, /Fixture Oval[\s\S]*\*/));
		memory.push(residentMb(pty));
		whole.push(await since(start, pty, `${pairs} rows`));
		pty.close();
	}
	const node = median(bare);
	line(
		`  bare node ${node.toFixed(0)} ms, first frame ${median(first).toFixed(0)} ms, whole ranking ${median(whole).toFixed(0)} ms`,
	);
	figures.hold('firstFrame', median(first) / node);
	figures.hold('wholeRanking', median(whole) / node);
	figures.hold('firstFrameMemory', median(memory));
}

type Pressed = {readonly ms: number; readonly bytes: number};

/** Writes a key, and waits until what was drawn for it is over. */
async function pressed(pty: Pty, keys: string, isDone: () => boolean): Promise<Pressed> {
	const before = pty.written.length;
	const start = performance.now();
	pty.press(keys);
	await pty.waitFor(() => pty.written.length > before && isDone());
	return {ms: performance.now() - start, bytes: Buffer.byteLength(pty.written.slice(before))};
}

const p95 = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length * 0.95)]!;
const pause = (ms: number) => new Promise(resolve => setTimeout(resolve, ms));

/** Down and up again in turns over twenty rows, as a person looks through a list. */
const direction = (i: number): string => (i % 40 < 20 ? 'j' : 'k');

async function benchKeys(root: string, place: string, figures: Figures): Promise<void> {
	const plain = new Pty(process.execPath, [join(root, 'tests', 'bench', 'plain-ink-table.mjs')], {
		...window,
		environment: {NODE_ENV: 'production'},
	});
	await plain.waitFor('selected 1');
	const pty = open(place);
	await pty.waitFor(`${pairs} rows`);
	await pause(1000);
	const [theirs, ours]: [Pressed[], Pressed[]] = [[], []];
	for (let i = 0; i < keys + warmUp; i++) {
		const [their, our] = [await pressed(plain, direction(i), () => true), await pressed(pty, direction(i), () => true)];
		if (i >= warmUp) [theirs.push(their), ours.push(our)];
		await pause(40);
	}
	plain.close();
	const bound = p95(theirs.map(({ms}) => ms));
	line(
		`  a key: plain Ink table ${bound.toFixed(1)} ms, ours ${p95(ours.map(({ms}) => ms)).toFixed(1)} ms (95th percentiles)`,
	);
	figures.hold('key', p95(ours.map(({ms}) => ms)) / bound);
	figures.hold('keyBytes', p95(ours.map(({bytes}) => bytes)));

	await benchHeld(pty, figures);
	for (let i = 0; i < manyKeys; i++) pty.press(direction(i));
	await pause(3000);
	figures.hold('manyKeysMemory', residentMb(pty));
	await benchEdits(pty, bound, figures);
	pty.close();
}

async function benchEdits(pty: Pty, bound: number, figures: Figures): Promise<void> {
	pty.press('e\t\x1B[B');
	await pty.waitFor(/▸ +exit/);
	const made: Pressed[] = [];
	for (let i = 0; i < edits + warmUp; i++) {
		const speed = 70 + (i % 5);
		pty.press(`${speed}`);
		await pty.waitFor(`Understood ${speed} mph`);
		made.push(
			await pressed(
				pty,
				'\r',
				() => !/ranking/.test(pty.screen()) && new RegExp(`exit +~${speed} mph`).test(pty.screen()),
			),
		);
		await pause(40);
	}
	const msOf = (some: readonly Pressed[]) => p95(some.map(one => one.ms));
	const ms = msOf(made.slice(warmUp));
	line(
		`  an accepted edit, ranked anew: ${ms.toFixed(1)} ms (95th percentile); the first ${warmUp}, while the code warms up: ${msOf(made.slice(0, warmUp)).toFixed(1)} ms`,
	);
	figures.hold('edit', ms / bound);
	figures.hold('editBytes', p95(made.map(({bytes}) => bytes)));
	pty.press('r');
	await pty.waitFor('76 rows');
}

/** Every key of a held one gets its frame. */
async function benchHeld(pty: Pty, figures: Figures): Promise<void> {
	let frames = 0;
	const start = pty.written.length;
	for (let i = 0; i < heldKeys; i++) {
		pty.press(direction(i));
		await pause(repeatMs);
	}
	await pause(200);
	frames = pty.written.slice(start).split('\x1B[?2026l').length - 1;
	figures.hold('heldKeys', frames);
}

const residentMb = ({pid}: Pty): number =>
	Number(/VmRSS:\s+(\d+)/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1]) / 1024;
