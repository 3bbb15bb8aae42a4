/** A 32-bit xorshift (Marsaglia, 2003): the same choices on every machine. */
export class Random {
	#state: number;

	constructor(seed: number) {
		// Zero stays zero for ever.
		this.#state = Math.imul(seed, 2_654_435_761) | 0 || 1;
	}

	/** A whole number from 0, below the bound. */
	below(bound: number): number {
		this.#state ^= this.#state << 13;
		this.#state ^= this.#state >>> 17;
		this.#state ^= this.#state << 5;
		return (this.#state >>> 0) % bound;
	}

	/** One of a list that is not empty. */
	of<T>(list: readonly T[]): T {
		return list[this.below(list.length)]!;
	}
}
