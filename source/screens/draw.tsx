/** Hands the screen over to Ink. */
import {render} from 'ink';
import {App} from './app.tsx';
import type {Theme} from './parts/theme.ts';
import type {LiveSession} from './session/live.ts';
import type {Screen} from './terminal/screen.ts';

export type Drawing = {
	unmount(): void;
	/** Settles when a person has left; rejects when drawing failed. */
	readonly left: Promise<unknown>;
};

export function drawWithInk(live: LiveSession, theme: Theme, screen: Screen): Drawing {
	const ink = render(<App live={live} theme={theme} screen={screen} />, {
		stdout: screen as unknown as NodeJS.WriteStream,
		// Whole frames, at once: the screen itself finds what has changed.
		debug: true,
		exitOnCtrlC: false,
		patchConsole: false,
	});
	return {unmount: ink.unmount, left: ink.waitUntilExit()};
}
