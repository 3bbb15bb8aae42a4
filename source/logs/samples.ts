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

	set(channel: ChannelName, numbers: Numbers): void {
		this.#columns.set(channel, numbers);
	}

	/** Leaves only the samples with these indices, which rise, the first `length` of them. */
	keep(indices: Uint32Array, length: number): void {
		for (const numbers of this.#columns.values()) {
			for (let to = 0; to < length; to++) numbers[to] = numbers[indices[to]!]!;
		}
		this.#length = length;
	}
}
