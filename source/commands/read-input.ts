/** The text of a file or of standard input, or why it cannot be had. */
import {createReadStream} from 'node:fs';
import {stat} from 'node:fs/promises';
import {visible} from '../documents/visible.ts';
import {badInput, type Found, found, type Refusal, unreachable} from './reply.ts';

export type Input = {
	/** What messages call it. */
	label: string;
	text: string;
};

const bytesPerMegabyte = 1_000_000;

/** Errors of the file system that say that the name is wrong, not that the disk or a permission is. */
const wrongName: Readonly<Record<string, string>> = {
	ENOENT: 'there is no such file',
	ENOTDIR: 'there is no such file: a part of its path is not a directory',
	EISDIR: 'is a directory; WHAT is one file',
	ELOOP: 'is a link to itself',
	ENAMETOOLONG: 'the name is too long',
};

/** Why it cannot be read, from what the system threw. */
export const refusalOf = (label: string, error: unknown, what = 'a document'): Refusal => {
	const code = (error as NodeJS.ErrnoException).code ?? '';
	const known = wrongName[code];
	if (known) return badInput(`${label}: ${known.replace('WHAT', what)}.`);
	if (code === 'EACCES' || code === 'EPERM') return unreachable(`${label}: no permission to read it.`);
	return unreachable(`${label}: cannot be read (${code || String(error)}).`);
};

/** Reads at most `limit` bytes; undefined where there are more. */
const collect = async (stream: AsyncIterable<Uint8Array>, limit: number): Promise<Buffer | undefined> => {
	const chunks: Uint8Array[] = [];
	let size = 0;
	for await (const chunk of stream) {
		size += chunk.length;
		if (size > limit) return undefined;
		chunks.push(chunk);
	}
	return Buffer.concat(chunks);
};

/** The text in the bytes: UTF-8, not empty, no zeros. */
const decode = (label: string, bytes: Buffer): Found<Input> => {
	if (bytes.length === 0) return badInput(`${label}: is empty; expected a JSON document.`);
	const utf16 = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
	if (utf16) return badInput(`${label}: is UTF-16 text; save it as UTF-8.`);
	if (bytes.includes(0)) return badInput(`${label}: holds binary zeros, so it is no text; expected a JSON document.`);
	let text: string;
	try {
		text = new TextDecoder('utf-8', {fatal: true}).decode(bytes);
	} catch {
		return badInput(`${label}: is not UTF-8 text; save it as UTF-8.`);
	}
	return text.trim() === '' ? badInput(`${label}: is empty; expected a JSON document.`) : found({label, text});
};

const tooLarge = (label: string, limit: number): Refusal =>
	badInput(`${label}: is larger than ${limit / bytesPerMegabyte} MB; a document is a few kB.`);

/** Reads a whole file of at most `limit` bytes. */
export const readFileText = async (file: string, limit: number): Promise<Found<Input>> => {
	const label = visible(file);
	try {
		const about = await stat(file);
		if (about.isDirectory()) return badInput(`${label}: is a directory; a document is one file.`);
		if (about.size > limit) return tooLarge(label, limit);
		const bytes = await collect(createReadStream(file), limit);
		return bytes ? decode(label, bytes) : tooLarge(label, limit);
	} catch (error) {
		return refusalOf(label, error);
	}
};

/** Reads standard input to its end, or to the limit. */
export const readStandardInput = async (input: AsyncIterable<Uint8Array>, limit: number): Promise<Found<Input>> => {
	const label = 'standard input';
	try {
		const bytes = await collect(input, limit);
		return bytes ? decode(label, bytes) : tooLarge(label, limit);
	} catch (error) {
		return refusalOf(label, error);
	}
};
