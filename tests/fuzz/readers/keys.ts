/** What arrives from a terminal, cut anywhere: keys, and what they make of an edited line. */
import {isDeepStrictEqual} from 'node:util';
import {type EditLine, edited, editLine} from '../../../source/screens/parts/edit-line.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import type {KeyEvent} from '../../../source/screens/terminal/key-event.ts';
import type {Answer, Reader} from '../reader.ts';

const decoded = (chunks: readonly string[]): {events: KeyEvent[]; isOpen: boolean} => {
	const decoder = new KeyDecoder();
	const events = [...chunks.flatMap(chunk => decoder.push(chunk)), ...decoder.flush(), ...decoder.flush()];
	return {events, isOpen: decoder.pending !== undefined};
};

/** Characters, not their halves: a terminal's bytes are decoded before they come here. */
const pieces = (text: string, size: number): string[] => {
	const characters = [...text];
	return Array.from({length: Math.ceil(characters.length / size)}, (_, i) =>
		characters.slice(i * size, (i + 1) * size).join(''),
	);
};

function read(text: string): Answer {
	const whole = decoded([text]);
	const cut = [1, 2, 7].find(size => !isDeepStrictEqual(decoded(pieces(text, size)).events, whole.events));
	const line = whole.events.reduce<EditLine>((now, event) => edited(now, event) ?? now, editLine('88 mph'));
	const isInside = line.caret >= 0 && line.caret <= line.text.length;
	return {
		accepted: true,
		said: line.text,
		broken: whole.isOpen
			? 'nothing stays open'
			: cut !== undefined
				? `however it is cut the keys are the same: ${JSON.stringify([whole.events, decoded(pieces(text, cut)).events])}`
				: !isInside || line.text.length > mostInLine || line.text.includes('\n')
					? `the line stays a line with the caret in it: ${JSON.stringify(line)}`
					: undefined,
	};
}

const mostInLine = 400;

export const keys: Reader = {
	name: 'keys',
	examples: () => [
		'jk12\r',
		'\x1B[A\x1BOB\x1B[1;5C\x1B[3~\x1B[Z',
		'\x1B',
		'\x1Bb\x1B\x7F',
		'\x1B[200~86.5 in\r\n\x1B[31mred\x1B[201~q',
		'\x1B]11;rgb:0000/0000/0000\x07\x1BP1+r544e=1\x1B\\',
		'\x1B[<0;10;5M\x1B[M !"\x1B[[A',
		'é漢👍\x01\x03\x1A',
	],
	words: [
		'\x1B',
		'\x1B[',
		'\x1BO',
		'\x1B]',
		'\x1BP',
		'\x1B[200~',
		'\x1B[201~',
		'\x1B[M',
		'\x1B[[',
		'\x1B\\',
		'\x07',
		';5',
		'~',
		'\x7F',
		'\x17',
		'\x15',
	],
	longest: 2000,
	read,
};
