/** The sequences that terminals send: what one at the start of a text is, and how long. */
import {type KeyEvent, keyEvent} from './key-event.ts';

/** `length` characters are done with; `event` is absent where they mean nothing to us. */
export type Sequence = {length: number; event?: KeyEvent};

const byFinal: Readonly<Record<string, string>> = {
	A: 'up',
	B: 'down',
	C: 'right',
	D: 'left',
	F: 'end',
	H: 'home',
	Z: 'tab',
	P: 'f1',
	Q: 'f2',
	R: 'f3',
	S: 'f4',
};
/** The number before `~`. */
const byNumber: Readonly<Record<string, string>> = {
	1: 'home',
	2: 'insert',
	3: 'delete',
	4: 'end',
	5: 'pageup',
	6: 'pagedown',
	7: 'home',
	8: 'end',
	11: 'f1',
	12: 'f2',
	13: 'f3',
	14: 'f4',
	15: 'f5',
	17: 'f6',
	18: 'f7',
	19: 'f8',
	20: 'f9',
	21: 'f10',
	23: 'f11',
	24: 'f12',
};

const esc = '\x1B';
// What follows the ESC. A control sequence (ECMA-48): parameters, intermediates, a final character.
const control = /^\[([0-?]*)[ -/]*([@-~])/;
const unfinishedControl = /^\[[0-?]*[ -/]*$/;
const single = /^O([A-Za-z])/;
/** A mouse report of the oldest kind: three more characters. */
const oldMouse = /^\[M[\s\S]{3}/u;
const unfinishedOldMouse = /^\[M[\s\S]{0,2}$/u;
/** The Linux console's F1 to F5. */
const linuxConsole = /^\[\[[\s\S]/u;
/** Answers of the terminal, closed by BEL or by ESC and a backslash; any other control character breaks one off. */
const answer = new RegExp(`^[\\]PX^_]\\P{Cc}*(?:${esc}\\\\|(?=${esc})|(?!${esc})\\p{Cc})`, 'u');
const unfinishedAnswer = /^[\]PX^_]\P{Cc}*$/u;

/** Whether the text may be the beginning of a sequence whose rest is still on its way. */
export function isUnfinished(text: string): boolean {
	const body = text.slice(esc.length);
	if (body === '' || body === 'O' || body === '[[') return true;
	if (unfinishedOldMouse.test(body) || unfinishedControl.test(body)) return true;
	return unfinishedAnswer.test(body) || (body.endsWith(esc) && unfinishedAnswer.test(body.slice(0, -1)));
}

/** The sequence at the start of a text that starts with ESC; undefined where it is just the key Esc, or Alt with a key. */
export function sequenceAt(text: string): Sequence | undefined {
	const body = text.slice(esc.length);
	const meaningless = oldMouse.exec(body) ?? linuxConsole.exec(body) ?? answer.exec(body);
	if (meaningless) return {length: esc.length + meaningless[0].length};
	const found = control.exec(body);
	if (found) return {length: esc.length + found[0].length, ...controlKey(found[1]!, found[2]!)};
	const short = single.exec(body);
	return short ? {length: esc.length + short[0].length, ...named(byFinal[short[1]!], 0)} : undefined;
}

/** The text without the sequences in it: a paste may hold what a program wrote to a terminal. */
export function withoutSequences(text: string): string {
	const [first = '', ...rest] = text.split(esc);
	return first + rest.map(part => part.slice((sequenceAt(esc + part)?.length ?? 1) - 1)).join('');
}

function controlKey(parameters: string, final: string): {event?: KeyEvent} {
	const [first = '', second = ''] = parameters.split(';');
	const name = final === '~' ? byNumber[first] : byFinal[final];
	// xterm counts the modifiers from 1: 1 + shift + 2 alt + 4 ctrl.
	const modifiers = (Number.parseInt(second, 10) || 1) - 1;
	return named(/^[\d;]*$/.test(parameters) ? name : undefined, final === 'Z' ? modifiers | 1 : modifiers);
}

function named(name: string | undefined, modifiers: number): {event?: KeyEvent} {
	if (name === undefined) return {};
	const has = (bit: number) => (modifiers & bit) !== 0;
	return {event: keyEvent(name, {shift: has(1), alt: has(2), ctrl: has(4)})};
}
