/** A reply to the process's own streams and exit status. */
import type {Writable} from 'node:stream';
import {type Reply, status} from './reply.ts';

type Failure = NodeJS.ErrnoException | undefined;

const write = (stream: Writable, text: string): Promise<Failure> =>
	new Promise(resolve => {
		stream.once('error', resolve);
		stream.write(text, error => resolve(error ?? undefined));
	});

/**
 * Writes both texts and gives the exit status. A reader who has seen enough and closed the pipe is no failure;
 * a full disk is one.
 */
export const writeReply = async (reply: Reply, out: Writable, err: Writable): Promise<number> => {
	// A closed standard error has nowhere to be reported.
	if (reply.err !== '') await write(err, reply.err);
	if (reply.out === '') return reply.status;
	const failure = await write(out, reply.out);
	if (!failure) return reply.status;
	if (failure.code === 'EPIPE') return status.done;
	await write(err, `droprack: the result could not be written (${failure.code ?? failure.message}).\n`);
	return status.unreachable;
};
