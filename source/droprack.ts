import * as nodeModule from 'node:module';
import {answer, replyFault} from './commands/main.ts';
import {screenRequest} from './commands/screen-request.ts';
import {canDraw, processSurroundings} from './commands/surroundings.ts';
import {writeReply} from './commands/write-reply.ts';

// Node 22 and later keep compiled code between runs; Node 20 has no such function.
(nodeModule as {enableCompileCache?: () => unknown}).enableCompileCache?.();

// From the bundle in dist and from here in source, the shipped tracks are next door.
const surroundings = processSurroundings(new URL('../tracks/', import.meta.url));

process.on('uncaughtException', async error => {
	process.exit(await writeReply(replyFault(error, surroundings), process.stdout, process.stderr));
});

const words = process.argv.slice(2);
const isTerminal = process.stdin.isTTY === true && process.stdout.isTTY === true;
const request = isTerminal ? screenRequest(words) : undefined;
if (request && canDraw(process.env, isTerminal)) {
	const {openAtTerminal} = await import('./commands/at-terminal.ts');
	await openAtTerminal(request, surroundings);
	process.exit(process.exitCode);
}
const reply = await answer(words, surroundings);
const note = request ? 'droprack: TERM is dumb, so the ranking is printed; the screen moves the cursor.\n' : '';
process.exitCode = await writeReply({...reply, err: note + reply.err}, process.stdout, process.stderr);
