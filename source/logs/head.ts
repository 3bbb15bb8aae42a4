/** The first part of a log, enough to see what it is: the bytes as lines of text. */
import type {Dialect} from './split-row.ts';

/** So much is looked at before the first row is read; header and first rows stand in it. */
export const headBytes = 1 << 18;

/** A longer line is no row: it is skipped, and at the start of a file it is refused. */
export const longestLineBytes = headBytes;

export type Line = {
	readonly text: string;
	/** Where the line after it starts. */
	readonly end: number;
};

export type Head = {
	readonly lines: readonly Line[];
	readonly lineEnd: Dialect['lineEnd'];
	readonly decode: (bytes: Uint8Array) => string;
	/** Undefined for UTF-8. */
	readonly encoding: string | undefined;
};

/** The first bytes of a log, as they come. */
export class HeadBytes {
	readonly #bytes = new Uint8Array(headBytes);
	#length = 0;

	/** Takes what there is room for, and gives the rest. */
	take(bytes: Uint8Array): Uint8Array {
		const taken = bytes.subarray(0, headBytes - this.#length);
		this.#bytes.set(taken, this.#length);
		this.#length += taken.length;
		return bytes.subarray(taken.length);
	}

	get isFull(): boolean {
		return this.#length === headBytes;
	}

	get bytes(): Uint8Array {
		return this.#bytes.subarray(0, this.#length);
	}
}

const lineFeed = 10;
const carriageReturn = 13;
const byteOrderMark = [0xef, 0xbb, 0xbf];

/** Lines of the head; the last one without its end only where the file ends there. */
export function headOf(bytes: Uint8Array, isWhole: boolean): Head {
	const end = bytes.includes(lineFeed) || !bytes.includes(carriageReturn) ? lineFeed : carriageReturn;
	const {decode, encoding} = decoderFor(bytes, isWhole);
	const lines: Line[] = [];
	let start = byteOrderMark.every((byte, i) => bytes[i] === byte) ? byteOrderMark.length : 0;
	while (start < bytes.length) {
		const at = bytes.indexOf(end, start);
		if (at === -1 && !isWhole) break;
		const stop = at === -1 ? bytes.length : at;
		const text = decode(bytes.subarray(start, stop));
		lines.push({text: text.endsWith('\r') ? text.slice(0, -1) : text, end: Math.min(bytes.length, stop + 1)});
		start = stop + 1;
	}
	return {lines, lineEnd: end === lineFeed ? '\n' : '\r', decode, encoding};
}

/** UTF-8, or else the single-byte code that most other files have. */
function decoderFor(bytes: Uint8Array, isWhole: boolean): Pick<Head, 'decode' | 'encoding'> {
	const loose = new TextDecoder('utf-8');
	try {
		// The head may end within a character.
		new TextDecoder('utf-8', {fatal: true}).decode(bytes, {stream: !isWhole});
		return {decode: part => loose.decode(part), encoding: undefined};
	} catch {
		const single = new TextDecoder('windows-1252');
		return {decode: part => single.decode(part), encoding: 'Windows-1252'};
	}
}
