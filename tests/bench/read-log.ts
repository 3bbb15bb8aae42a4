/** One reading of a log, as a process of its own: by us, or by a fast parser alone. Prints what it took. */
import {createReadStream} from 'node:fs';
import {inferSchema, initParser, type Parser} from 'udsv';
import {readLogFile} from '../../source/commands/read-log-file.ts';
import {processSurroundings} from '../../source/commands/surroundings.ts';

export type ReadOnce = {
	readonly ms: number;
	readonly rows: number;
	/** So that both are seen to have read the same. */
	readonly sumMps: number;
	readonly peakKb: number;
};

const mph = 0.44704;
const [reader, file = ''] = process.argv.slice(2);

async function byUs(): Promise<Pick<ReadOnce, 'rows' | 'sumMps'>> {
	const around = processSurroundings(new URL('file:///nonexistent/'));
	const found = await readLogFile(file, around, {});
	if (!found.ok) throw new Error(found.message);
	const {run} = found.value.reading;
	return {rows: run.samples, sumMps: run.speedMps.reduce((sum, speed) => sum + speed, 0)};
}

/** As its own documentation reads a stream without keeping it: cells as text, one of which we make a number of. */
async function byUdsv(): Promise<Pick<ReadOnce, 'rows' | 'sumMps'>> {
	const decoder = new TextDecoder();
	let parser: Parser | undefined;
	let [rows, sumMph] = [0, 0];
	for await (const chunk of createReadStream(file)) {
		const text = decoder.decode(chunk as Uint8Array, {stream: true});
		parser ??= initParser(inferSchema(text, {header: ([names]) => [names!, null]}));
		parser.chunk(text, parser.stringArrs, (row: string[]) => {
			rows++;
			sumMph += Number(row[2]);
		});
	}
	parser?.end();
	return {rows, sumMps: sumMph * mph};
}

const start = performance.now();
const read = await (reader === 'udsv' ? byUdsv() : byUs());
const ms = performance.now() - start;
process.stdout.write(JSON.stringify({...read, ms, peakKb: process.resourceUsage().maxRSS} satisfies ReadOnce));
