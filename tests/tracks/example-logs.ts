/**
 * The two practice runs that are shipped, as they are made: the demo car with a rollout, growth and drag that its document does not
 * know, driven by the independent integrator.
 */
import {type Dialect, logAsCsv, usualColumns} from '../practice/log-as-csv.ts';
import {type GeneratedLog, generateLog} from '../practice/log-generator.ts';
import {mount, samplePlan} from '../practice/sample.ts';

export type ExampleLog = GeneratedLog & {readonly csv: string};

const {time, speed, rpm, throttle, gear, lap} = usualColumns;
const seed = 20_260_731;

/** Tables begin after a few lines of their own, and have their units in a row. */
const shortTrackPreamble = ['"Run","Practice 1"', '"Track","Quillmere"', '"Sample rate","20 Hz"', ''];
const shortTrackDialect: Dialect = {
	delimiter: ',',
	decimal: '.',
	units: 'row',
	columns: {time, speed: {...speed, name: 'GPS Speed'}, rpm: {...rpm, name: 'Engine RPM'}, throttle, lap},
	lineEnd: '\n',
};

/** As in countries with a decimal comma, with a column of the gear. */
const roadDialect: Dialect = {
	delimiter: ';',
	decimal: ',',
	units: 'name',
	columns: {
		time,
		speed: {...speed, unit: 'km/h', perSi: 3.6, digits: 1},
		rpm: {...rpm, name: 'Engine speed', unit: '1/min'},
		throttle: {...throttle, name: 'Throttle position'},
		gear,
		lap: {...lap, name: 'Lap number'},
	},
	lineEnd: '\r\n',
};

/** Eight laps of a short track. */
export async function quillmereLog(): Promise<ExampleLog> {
	const plan = await samplePlan('quillmere');
	const wish = {seed, plan, mounted: mount(plan, '33/35 A'), sensors: {rateHz: 20}, driving: {laps: 8}};
	const log = generateLog(wish);
	return {...log, csv: `${shortTrackPreamble.join('\n')}\n${logAsCsv(log.run, shortTrackDialect)}`};
}

/** Two laps of a road course. */
export async function hesperRidgeLog(): Promise<ExampleLog> {
	const plan = await samplePlan('hesper-ridge');
	const sensors = {rateHz: 10, gear: true};
	const log = generateLog({seed, plan, mounted: mount(plan, '33/35 A'), sensors, driving: {laps: 2}});
	return {...log, csv: logAsCsv(log.run, roadDialect)};
}
