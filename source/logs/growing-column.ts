/** A column whose length is known only at the end: blocks, so that nothing is copied while it grows. */

type Numbers = Float32Array | Float64Array;

export class GrowingColumn<T extends Numbers> {
	readonly #blocks: T[] = [];
	readonly #make: (length: number) => T;
	#length = 0;

	constructor(make: (length: number) => T) {
		this.#make = make;
	}

	/** Takes every `stride`th of the numbers, `count` of them, from `offset` on. */
	append(numbers: Float64Array, offset: number, stride: number, count: number): void {
		const block = this.#make(count);
		for (let i = 0, at = offset; i < count; i++, at += stride) block[i] = numbers[at]!;
		this.#blocks.push(block);
		this.#length += count;
	}

	/** All in one; the column is empty afterwards, so that the blocks can be let go. */
	take(): T {
		const whole = this.#make(this.#length);
		let at = 0;
		for (const block of this.#blocks) {
			whole.set(block, at);
			at += block.length;
		}
		this.#blocks.length = 0;
		this.#length = 0;
		return whole;
	}
}
