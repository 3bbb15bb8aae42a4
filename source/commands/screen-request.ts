/** Whether the words of the command line ask for the screen. */
import {readCommandLine} from './arguments.ts';
import type {Request} from './request.ts';

/** What the words ask of the screen; undefined where they ask for an answer in text. */
export function screenRequest(words: readonly string[]): Request | undefined {
	const line = readCommandLine(words);
	if (line.kind !== 'run' || line.command !== undefined) return undefined;
	const {json, strict, top, situation} = line.request;
	return json || strict || top !== undefined || situation !== undefined ? undefined : line.request;
}
