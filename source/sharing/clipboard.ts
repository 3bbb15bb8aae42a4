/** How a text gets to the clipboard of the terminal that the person sits at, over SSH too. */

export type ToClipboard =
	/** Written to the terminal. Nothing answers, so nobody knows whether it arrived. */
	| {kind: 'write'; bytes: string}
	/** A command that takes the text on its standard input. */
	| {kind: 'run'; command: string; args: readonly string[]; input: string};

/** Inside tmux its own buffer command, which passes the text on with default options; elsewhere OSC 52. */
export function toClipboard(text: string, environment: Readonly<Record<string, string | undefined>>): ToClipboard {
	if (environment.TMUX) return {kind: 'run', command: 'tmux', args: ['load-buffer', '-w', '-'], input: text};
	return {kind: 'write', bytes: `\u001b]52;c;${Buffer.from(text, 'utf8').toString('base64')}\u0007`};
}
