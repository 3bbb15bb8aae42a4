/** The samples of a run while they are put in order: all columns are kept in step. */
import type {ChannelName} from './channels.ts';

export type Numbers = Float32Array | Float64Array;

export class Samples {
	readonly #columns: Map<ChannelName, Numbers>;
	#length: number;

	constructor(columns: ReadonlyMap<ChannelName, Numbers>, length: number) {
		this.#columns = new Map(columns);
		this.#length = length;
	}

	get length(): number {
		return this.#length;
	}

	/** As long as the samples; undefined where the log has no such channel. */
	get(channel: ChannelName): Numbers | undefined {
		return this.#columns.get(channel)?.subarray(0, this.#length);
	}

	drop(channel: ChannelName): void {
		this.#columns.delete(channel);
	}

	/** Puts a sample in the place of an earlier one. */
	move(from: number, to: number): void {
		for (const numbers of this.#columns.values()) numbers[to] = numbers[from]!;
	}

	/** Leaves the first ones. */
	cut(length: number): void {
		this.#length = length;
	}
}
