/** Logged runs, in bytes, in pieces of any size. */
import {readFileSync} from 'node:fs';
import {isDeepStrictEqual} from 'node:util';
import {readCar, readTrack} from '../../../source/documents/read.ts';
import {askedColumns, readLog} from '../../../source/logs/read-log.ts';
import {type Plan, planFor} from '../../../source/planning/plan.ts';
import {findInLog} from '../../../source/practice/find/find-in-log.ts';
import {inPieces, plainLog, plainRow, table} from '../../logs/log.ts';
import {nudged} from '../mutate.ts';
import type {Answer, Reader} from '../reader.ts';
import {shippedText} from './documents.ts';

const bytesOf = (text: string): Uint8Array => Buffer.from(text, 'latin1');
const columns = ['timeS', 'distanceM', 'speedMps', 'rpm', 'throttle', 'gear', 'lap', 'brake', 'steering'] as const;

/** Lines before the log that say which columns are meant, as on the command line. */
const asking = '--column ';

async function read(text: string): Promise<Answer> {
	const lines = text.split('\n');
	const first = lines.findIndex(line => !line.startsWith(asking));
	const asked = askedColumns(lines.slice(0, first).map(line => line.slice(asking.length)));
	if (typeof asked === 'string') return {accepted: false, said: asked};
	const bytes = bytesOf(lines.slice(first).join('\n'));
	const reading = await readLog(inPieces(bytes), {columns: asked});
	// How a file is cut into pieces is the disk's business.
	const cut = await readLog(inPieces(bytes, 7), {columns: asked});
	const isSame = isDeepStrictEqual(cut, reading) ? undefined : 'however it is cut it is the same';
	if (!reading.ok) {
		const {problems} = reading;
		return {
			accepted: false,
			said: problems
				.map(({where, found, allowed, do: remedy}) => [where, found, allowed, remedy].join('\n'))
				.join('\n'),
			problems: problems.map(({where, found, allowed}) => ({path: where, found, allowed})),
			broken: isSame,
		};
	}
	const {run, remarks, columns: used} = reading;
	const uneven = columns.find(name => run[name] !== null && run[name].length !== run.samples);
	return {
		accepted: true,
		said: [...remarks.map(({text: words}) => words), ...Object.values(used).map(({header}) => header)].join('\n'),
		broken:
			isSame ??
			(uneven !== undefined
				? `each column has an entry a sample: ${uneven}`
				: !neverFalls(run.timeS) || !neverFalls(run.distanceM)
					? 'time and distance never fall'
					: undefined),
	};
}

/** And is known everywhere. */
function neverFalls(values: Float64Array): boolean {
	return values.every((value, i) => Number.isFinite(value) && (i === 0 || value >= values[i - 1]!));
}

const rows = 12;
const inBytes = (text: string) => Buffer.from(text).toString('latin1');

export const logs: Reader = {
	name: 'logs',
	examples: () =>
		[
			plainLog,
			table('Time [s],Speed [m/s],RPM,Throttle [%]', rows, plainRow),
			`"Run","Practice 1"\n"Sample rate","20 Hz"\n\nTime,GPS Speed,Engine RPM,Throttle,Lap\ns,mph,rpm,%,\n${Array.from({length: rows}, (_, i) => `${i / 20},${30 + i},${2300 + 30 * i},25,0`).join('\n')}`,
			table('Distance (m);Speed (km/h);rpm;gear;brake', rows, i => `${10 * i};${100 + i},5;${5000 + 20 * i};3;0`),
			table('time\tspeed kph\trpm', rows, i => `00:00:0${i % 10}.${Math.floor(i / 10)}\t${100 + i} km/h\t${5000 + i}`),
			`${asking}rpm=#3\n${asking}speed=#2 [mph]\n${table('Time [s],b,c', rows, i => `${i / 10},${60 + i},${5000 + 20 * i}`)}`,
		].map(inBytes),
	words: [
		...[`${asking}speed=#2 [mph]\n`, `${asking}brake=none\n`, '=', '#1', '#99', 'none'],
		...['Time', 'Speed', 'RPM', 'Throttle', 'Distance', 'Gear', 'Lap', 'Brake', 'Steering', 'GPS Speed', 'Engine RPM'],
		...['[s]', '(ms)', 'mph', 'km/h', '%', 'rpm', 'm', 'ft', 'Hz', ',', ';', '\t', '"', '""', '\r\n', '\n\n', '\r'],
		...[
			'NaN',
			'-',
			'n/a',
			'1e5',
			'1.234,5',
			'00:01:02.5',
			'1:02',
			'-1',
			'\u00ef\u00bb\u00bf',
			'\u00ff\u00fe',
			'\u0000',
			'\u00b0',
		],
	],
	longest: 4000,
	work: {start: 100_000, perCharacter: 200},
	read,
};

let plan: Plan | undefined;
/** What the logs below were driven with. */
async function drivenWith(): Promise<Plan> {
	const [car, track] = [await readCar(shippedText('cars/demo')), await readTrack(shippedText('quillmere'))];
	const planned = car.ok && track.ok ? planFor(car.value, track.value) : undefined;
	if (!planned?.ok) throw new Error('the shipped documents are no plan');
	return planned.value;
}

/** Beyond the reading: whatever a log that was read holds, something is found in it or nothing, and nothing is thrown. */
export const practice: Reader = {
	name: 'practice',
	examples: () => [
		readFileSync('tracks/logs/quillmere.csv', 'latin1').split('\n').slice(0, 700).join('\n'),
		inBytes(plainLog),
	],
	words: logs.words,
	mutators: [nudged, nudged, nudged],
	longest: 24_000,
	work: {start: 2_000_000, perCharacter: 400},
	read: async text => {
		plan ??= await drivenWith();
		const reading = await readLog(inPieces(bytesOf(text)));
		if (!reading.ok) return {accepted: false};
		const {samples} = findInLog(reading.run, plan);
		const isWhole = samples.gear.length === samples.state.length;
		return {accepted: true, broken: isWhole ? undefined : 'there is a finding for each sample'};
	},
};
