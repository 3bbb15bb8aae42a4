/** Hands the session to Ink in its mode for screen readers: on the normal screen, as text. */
import {render} from 'ink';
import {ReaderApp} from './reader-app.tsx';
import type {LiveSession} from './session/live.ts';

export function readAloud(live: LiveSession): {unmount(): void; left: Promise<unknown>} {
	const ink = render(<ReaderApp live={live} />, {exitOnCtrlC: false, isScreenReaderEnabled: true});
	return {unmount: ink.unmount, left: ink.waitUntilExit()};
}
