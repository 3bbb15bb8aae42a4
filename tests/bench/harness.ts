/** Timing with warm-up and repeats, and budgets as ratios within one run. */
import {cpus} from 'node:os';

export type Timing = {readonly minMs: number; readonly meanMs: number; readonly sdMs: number};

/** What timed code gives goes in here, so that nothing is optimized away. */
let sink = 0;

/** Runs `work` some times unseen, then `repeats` times. Each gives a number that depends on what it did. */
export function timed(work: () => number, repeats: number, warmUps = 3): Timing {
	for (let i = 0; i < warmUps; i++) sink += work();
	const times: number[] = [];
	for (let i = 0; i < repeats; i++) {
		const start = performance.now();
		sink += work();
		times.push(performance.now() - start);
	}
	return timingOf(times);
}

export function timingOf(times: readonly number[]): Timing {
	const meanMs = times.reduce((sum, time) => sum + time, 0) / times.length;
	const squares = times.reduce((sum, time) => sum + (time - meanMs) ** 2, 0);
	return {minMs: Math.min(...times), meanMs, sdMs: Math.sqrt(squares / Math.max(1, times.length - 1))};
}

export const median = (values: readonly number[]): number =>
	[...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;

export function told({minMs, meanMs, sdMs}: Timing): string {
	return `min ${inUnits(minMs)}, mean ${inUnits(meanMs)} ± ${inUnits(sdMs)}`;
}

const inUnits = (ms: number) => (ms < 1 ? `${(1000 * ms).toPrecision(3)} µs` : `${ms.toPrecision(3)} ms`);

export const line = (text = '') => process.stdout.write(`${text}\n`);

let missed = 0;

/** Prints a figure beside its budget, which it must not pass; `least` where it must reach it. */
export function budget(
	name: string,
	value: number,
	bound: number,
	unit: string,
	kind: 'most' | 'least' = 'most',
): void {
	const met = kind === 'most' ? value <= bound : value >= bound;
	if (!met) missed++;
	line(`  ${name}: ${value.toPrecision(3)} ${unit}, budget at ${kind} ${bound} ${unit}: ${met ? 'met' : 'MISSED'}`);
}

/** Stops everything: a wrong answer is not worth timing. */
export function assertClose(name: string, value: number, expected: number, tolerance: number): void {
	const error = Math.abs(value - expected) / Math.abs(expected);
	if (!(error <= tolerance))
		throw new Error(`${name}: ${value} is not ${expected}, off by ${error}, allowed ${tolerance}`);
}

export const machine = () => `Node ${process.version}, ${cpus().length} × ${cpus()[0]?.model ?? 'unknown processor'}`;

/** Ends with 1 where a budget was missed. */
export function finish(): void {
	line();
	line(missed === 0 ? 'All budgets met.' : `${missed} budget${missed === 1 ? '' : 's'} missed.`);
	if (missed > 0) process.exitCode = 1;
	if (!Number.isFinite(sink)) throw new Error('a timed run gave a number that is not finite');
}

/** Mulberry32, a small generator that gives the same numbers for the same seed: 0 to 1. */
export function seeded(seed: number): () => number {
	let state = seed;
	return () => {
		state = (state + 0x6d2b79f5) | 0;
		let bits = Math.imul(state ^ (state >>> 15), 1 | state);
		bits = (bits + Math.imul(bits ^ (bits >>> 7), 61 | bits)) ^ bits;
		return ((bits ^ (bits >>> 14)) >>> 0) / 2 ** 32;
	};
}
