/** Timing in turns, so that a busy moment hits all that are compared, and a seeded generator. */
import {cpus} from 'node:os';

export type Timing = {
	readonly minMs: number;
	readonly meanMs: number;
	readonly sdMs: number;
	readonly medianMs: number;
};

/** What timed code gives goes in here, so that nothing is optimized away. */
let sink = 0;

/** Work to time: it gives a number that depends on what it did. */
export type Work = () => number;

/** Runs each some times unseen, then all of them in turn, `rounds` times. */
export function timedInTurns<Name extends string>(
	works: Readonly<Record<Name, Work>>,
	rounds: number,
	warmUps = 2,
): Record<Name, Timing> {
	const entries = Object.entries(works) as [Name, Work][];
	const times = entries.map(([, work]) => {
		for (let i = 0; i < warmUps; i++) sink += work();
		return [] as number[];
	});
	for (let round = 0; round < rounds; round++) {
		for (const [i, [, work]] of entries.entries()) times[i]!.push(msOf(work));
	}
	return Object.fromEntries(entries.map(([name], i) => [name, timingOf(times[i]!)])) as Record<Name, Timing>;
}

function msOf(work: Work): number {
	const start = performance.now();
	sink += work();
	const ms = performance.now() - start;
	if (!Number.isFinite(sink)) throw new Error('a timed run gave a number that is not finite');
	return ms;
}

export function timingOf(times: readonly number[]): Timing {
	const meanMs = times.reduce((sum, time) => sum + time, 0) / times.length;
	const squares = times.reduce((sum, time) => sum + (time - meanMs) ** 2, 0);
	const sdMs = Math.sqrt(squares / Math.max(1, times.length - 1));
	return {minMs: Math.min(...times), meanMs, sdMs, medianMs: median(times)};
}

export const median = (values: readonly number[]): number =>
	[...values].sort((a, b) => a - b)[Math.floor(values.length / 2)]!;

/** Of one part where `parts` of them were timed at once. */
export function told({minMs, meanMs, sdMs}: Timing, parts = 1): string {
	return `min ${inUnits(minMs / parts)}, mean ${inUnits(meanMs / parts)} ± ${inUnits(sdMs / parts)}`;
}

function inUnits(ms: number): string {
	const [value, unit] = ms < 1 ? [1000 * ms, 'µs'] : [ms, 'ms'];
	return `${value.toFixed(value < 10 ? 2 : value < 100 ? 1 : 0)} ${unit}`;
}

export const line = (text = '') => process.stdout.write(`${text}\n`);

/** Stops everything: a wrong answer is not worth timing. */
export function assertClose(name: string, value: number, expected: number, tolerance: number): void {
	const error = Math.abs(value - expected) / Math.abs(expected);
	if (!(error <= tolerance))
		throw new Error(`${name}: ${value} is not ${expected}, off by ${error}, allowed ${tolerance}`);
}

export const machine = () => `Node ${process.version}, ${cpus().length} × ${cpus()[0]?.model ?? 'unknown processor'}`;

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
