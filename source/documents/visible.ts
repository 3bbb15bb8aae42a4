/**
 * Text of unknown origin made safe to show: control characters become their pictures (␀ to ␟, ␡), and C1 controls,
 * bidirectional marks, invisible blanks and halves of a surrogate pair become U+FFFD. Nothing in the answer moves the
 * cursor, rings, or turns the direction of the line. One code unit stays one code unit, so that columns still agree.
 */
export function visible(text: string): string {
	return text.replace(unsafe, pictureOf);
}

// Lone surrogates match because of the u flag; U+200C and U+200D stay: scripts and emoji need them.
const unsafe = /[\p{Cc}\u061C\u200B\u200E\u200F\u2028-\u202E\u2060-\u206F\uFEFF\uFFF9-\uFFFB\p{Cs}]/gu;
const controlPictures = 0x2400;
const deletePicture = '\u2421';
const replacement = '\uFFFD';

function pictureOf(character: string): string {
	const code = character.charCodeAt(0);
	if (code < 0x20) return String.fromCharCode(controlPictures + code);
	return code === 0x7f ? deletePicture : replacement;
}
