import {spawnSync} from 'node:child_process';
import {existsSync} from 'node:fs';
import {budget, line, median, timingOf, told} from './harness.ts';

const program = 'dist/droprack.js';
const rounds = 15;

/** Prints the peak of memory in kB on a pipe of its own when the process ends. */
const memoryHook = `data:text/javascript,${encodeURIComponent(
	"import {writeSync} from 'node:fs'; process.on('exit', () => writeSync(3, String(process.resourceUsage().maxRSS)));",
)}`;

function run(args: readonly string[]): number {
	const start = performance.now();
	const {status, stderr} = spawnSync(process.execPath, args, {encoding: 'utf8'});
	if (status !== 0) throw new Error(`node ${args.join(' ')} ended with ${status}: ${stderr}`);
	return performance.now() - start;
}

function peakMb(args: readonly string[]): number {
	const {output} = spawnSync(process.execPath, ['--import', memoryHook, ...args], {
		encoding: 'utf8',
		stdio: ['ignore', 'pipe', 'pipe', 'pipe'],
	});
	return Number(output[3]) / 1024;
}

/** Whole processes against Node with nothing to do, in turns, so that a busy moment hits them all. */
export function benchProcesses(): void {
	line('Whole processes, against node -e 1');
	if (!existsSync(program)) {
		line(`  left out: ${program} is not built; run npm run build first`);
		return;
	}
	const {tracks} = JSON.parse(
		spawnSync(process.execPath, [program, 'tracks', '--json'], {encoding: 'utf8'}).stdout,
	) as {tracks: {name: string; straights: number}[]};
	const largest = tracks.reduce((one, other) => (other.straights > one.straights ? other : one)).name;
	const commands = {
		'node -e 1': ['-e', '1'],
		[`rank ${largest}`]: [program, 'rank', largest],
		tracks: [program, 'tracks'],
	};
	const times = new Map(Object.keys(commands).map(name => [name, [] as number[]]));
	for (const args of Object.values(commands)) run(args);
	for (let i = 0; i < rounds; i++)
		for (const [name, args] of Object.entries(commands)) times.get(name)!.push(run(args));
	const medians = Object.keys(commands).map(name => median(times.get(name)!));
	const memory = Object.values(commands).map(args => median([1, 2, 3].map(() => peakMb(args))));
	Object.keys(commands).forEach((name, i) => {
		line(
			`  ${name}: median ${medians[i]!.toFixed(0)} ms (${told(timingOf(times.get(name)!))}), peak ${memory[i]!.toFixed(0)} MB`,
		);
	});
	budget('rank ÷ node', medians[1]! / medians[0]!, 3, '×');
	budget('tracks ÷ node', medians[2]! / medians[0]!, 1.5, '×');
	budget('peak of rank', memory[1]!, 80, 'MB');
}
