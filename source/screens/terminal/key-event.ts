/** What a person did at the keyboard. */

export type KeyEvent =
	/** A key with a name, or a letter together with Ctrl or Alt. */
	| {kind: 'key'; name: string; ctrl: boolean; alt: boolean; shift: boolean}
	/** One printable character. */
	| {kind: 'text'; text: string}
	/** Everything that was pasted at once. */
	| {kind: 'paste'; text: string};

export type Modifiers = {ctrl?: boolean; alt?: boolean; shift?: boolean};

export const keyEvent = (name: string, {ctrl = false, alt = false, shift = false}: Modifiers = {}): KeyEvent => ({
	kind: 'key',
	name,
	ctrl,
	alt,
	shift,
});

/** How a key table writes it: "ctrl+r", "shift+tab", "enter", "q"; undefined for a paste. */
export function keyName(event: KeyEvent): string | undefined {
	if (event.kind === 'paste') return undefined;
	if (event.kind === 'text') return event.text === ' ' ? 'space' : event.text;
	const {name, ctrl, alt, shift} = event;
	return `${ctrl ? 'ctrl+' : ''}${alt ? 'alt+' : ''}${shift ? 'shift+' : ''}${name}`;
}
