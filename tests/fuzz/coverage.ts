/** Which pieces of our source have run, as V8 counts them, and how often. */
import {Session} from 'node:inspector';

type Range = {startOffset: number; endOffset: number; count: number};
type Script = {url: string; functions: {ranges: Range[]}[]};
/** Pieces of source, by file and offset, that ran for the first time. */
export type Fresh = ReadonlyMap<string, readonly number[]>;
export type Taken = {
	/** How often pieces of our source ran since the last look. */
	work: number;
	fresh: Fresh;
};

/** Ours, whether it runs as it is, by the test runner or bundled. */
const isOurs = (url: string): boolean => url.includes('/source/');

export class Coverage {
	readonly #session = new Session();
	readonly #seen = new Map<string, Uint8Array>();
	/** Where pieces begin, whether or not they ever ran. */
	readonly #starts = new Map<string, Set<number>>();

	constructor() {
		this.#session.connect();
		this.#post('Profiler.enable');
		this.#post('Profiler.startPreciseCoverage', {callCount: true, detailed: true, allowTriggeredUpdates: false});
	}

	/** What ran since the last look. It counts as seen only after `keep`. */
	take(): Taken {
		let work = 0;
		const fresh = new Map<string, number[]>();
		const {result} = this.#post('Profiler.takePreciseCoverage') as {result: Script[]};
		for (const {url, functions} of result) {
			if (!isOurs(url)) continue;
			const spots = functions.flatMap(({ranges}) => {
				for (const {count} of ranges) work += count;
				return this.#freshIn(url, ranges);
			});
			if (spots.length > 0) fresh.set(url, spots);
		}
		return {work, fresh};
	}

	keep(fresh: Fresh): void {
		for (const [url, spots] of fresh) for (const spot of spots) this.#seenIn(url, spot)[spot] = 1;
	}

	/** Pieces that ran, of those in functions that were called at all. */
	branches(): {reached: number; known: number} {
		let [reached, known] = [0, 0];
		for (const [url, starts] of this.#starts) {
			const seen = this.#seen.get(url);
			known += starts.size;
			for (const start of starts) reached += seen?.[start] ?? 0;
		}
		return {reached, known};
	}

	stop(): void {
		this.#post('Profiler.stopPreciseCoverage');
		this.#session.disconnect();
	}

	/** Offsets that ran now and never before. Of ranges the outer come first, and an inner one counts for what it covers. */
	#freshIn(url: string, ranges: readonly Range[]): number[] {
		const [whole] = ranges;
		if (whole === undefined) return [];
		const starts = this.#starts.get(url) ?? new Set();
		this.#starts.set(url, starts);
		const ran = new Uint8Array(whole.endOffset - whole.startOffset);
		for (const {startOffset, endOffset, count} of ranges) {
			starts.add(startOffset);
			ran.fill(count > 0 ? 1 : 0, startOffset - whole.startOffset, endOffset - whole.startOffset);
		}
		const seen = this.#seenIn(url, whole.endOffset);
		const fresh: number[] = [];
		for (let i = 0; i < ran.length; i++) {
			if (ran[i] === 1 && seen[whole.startOffset + i] === 0) fresh.push(whole.startOffset + i);
		}
		return fresh;
	}

	/** With room for the offset. */
	#seenIn(url: string, offset: number): Uint8Array {
		const seen = this.#seen.get(url) ?? new Uint8Array();
		if (offset < seen.length) return seen;
		const larger = new Uint8Array(2 * offset + 1);
		larger.set(seen);
		this.#seen.set(url, larger);
		return larger;
	}

	#post(method: string, parameters: object = {}): unknown {
		let answer: unknown;
		// Within the own process the answer comes at once.
		this.#session.post(method, parameters, (error, result) => {
			if (error) throw new Error(error.message);
			answer = result;
		});
		return answer;
	}
}
