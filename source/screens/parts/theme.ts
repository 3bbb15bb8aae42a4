/** The last step: meaning to how a terminal shows it. Words and marks carry the meaning first; color is never alone. */
import {toAscii} from '../../text/paint.ts';
import type {Meaning, Pieces} from './pieces.ts';

export type Theme = {readonly color: boolean; readonly ascii: boolean};

/** Signs of the screen that have no ASCII stand-in elsewhere. Same width. */
const asciiSigns: Readonly<Record<string, string>> = {
	'┼': '+',
	'▸': '>',
	'●': 'o',
	'○': 'x',
	'↑': '^',
	'↓': 'v',
	'←': '<',
	'→': '>',
	'┆': ':',
};

/**
 * Select Graphic Rendition (ECMA-48), set and reset. Only the 16 colors that a terminal's own theme defines, and where text
 * could be too light or too dark for the background, the background is set as well.
 */
const codes: Record<Meaning, {color: readonly [string, string]; plain: readonly [string, string]}> = {
	plain: {color: ['', ''], plain: ['', '']},
	strong: {color: ['1', '22'], plain: ['1', '22']},
	muted: {color: ['2', '22'], plain: ['2', '22']},
	pass: {color: ['32', '39'], plain: ['', '']},
	near: {color: ['30;43', '39;49'], plain: ['4', '24']},
	fail: {color: ['1;97;41', '22;39;49'], plain: ['1;4', '22;24']},
	chosen: {color: ['7', '27'], plain: ['7', '27']},
	caret: {color: ['7', '27'], plain: ['7', '27']},
	key: {color: ['1', '22'], plain: ['1', '22']},
	first: {color: ['', ''], plain: ['', '']},
	second: {color: ['35', '39'], plain: ['', '']},
	// Black on white of the 256 colors, which no theme changes, whatever is set: else no phone reads it.
	code: {color: ['38;5;16;48;5;231', '39;49'], plain: ['38;5;16;48;5;231', '39;49']},
};

const sgr = (code: string) => (code === '' ? '' : `\x1B[${code}m`);

export function shown(text: string, {ascii}: Theme): string {
	return ascii ? toAscii([...text].map(sign => asciiSigns[sign] ?? sign).join('')) : text;
}

/** One line as a terminal gets it. */
export function painted(pieces: Pieces, theme: Theme): string {
	return pieces
		.map(({text, tone}) => {
			const [on, off] = theme.color ? codes[tone].color : codes[tone].plain;
			const content = shown(text, theme);
			const bare = on === '' || (content.trim() === '' && tone !== 'caret' && tone !== 'chosen' && tone !== 'code');
			return bare ? content : sgr(on) + content + sgr(off);
		})
		.join('');
}
