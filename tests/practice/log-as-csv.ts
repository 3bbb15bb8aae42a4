/** A generated log written as loggers write them. */
import type {LoggedRun} from '../../source/logs/logged-run.ts';

export type Column = 'time' | 'distance' | 'speed' | 'rpm' | 'throttle' | 'gear' | 'lap';

/** One column as it is written. */
export type Written = {
	readonly name: string;
	readonly unit: string;
	/** How many of the unit make one of ours (s, m, m/s, rev/min, share of 1). */
	readonly perSi: number;
	readonly digits: number;
};

export type Dialect = {
	readonly delimiter: ',' | ';' | '\t';
	readonly decimal: '.' | ',';
	/** Where units stand: with the name, "Speed [mph]"; in a row of their own; or nowhere. */
	readonly units: 'name' | 'row' | 'none';
	readonly columns: Partial<Record<Column, Written>>;
	readonly lineEnd: '\n' | '\r\n';
};

export const usualColumns: Record<Column, Written> = {
	time: {name: 'Time', unit: 's', perSi: 1, digits: 2},
	distance: {name: 'Distance', unit: 'ft', perSi: 1 / 0.3048, digits: 1},
	speed: {name: 'Speed', unit: 'mph', perSi: 1 / 0.44704, digits: 2},
	rpm: {name: 'RPM', unit: 'rpm', perSi: 1, digits: 0},
	throttle: {name: 'Throttle', unit: '%', perSi: 100, digits: 1},
	gear: {name: 'Gear', unit: '', perSi: 1, digits: 0},
	lap: {name: 'Lap', unit: '', perSi: 1, digits: 0},
};

const {time, speed, rpm, throttle, lap} = usualColumns;
export const plainDialect: Dialect = {
	delimiter: ',',
	decimal: '.',
	units: 'name',
	columns: {time, speed, rpm: {...rpm, unit: ''}, throttle, lap},
	lineEnd: '\n',
};

/** The columns of the dialect that the log has, in the order of the dialect. What is not known is left empty. */
export function logAsCsv(run: LoggedRun, dialect: Dialect = plainDialect): string {
	const channels: Record<Column, ArrayLike<number> | null> = {
		time: run.timeS,
		distance: run.distanceM,
		speed: run.speedMps,
		rpm: run.rpm,
		throttle: run.throttle,
		gear: run.gear,
		lap: run.lap,
	};
	const columns = (Object.keys(dialect.columns) as Column[]).flatMap(column => {
		const values = channels[column];
		return values === null ? [] : [{values, written: dialect.columns[column]!}];
	});
	const head = columns.map(({written: {name, unit}}) =>
		dialect.units === 'name' && unit !== '' ? `${name} [${unit}]` : name,
	);
	const lines = [head.join(dialect.delimiter)];
	if (dialect.units === 'row') lines.push(columns.map(({written}) => written.unit).join(dialect.delimiter));
	for (let i = 0; i < run.samples; i++) {
		lines.push(columns.map(({values, written}) => cell(values[i]!, written, dialect)).join(dialect.delimiter));
	}
	return lines.join(dialect.lineEnd) + dialect.lineEnd;
}

function cell(value: number, {perSi, digits}: Written, {decimal}: Dialect): string {
	return Number.isNaN(value) ? '' : (value * perSi).toFixed(digits).replace('.', decimal);
}
