/** UTF-16 with a byte order mark, as some loggers and spreadsheets write it, to UTF-8; every other byte as it is. */
export class Utf8Decoder {
	#first: Uint8Array | undefined = new Uint8Array(0);
	#decoder: InstanceType<typeof TextDecoder> | undefined;
	readonly #encoder = new TextEncoder();

	/** Undefined for anything but UTF-16. */
	get encoding(): string | undefined {
		return this.#decoder && 'UTF-16';
	}

	decode(bytes: Uint8Array): Uint8Array {
		if (this.#first === undefined) return this.#decoded(bytes);
		const start = Buffer.concat([this.#first, bytes]);
		if (start.length < 2) {
			this.#first = start;
			return new Uint8Array(0);
		}
		this.#first = undefined;
		if (start[0] === 0xff && start[1] === 0xfe) this.#decoder = new TextDecoder('utf-16le');
		if (start[0] === 0xfe && start[1] === 0xff) this.#decoder = new TextDecoder('utf-16be');
		return this.#decoded(start);
	}

	/** What is left at the end of a file of one byte. */
	end(): Uint8Array {
		return this.#first ?? new Uint8Array(0);
	}

	#decoded(bytes: Uint8Array): Uint8Array {
		return this.#decoder ? this.#encoder.encode(this.#decoder.decode(bytes, {stream: true})) : bytes;
	}
}
