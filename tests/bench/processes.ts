/** What the user waits for: a whole process, and the memory that it takes. */
import {spawnSync} from 'node:child_process';
import {demo} from '../../source/commands/shelf.ts';
import type {Figures} from './budgets.ts';
import {line, median, timedInTurns, told} from './harness.ts';

const program = 'dist/droprack.js';
const rounds = 15;

/** No documents of the one who measures. */
const env = {...process.env, DROPRACK_HOME: '/nonexistent'};

/** Prints the peak of memory in kB on a pipe of its own when the process ends. */
const memoryHook = `data:text/javascript,${encodeURIComponent(
	"import {writeSync} from 'node:fs'; process.on('exit', () => writeSync(3, String(process.resourceUsage().maxRSS)));",
)}`;

/** Whole processes against Node with nothing to do, in turns, so that a busy moment hits them all. */
export function benchProcesses(figures: Figures): void {
	const commands = {
		node: ['-e', '1'],
		rank: [program, 'rank', demo.track],
		tracks: [program, 'tracks'],
	};
	line(`Whole processes: node -e 1, droprack rank ${demo.track}, droprack tracks; ${rounds} runs in turn`);
	const works = Object.entries(commands).map(([name, args]) => [name, () => run(args)] as const);
	const timings = timedInTurns(Object.fromEntries(works) as Record<keyof typeof commands, () => number>, rounds);
	const {node, rank, tracks} = timings;
	const [nodeMb, rankMb, tracksMb] = Object.values(commands).map(peakMb) as [number, number, number];
	for (const [name, timing, mb] of [
		['node', node, nodeMb],
		['rank', rank, rankMb],
		['tracks', tracks, tracksMb],
	] as const)
		line(`  ${name.padEnd(6)} median ${timing.medianMs.toFixed(0)} ms, ${told(timing)}, peak ${mb.toFixed(0)} MB`);
	figures.hold('rankProcess', rank.medianMs / node.medianMs);
	figures.hold('tracksProcess', tracks.medianMs / node.medianMs);
	figures.hold('rankMemory', rankMb);
}

/** Any number will do, since the time is taken outside. */
function run(args: readonly string[]): number {
	const {status, stdout, stderr} = spawnSync(process.execPath, args, {encoding: 'utf8', env});
	if (status !== 0) throw new Error(`node ${args.join(' ')} ended with ${status}: ${stderr}`);
	return stdout.length;
}

/**
 * The median of a few runs. A shell stands between: Linux counts to a process what the one that started it held at that
 * moment, and a shell holds next to nothing.
 */
function peakMb(args: readonly string[]): number {
	return median(
		Array.from({length: 5}, () => {
			const words = [process.execPath, '--import', memoryHook, ...args];
			const {output} = spawnSync('sh', ['-c', '"$0" "$@"; exit $?', ...words], {
				encoding: 'utf8',
				env,
				stdio: ['ignore', 'pipe', 'pipe', 'pipe'],
			});
			return Number(output[3]) / 1024;
		}),
	);
}
