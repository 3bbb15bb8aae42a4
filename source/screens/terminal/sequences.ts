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

/** Control sequences (ECMA-48): parameters, intermediates, a final character. */
const control = /^\x1B\[([0-?]*)[ -/]*([@-~])/;
const unfinishedControl = /^\x1B\[[0-?]*[ -/]*$/;
/** A mouse report of the oldest kind: three more characters. */
const oldMouse = '\x1B[M';
const oldMouseLength = 6;
/** The Linux console's F1 to F5: ESC [ [ A to E. */
const linuxConsole = '\x1B[[';
const linuxConsoleLength = 4;
/** Answers of the terminal, closed by BEL or ST: ESC ] … , ESC P … , ESC X … , ESC ^ … , ESC _ … */
const string = /^\x1B[\]PX^_][^\x07\x1B]*(?:\x07|\x1B\\)/;
const unfinishedString = /^\x1B[\]PX^_][^\x07\x1B]*\x1B?$/;

/** Whether the text may be the beginning of a sequence whose rest is still on its way. */
export function isUnfinished(text: string): boolean {
	if (text.startsWith(oldMouse)) return text.length < oldMouseLength;
	if (text.startsWith(linuxConsole)) return text.length < linuxConsoleLength;
	return text === '\x1B' || text === '\x1BO' || unfinishedControl.test(text) || unfinishedString.test(text);
}

/** The sequence at the start of a text that starts with ESC; undefined where it is just the key Esc, or Alt with a key. */
export function sequenceAt(text: string): Sequence | undefined {
	if (text.startsWith(oldMouse)) return {length: oldMouseLength};
	if (text.startsWith(linuxConsole)) return {length: linuxConsoleLength};
	const found = control.exec(text);
	if (found) return {length: found[0].length, ...controlKey(found[1]!, found[2]!)};
	const single = /^\x1BO([A-Za-z])/.exec(text);
	if (single) return {length: single[0].length, ...named(byFinal[single[1]!], 0)};
	const answer = string.exec(text);
	return answer ? {length: answer[0].length} : undefined;
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
