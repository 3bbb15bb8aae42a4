/** The last step: lines to text, meaning to color. Color is never the only carrier. */
import picocolors from 'picocolors';
import type {Tone} from './blocks.ts';
import type {Line} from './layout.ts';
import {displayWidth} from './width.ts';

type Paint = (text: string) => string;

const paints = (color: boolean): Record<Tone, Paint> => {
	const colors = picocolors.createColors(color);
	return {
		plain: text => text,
		strong: colors.bold,
		muted: colors.dim,
		pass: colors.green,
		near: colors.yellow,
		fail: text => colors.bold(colors.red(text)),
		first: text => text,
		second: colors.magenta,
	};
};

/** Signs that have an ASCII stand-in of the same width. */
const standIns: Readonly<Record<string, string>> = {
	'·': '-',
	'±': '~',
	'…': '~',
	'°': ' ',
	'³': '3',
	'²': '2',
	'×': 'x',
	'÷': '/',
	'−': '-',
	'–': '-',
	'—': '-',
	'’': "'",
	'“': '"',
	'”': '"',
	'│': '|',
	'─': '-',
	'┤': '+',
	'┬': '+',
	'└': '+',
	'╌': '-',
};

/** The text in ASCII, as wide as it was: letters lose their accents, what has no stand-in becomes question marks. */
export const toAscii = (text: string): string =>
	[...text.normalize('NFC')]
		.map(character => {
			if (character <= '~') return character;
			const standIn = standIns[character] ?? character.normalize('NFD').replace(/\p{Mark}/gu, '');
			return /^[\x20-\x7e]+$/.test(standIn) ? standIn : '?'.repeat(displayWidth(character));
		})
		.join('');

export type Painting = {color: boolean; ascii: boolean};

export const paint = (lines: readonly Line[], {color, ascii}: Painting): string => {
	const tones = paints(color);
	const write = (text: string, tone: Tone) => {
		const content = ascii ? toAscii(text) : text;
		return content.trim() === '' ? content : tones[tone](content);
	};
	return lines.map(cells => `${cells.map(({text, tone}) => write(text, tone)).join('')}\n`).join('');
};
