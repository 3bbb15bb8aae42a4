/** A long log: our reading beside a fast parser alone on the same file, and the memory that ours takes. */
import {spawnSync} from 'node:child_process';
import {closeSync, mkdtempSync, openSync, rmSync, statSync, writeSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {dirname, join} from 'node:path';
import type {Figures} from './budgets.ts';
import {assertClose, line, median, seeded} from './harness.ts';
import type {ReadOnce} from './read-log.ts';

const rowCount = 1_400_000;
const otherColumns = 11;
const rounds = 7;
const bytesPerMegabyte = 1_000_000;

const headers = ['Time,Distance,GPS Speed,Engine RPM,Throttle,Gear,Lap,Brake,Steering', 's,m,mph,rpm,%,,,bar,deg'];

/** Each reading is a process of its own, in turns. */
export function benchLogs(figures: Figures, seed: number): void {
	const place = mkdtempSync(join(tmpdir(), 'droprack-bench-log-'));
	try {
		const file = join(place, 'run.csv');
		writeLog(file, seed);
		const megabytes = statSync(file).size / bytesPerMegabyte;
		line(
			`A log of ${megabytes.toFixed(0)} MB, ${rowCount} rows, 20 columns, read by us and by udsv; ${rounds} runs in turn`,
		);
		const [ours, theirs]: [ReadOnce[], ReadOnce[]] = [[], []];
		for (let round = 0; round < rounds; round++) {
			theirs.push(readBy('udsv', file));
			ours.push(readBy('ours', file));
		}
		assertClose('rows', ours[0]!.rows, theirs[0]!.rows, 0);
		assertClose('sum of speeds', ours[0]!.sumMps, theirs[0]!.sumMps, 1e-7);
		for (const [name, reads] of [
			['ours', ours],
			['udsv', theirs],
		] as const)
			line(
				`  ${name} min ${leastMs(reads).toFixed(0)} ms, ${((megabytes / leastMs(reads)) * 1000).toFixed(0)} MB/s, peak ${peakMb(reads).toFixed(0)} MB`,
			);
		figures.hold('logSpeed', leastMs(theirs) / leastMs(ours));
		figures.hold('logMemory', peakMb(ours));
	} finally {
		rmSync(place, {recursive: true});
	}
}

const leastMs = (reads: readonly ReadOnce[]): number => Math.min(...reads.map(({ms}) => ms));
const peakMb = (reads: readonly ReadOnce[]): number => median(reads.map(({peakKb}) => peakKb / 1024));

function readBy(reader: 'ours' | 'udsv', file: string): ReadOnce {
	// Beside this bundle: see `run.mjs`.
	const program = join(dirname(process.argv[1]!), 'read-log.mjs');
	const {status, stdout, stderr} = spawnSync(process.execPath, [program, reader, file], {encoding: 'utf8'});
	if (status !== 0) throw new Error(`reading by ${reader} ended with ${status}: ${stderr}`);
	return JSON.parse(stdout) as ReadOnce;
}

/** A hundred samples a second of laps of half a minute, and columns that nobody asks for. */
function writeLog(file: string, seed: number): void {
	const random = seeded(seed);
	const handle = openSync(file, 'w');
	const others = Array.from({length: otherColumns}, (_, i) => `Channel ${i + 1}`);
	let text = `${headers[0]},${others.join(',')}\n${headers[1]},${others.map(() => 'V').join(',')}\n`;
	let distanceM = 0;
	for (let i = 0; i < rowCount; i++) {
		const timeS = i / 100;
		const speedMph = 130 + 25 * Math.sin(timeS / 5) + random() / 10;
		distanceM += (speedMph * 0.44704) / 100;
		const ours = [
			timeS.toFixed(2),
			distanceM.toFixed(1),
			speedMph.toFixed(2),
			(55 * speedMph).toFixed(0),
			(100 * random()).toFixed(1),
			4,
			Math.floor(timeS / 30) + 1,
			(40 * random()).toFixed(1),
			(20 * random() - 10).toFixed(2),
		];
		text += `${ours.join(',')},${others.map(() => (5 * random()).toFixed(3)).join(',')}\n`;
		if (text.length > bytesPerMegabyte) {
			writeSync(handle, text);
			text = '';
		}
	}
	writeSync(handle, text);
	closeSync(handle);
}
