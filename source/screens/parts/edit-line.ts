/** One editable line: a pure reducer, so that any number of fields share one key handler. */
import {visible} from '../../documents/visible.ts';
import {type KeyEvent, keyName} from '../terminal/key-event.ts';
import {withoutSequences} from '../terminal/sequences.ts';
import {after, before, wordAfter, wordBefore} from './graphemes.ts';

/** `caret` is an offset in UTF-16 units, always between two whole characters. */
export type EditLine = {readonly text: string; readonly caret: number};

export const editLine = (text: string): EditLine => ({text, caret: text.length});

/** More than any field holds. */
const longest = 400;

type Edit = (line: EditLine) => EditLine;

const moveTo =
	(place: (text: string, caret: number) => number): Edit =>
	({text, caret}) => ({text, caret: place(text, caret)});

/** Removes what lies between the caret and another place. */
const removeTo =
	(place: (text: string, caret: number) => number): Edit =>
	({text, caret}) => {
		const other = place(text, caret);
		const [from, to] = other < caret ? [other, caret] : [caret, other];
		return {text: text.slice(0, from) + text.slice(to), caret: from};
	};

const start = () => 0;
const end = (text: string) => text.length;

const edits: Readonly<Record<string, Edit>> = {
	left: moveTo(before),
	right: moveTo(after),
	home: moveTo(start),
	'ctrl+a': moveTo(start),
	end: moveTo(end),
	'ctrl+e': moveTo(end),
	'ctrl+left': moveTo(wordBefore),
	'alt+b': moveTo(wordBefore),
	'ctrl+right': moveTo(wordAfter),
	'alt+f': moveTo(wordAfter),
	backspace: removeTo(before),
	delete: removeTo(after),
	'ctrl+d': removeTo(after),
	'ctrl+w': removeTo(wordBefore),
	'alt+backspace': removeTo(wordBefore),
	'alt+d': removeTo(wordAfter),
	'ctrl+u': removeTo(start),
	'ctrl+k': removeTo(end),
};

/** The line after a key or a paste; undefined where the key is not one of editing, and for others to handle. */
export function edited(line: EditLine, event: KeyEvent): EditLine | undefined {
	if (event.kind === 'paste') return inserted(line, firstLine(event.text));
	if (event.kind === 'text') return inserted(line, event.text);
	return edits[keyName(event)!]?.(line);
}

function inserted({text, caret}: EditLine, added: string): EditLine {
	const safe = printable(added).slice(0, Math.max(0, longest - text.length));
	return {text: text.slice(0, caret) + safe + text.slice(caret), caret: caret + safe.length};
}

/** Terminal sequences are taken out as a whole, and then every character that is not shown as itself. */
const printable = (text: string): string =>
	[...withoutSequences(text)].filter(character => visible(character) === character).join('');

/** The first line with anything on it, without the blanks around it. */
const firstLine = (text: string): string =>
	text
		.split(/[\r\n]+/)
		.map(line => line.replace(/\t/g, ' ').trim())
		.find(line => line !== '') ?? '';
