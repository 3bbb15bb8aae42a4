/** What the store answers, as a reply. What was done is said on standard error; standard output is for `--json`. */
import {type Answer, problemText, type StoreProblem} from '../store/answer.ts';
import {printJson} from './print.ts';
import {badInput, type Refusal, type Reply, replyDone, replyRefused, unreachable} from './reply.ts';
import type {Request} from './request.ts';

/** Disk, permission and lock are one kind of failure; what is in the files is another. */
export const refusalOf = (problem: StoreProblem): Refusal => {
	const message = `droprack: ${problemText(problem)}`;
	return isOfTheDisk(problem) ? unreachable(message) : badInput(message);
};

export const isOfTheDisk = ({reason}: StoreProblem): boolean => reason === 'unreachable' || reason === 'locked';

export const replyChanged = (name: string): Reply =>
	replyRefused(
		unreachable(
			`droprack: another copy changed ${name} just now; nothing was written. Look with droprack show, then try again.`,
		),
	);

/** A document was written: its name and file, and what to know. */
export const replyWritten = (
	done: {name: string; file: string} & Record<string, unknown>,
	notes: readonly string[],
	request: Request,
): Reply => replyDone(request.json ? printJson(done, request) : '', notes);

export const replyProblem = (answer: Answer<unknown> & {ok: false}): Reply => replyRefused(refusalOf(answer.problem));
