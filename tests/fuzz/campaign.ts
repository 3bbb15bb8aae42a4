/** A run of the fuzzer on one reader: what reaches source that nothing reached before is kept and changed further. */
import type {Coverage, Fresh} from './coverage.ts';
import {type Broken, judge} from './judge.ts';
import {minimized} from './minimize.ts';
import {mutated} from './mutate.ts';
import {Random} from './random.ts';
import type {Reader} from './reader.ts';

export type Finding = Broken & {
	reader: string;
	/** As short as it could be made. */
	input: string;
	seed: number;
	/** The how manieth text it was. */
	execution: number;
};

/** So many texts between two looks at the coverage: a look takes as long as a few texts. */
const batchSize = 24;
const usualWork = {start: 20_000, perCharacter: 50};

export class Campaign {
	readonly reader: Reader;
	readonly corpus: string[] = [];
	readonly findings: Finding[] = [];
	executions = 0;
	accepted = 0;
	/** The most work for a text, as a share of what it may take. */
	dearest = 0;
	readonly #seed: number;
	readonly #random: Random;
	readonly #coverage: Coverage;

	constructor(reader: Reader, seed: number, coverage: Coverage) {
		this.reader = reader;
		this.#seed = seed;
		this.#random = new Random(seed);
		this.#coverage = coverage;
	}

	/** The examples, each of which must be accepted. */
	async start(): Promise<void> {
		this.#coverage.keep(this.#coverage.take().fresh);
		for (const example of await this.reader.examples()) {
			const isAccepted = await this.#give(example);
			if (!isAccepted) await this.#found({promise: 'an example is accepted', detail: ''}, example);
			this.corpus.push(example);
		}
		this.#coverage.keep(this.#coverage.take().fresh);
	}

	/** Some texts more. */
	async batch(size = batchSize): Promise<void> {
		const texts = Array.from({length: size}, () => mutated(this.#choice(), this.reader, this.#random, this.corpus));
		for (const text of texts) await this.#give(text);
		const {work, fresh} = this.#coverage.take();
		const least = Math.min(...texts.map(text => this.#mostWork(text)));
		if (fresh.size > 0 || work > least) await this.#lookAtEach(texts);
		// What runs only once in a process belongs to no text.
		this.#coverage.keep(fresh);
	}

	/** So many texts beside the examples, or fewer where something is found. */
	async run(executions: number): Promise<void> {
		await this.start();
		for (let left = executions; left > 0 && this.findings.length === 0; left -= batchSize)
			await this.batch(Math.min(left, batchSize));
	}

	/** Lately kept ones more often: they are at the edge of what was reached. */
	#choice(): string {
		const {length} = this.corpus;
		const from = this.#random.below(2) === 0 ? Math.max(0, length - 16) : 0;
		return this.corpus[from + this.#random.below(length - from)]!;
	}

	/** Each text by itself: the one that reached something new is kept, the one that took too much work is named. */
	async #lookAtEach(texts: readonly string[]): Promise<void> {
		for (const text of texts) {
			await judge(this.reader, text);
			const {work, fresh} = this.#coverage.take();
			this.dearest = Math.max(this.dearest, work / this.#mostWork(text));
			if (work > this.#mostWork(text)) await this.#tooMuchWork(text, work);
			if (fresh.size === 0) continue;
			this.corpus.push(await this.#shortened(text, fresh));
			this.#coverage.keep(fresh);
		}
	}

	async #give(text: string): Promise<boolean> {
		const {accepted, broken} = await judge(this.reader, text);
		this.executions++;
		if (accepted) this.accepted++;
		if (broken) await this.#found(broken, text);
		return accepted;
	}

	#mostWork(text: string): number {
		const {start, perCharacter} = this.reader.work ?? usualWork;
		return start + perCharacter * text.length;
	}

	async #workOf(text: string): Promise<number> {
		this.#coverage.take();
		await judge(this.reader, text);
		return this.#coverage.take().work;
	}

	async #tooMuchWork(text: string, work: number): Promise<void> {
		// What is worked out once for a process is not done again.
		if ((await this.#workOf(text)) <= this.#mostWork(text)) return;
		await this.#found({promise: 'the work is bounded', detail: `${work} pieces for ${text.length} characters`}, text);
	}

	/** A long text of a corpus slows all that is made of it. */
	async #shortened(text: string, fresh: Fresh): Promise<string> {
		if (text.length < longAlready) return text;
		return minimized(
			text,
			async candidate => {
				await judge(this.reader, candidate);
				return holds(this.#coverage.take().fresh, fresh);
			},
			fewTries,
		);
	}

	/** Each way to break a promise once. */
	async #found({promise, detail}: Broken, text: string): Promise<void> {
		if (this.findings.some(finding => finding.promise === promise)) return;
		const {reader} = this;
		const found = {promise, detail, reader: reader.name, input: text, seed: this.#seed, execution: this.executions};
		this.findings.push(found);
		const isWork = promise === 'the work is bounded';
		found.input = await minimized(text, async candidate =>
			isWork
				? (await this.#workOf(candidate)) > this.#mostWork(candidate)
				: (await judge(reader, candidate)).broken?.promise === promise,
		);
		found.detail = (await judge(reader, found.input)).broken?.detail ?? detail;
	}
}

/** Texts from this length on are shortened, with so many tries: to change long ones takes longer. */
const longAlready = 4000;
const fewTries = 40;

/** Whether all of the one is in the other. */
function holds(whole: Fresh, part: Fresh): boolean {
	return [...part].every(([url, spots]) => {
		const there = new Set(whole.get(url));
		return spots.every(spot => there.has(spot));
	});
}
