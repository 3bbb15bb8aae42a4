/** A column whose length is known only at the end. */

type Numbers = Float32Array | Float64Array;

export class GrowingColumn<T extends Numbers> {
	readonly #make: (length: number) => T;
	#numbers: T;
	#length = 0;

	/** With room for so many: a system gives the memory only where numbers are written, so that plenty costs nothing. */
	constructor(make: (length: number) => T, room: number) {
		this.#make = make;
		this.#numbers = make(room);
	}

	/** Takes every `stride`th of the numbers, `count` of them, from `offset` on. */
	append(numbers: Float64Array, offset: number, stride: number, count: number): void {
		const length = this.#length + count;
		if (length > this.#numbers.length) this.#grow(2 * length);
		const own = this.#numbers;
		for (let i = this.#length, at = offset; i < length; i++, at += stride) own[i] = numbers[at]!;
		this.#length = length;
	}

	#grow(room: number): void {
		const larger = this.#make(room);
		larger.set(this.#numbers.subarray(0, this.#length));
		this.#numbers = larger;
	}

	get length(): number {
		return this.#length;
	}

	get numbers(): T {
		return this.#numbers.subarray(0, this.#length) as T;
	}
}
