/** What a person sees as one character: steps over whole clusters of code points. Offsets are in UTF-16 units. */

let segmenter: Intl.Segmenter | undefined;
/** Made when first needed: it costs a start some milliseconds. */
const clusters = (text: string) => {
	segmenter ??= new Intl.Segmenter(undefined, {granularity: 'grapheme'});
	return segmenter.segment(text);
};
const simple = /^[\x20-\x7e]*$/;

/** The offset of the character before an offset; 0 at the start. */
export function before(text: string, offset: number): number {
	if (offset <= 0) return 0;
	if (simple.test(text)) return offset - 1;
	return clusters(text).containing(offset - 1)?.index ?? 0;
}

/** The offset after the character at an offset; the end of the text at its end. */
export function after(text: string, offset: number): number {
	if (offset >= text.length) return text.length;
	if (simple.test(text)) return offset + 1;
	const cluster = clusters(text).containing(offset);
	return cluster === undefined ? text.length : cluster.index + cluster.segment.length;
}

const isWordPart = (character: string) => /[\p{L}\p{N}_.]/u.test(character);

/** The start of the word before an offset; blanks and marks between are stepped over. */
export function wordBefore(text: string, offset: number): number {
	let at = offset;
	while (at > 0 && !isWordPart(text.slice(before(text, at), at))) at = before(text, at);
	while (at > 0 && isWordPart(text.slice(before(text, at), at))) at = before(text, at);
	return at;
}

/** The end of the word after an offset. */
export function wordAfter(text: string, offset: number): number {
	let at = offset;
	while (at < text.length && !isWordPart(text.slice(at, after(text, at)))) at = after(text, at);
	while (at < text.length && isWordPart(text.slice(at, after(text, at)))) at = after(text, at);
	return at;
}
