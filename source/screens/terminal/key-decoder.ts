/** What arrives on standard input to what a person did. One event a key, whole pastes; what is unknown is dropped. */
import {type KeyEvent, keyEvent} from './key-event.ts';
import {isUnfinished, sequenceAt} from './sequences.ts';

const pasteStart = '\x1B[200~';
const pasteEnd = '\x1B[201~';
/** More than any document; the rest of a paste is passed over. */
const longestPaste = 2_000_000;

const controls: Readonly<Record<string, string>> = {
	'\r': 'enter',
	'\n': 'enter',
	'\t': 'tab',
	'\x7F': 'backspace',
	'\b': 'backspace',
};
const letterBefore = 0x60;

export class KeyDecoder {
	#rest = '';
	#pasted: string | undefined;

	/** What is still open: a sequence whose end decides what it is, or a paste. */
	get pending(): 'sequence' | 'paste' | undefined {
		if (this.#pasted !== undefined) return 'paste';
		return this.#rest === '' ? undefined : 'sequence';
	}

	push(chunk: string): KeyEvent[] {
		this.#rest += chunk;
		return this.#drain(false);
	}

	/** Nothing more has come for a moment: a lone Esc is the key, an open paste is over. */
	flush(): KeyEvent[] {
		return this.#drain(true);
	}

	#drain(final: boolean): KeyEvent[] {
		const events: KeyEvent[] = [];
		while (this.#rest !== '' || (final && this.#pasted !== undefined)) {
			const before = this.#rest;
			const event = this.#pasted === undefined ? this.#next(final) : this.#paste(final);
			if (event) events.push(event);
			else if (this.#rest === before && this.#rest !== '') break;
		}
		return events;
	}

	/** The next event; undefined where a sequence was dropped, or where nothing can be told yet and all is as it was. */
	#next(final: boolean): KeyEvent | undefined {
		const text = this.#rest;
		if (!text.startsWith('\x1B')) return this.#single(text, false);
		if (text.startsWith(pasteStart)) {
			this.#take(pasteStart.length);
			this.#pasted = '';
			return undefined;
		}
		if (isUnfinished(text)) return final ? this.#leftover(text) : undefined;
		const sequence = sequenceAt(text);
		if (sequence) {
			this.#take(sequence.length);
			return sequence.event;
		}
		this.#take(1);
		return this.#rest.startsWith('\x1B') ? keyEvent('escape') : this.#single(this.#rest, true);
	}

	/** One character, by itself or after an Esc that means Alt. */
	#single(text: string, alt: boolean): KeyEvent | undefined {
		const character = String.fromCodePoint(text.codePointAt(0)!);
		this.#take(character.length);
		const name = controls[character];
		if (name !== undefined) return keyEvent(name, {alt});
		if (character === '\0') return keyEvent('space', {alt, ctrl: true});
		if (character < ' ')
			return keyEvent(String.fromCharCode(character.charCodeAt(0) + letterBefore), {alt, ctrl: true});
		return alt ? keyEvent(character, {alt}) : {kind: 'text', text: character};
	}

	/** The beginning of a sequence that never came: Esc, or Alt with the one character after it; anything longer is dropped. */
	#leftover(text: string): KeyEvent | undefined {
		this.#take(text.length);
		if (text.length === 1) return keyEvent('escape');
		return text.length === 2 ? keyEvent(text[1]!, {alt: true}) : undefined;
	}

	#paste(final: boolean): KeyEvent | undefined {
		const end = this.#rest.indexOf(pasteEnd);
		if (end < 0 && !final) {
			// The end of what is here may be the beginning of the end mark.
			this.#add(Math.max(0, this.#rest.length - pasteEnd.length + 1));
			return undefined;
		}
		this.#add(end < 0 ? this.#rest.length : end);
		if (end >= 0) this.#take(pasteEnd.length);
		const text = this.#pasted!;
		this.#pasted = undefined;
		return {kind: 'paste', text};
	}

	#add(length: number): void {
		const room = Math.max(0, longestPaste - this.#pasted!.length);
		this.#pasted += this.#rest.slice(0, Math.min(room, length));
		this.#take(length);
	}

	#take(length: number): void {
		this.#rest = this.#rest.slice(length);
	}
}
