import {describe, expect, test} from 'vitest';
import {numbers, plainLog, plainRow, problemsOf, read, table, texts} from './log.ts';

const used = async (headers: string) => {
	const {columns} = await read(
		table(headers, 20, i =>
			headers
				.split(',')
				.map(() => `0.${i + 10}`)
				.join(','),
		),
	);
	return Object.fromEntries(Object.entries(columns).map(([channel, {column, unit}]) => [channel, `${column} ${unit}`]));
};

describe('headers are recognized', () => {
	test.each([
		['Time [s],Speed [km/h],RPM', {time: '1 s', speed: '2 km/h', rpm: '3 null'}],
		['elapsed_time(ms),gps_speed(MPH),engine_rpm(1/min)', {time: '1 ms', speed: '2 mph', rpm: '3 rpm'}],
		['timeMs,speedKmh,EngineRPM', {time: '1 ms', speed: '2 km/h', rpm: '3 null'}],
		['Time s,speed_mph,Engine Speed', {time: '1 s', speed: '2 mph', rpm: '3 null'}],
		['Distance <ft>,Ground Speed {m/s},Revs', {distance: '1 ft', speed: '2 m/s', rpm: '3 null'}],
		['t [s],v [m/s],n [rpm]', {time: '1 s', speed: '2 m/s', rpm: '3 rpm'}],
	])('%s', async (headers, expected) => {
		expect(await used(headers)).toEqual(expected);
	});

	test('all that a run may have', async () => {
		const log = await read(
			`${[
				'Session,Friday',
				'Time,Distance,GPS Speed,Engine RPM,Throttle Pos,Gear,Lap Number,Brake Pressure,Steering Angle,Oil Temp',
				's,m,mph,rpm,%,,,bar,deg,degF',
				'0.00,0,100,6000,100,4,1,0,-2,220',
				'0.10,4.5,101,6060,50,N,1,20,3,220',
				'0.20,9.0,102,6120,0,R,2,40,3,220',
			].join('\n')}\n`,
		);
		expect(numbers(log.run.throttle)).toEqual([1, 0.5, 0]);
		expect(numbers(log.run.gear)).toEqual([4, 0, Number.NaN]);
		expect(numbers(log.run.lap)).toEqual([1, 1, 2]);
		expect(numbers(log.run.brake)).toEqual([0, 0.5, 1]);
		expect(numbers(log.run.steering).map(value => (value * 180) / Math.PI)).toEqual(
			[-2, 3, 3].map(value => expect.closeTo(value, 5)),
		);
		expect(numbers(log.run.distanceM)).toEqual([0, 4.5, 9]);
		expect(texts(log)).toEqual([
			'1 line around the header is no part of the table.',
			'1 cell of gear is no number with a known unit and was left out, the first on line 6: "R".',
		]);
	});

	test('a surer name comes before a weaker one', async () => {
		expect(await used('Time [s],UTC Time [s],Speed [mph],Wheel Speed FL [mph],RPM,n [rpm]')).toEqual({
			time: '1 s',
			speed: '3 mph',
			rpm: '5 null',
		});
	});

	test('of several brakes none is taken, and it is said', async () => {
		const log = await read(
			table('Time [s],Speed [m/s],RPM,Brake Pressure Front,Brake Pressure Rear', 9, i => `${i / 10},50,5000,1,1`),
		);
		expect(log.run.brake).toBeNull();
		expect(texts(log)).toContain(
			'Several columns may be brake ("Brake Pressure Front", "Brake Pressure Rear") and none was taken. To take one: --column brake=HEADER.',
		);
	});

	test('of several throttles one must be chosen, or none', async () => {
		const log = table('Time [s],Speed [m/s],RPM,Throttle [%],Pedal [%]', 9, i => `${i / 10},50,5000,100,90`);
		const [problem] = await problemsOf(log);
		expect(problem).toMatchObject({
			kind: 'ambiguous',
			do: 'Say which: --column throttle="Throttle [%]", or --column throttle="Pedal [%]"; without it: --column throttle=none.',
			choice: {channel: 'throttle', values: ['Throttle [%]', 'Pedal [%]', 'none']},
		});
		for (const [value, first] of [
			['Throttle [%]', 1],
			['Pedal [%]', Math.fround(0.9)],
			['none', undefined],
		] as const)
			expect((await read(log, {columns: {throttle: value}})).run.throttle?.[0]).toBe(first);
	});
});

describe('a column asked for', () => {
	const log = table('Time [s],GPS Speed,Wheel Speed,RPM', 20, i => `${i / 10},${100 + i},${110 + i},5000`);

	test.each([
		['GPS Speed [mph]', 100 * 0.44704],
		['gps speed (km/h)', 100 / 3.6],
		['#3 [m/s]', 110],
		['wheelspeed [m/s]', 110],
	])('%s', async (speed, first) => {
		const {run, columns} = await read(log, {columns: {speed}});
		expect(run.speedMps[0]).toBeCloseTo(first, 4);
		expect(columns.speed).toMatchObject({by: 'asked', unitBy: 'asked'});
	});

	test('with a unit in the header needs none', async () => {
		const {columns} = await read(table('Time [s],A [mph],B [mph],RPM', 9, plainRow), {columns: {speed: 'B'}});
		expect(columns.speed).toEqual({column: 3, header: 'B [mph]', unit: 'mph', by: 'asked', unitBy: 'log'});
	});

	test('with another unit than the log states is read as asked', async () => {
		const {run} = await read(plainLog, {columns: {speed: 'Speed [km/h]'}});
		expect(run.speedMps[0]).toBeCloseTo(50 / 3.6, 5);
	});

	test('by any name makes a table of unknown ones', async () => {
		const foreign = table('Zeit;Geschwindigkeit;Drehzahl', 20, i => `${i / 10};${50 + i};5000`);
		const {run} = await read(foreign, {columns: {time: 'Zeit', speed: 'Geschwindigkeit [km/h]', rpm: 'Drehzahl'}});
		expect(run.samples).toBe(20);
	});
});

describe('what is remembered', () => {
	const log = table('Time,GPS Speed,Wheel Speed,RPM,Throttle', 20, i => `${i},${100 + i},${110 + i},5000,100`);

	test('reads the next log of the same columns without a question', async () => {
		const first = await read(log, {columns: {time: 'Time [ms]', speed: 'Wheel Speed [mph]', throttle: 'none'}});
		expect(first.remember).toEqual({
			time: {header: 'Time', unit: 'ms'},
			speed: {header: 'Wheel Speed', unit: 'mph'},
			throttle: {header: null},
		});
		const kept = JSON.parse(JSON.stringify(first.remember));
		const second = await read(log, {remembered: kept});
		expect(second.run).toEqual(first.run);
		expect(second.columns.speed).toMatchObject({by: 'remembered', unitBy: 'remembered'});
		expect(second.remember).toEqual(first.remember);
	});

	test('gives way to what is asked for, and to a unit that the log states', async () => {
		const remembered = {speed: {header: 'Speed', unit: 'mph'}};
		expect((await read(plainLog, {remembered})).columns.speed).toMatchObject({unit: 'm/s', unitBy: 'log'});
		const asked = await read(log, {
			remembered: {time: {header: 'Time', unit: 'ms'}, speed: {header: 'GPS Speed'}},
			columns: {speed: '#3 [mph]'},
		});
		expect(asked.columns.speed).toMatchObject({column: 3, by: 'asked'});
	});

	test('tells two columns apart that differ only in their unit, and no two that do not', async () => {
		const two = table('Time [s],Speed [mph],Speed [km/h],RPM,RPM', 9, i => `${i / 10},50,80,5000,5000`);
		const {remember} = await read(two, {columns: {speed: 'Speed [km/h]', rpm: '#5'}});
		expect(remember).toEqual({speed: {header: 'Speed [km/h]'}});
		expect((await read(two, {remembered: remember, columns: {rpm: '#4'}})).columns.speed?.column).toBe(3);
	});

	test('is nothing where the names told all', async () => {
		expect((await read(plainLog)).remember).toEqual({});
	});

	test('of other columns is not used, and it is said', async () => {
		const other = await read(plainLog, {remembered: {speed: {header: 'Wheel Speed'}, rpm: {header: 'RPM'}}});
		expect(other.columns.rpm?.by).toBe('name');
		// It may still be of use with the next log.
		expect(other.remember).toEqual({speed: {header: 'Wheel Speed'}, rpm: {header: 'RPM'}});
		expect(texts(other)).toContain(
			'The columns remembered from an earlier log were not used: "Wheel Speed" is not in this one, or more than once.',
		);
	});
});

describe('units that the log does not state', () => {
	const timed = (step: number) => read(table('Time,Speed [m/s],RPM', 30, i => `${i * step},50,5000`));

	test.each([
		[0.01, 's', 0.01],
		[0.5, 's', 0.5],
		[10, 'ms', 0.01],
		[100, 'ms', 0.1],
		[10_000, 'µs', 0.01],
	])('a time in steps of %d is in %s', async (step, unit, stepS) => {
		const log = await timed(step);
		expect(log.run.timeS[1]).toBeCloseTo(stepS, 12);
		expect(texts(log)).toContain(
			`The log does not say the unit of time ("Time"); by its numbers it is ${unit}. If not: --column time="HEADER [unit]".`,
		);
	});

	test.each([
		['clock', '12:59:58.50'],
		['minutes', '1:58.5'],
		['date', '2026-05-31T12:59:58.5Z'],
		['colon', '0:01:58:500'],
	])('a time as %s', async (_, first) => {
		const {run} = await read(
			table('Time,Speed [m/s],RPM', 3, i => `${i === 0 ? first : first.replace('58', '59')},50,5000`),
		);
		expect(run.timeS[1]).toBeCloseTo(1, 6);
	});

	test('a throttle by its range', async () => {
		const throttles = async (header: string, full: number) =>
			(await read(table(`Time [s],Speed [m/s],RPM,${header}`, 3, i => `${i / 10},50,5000,${(i * full) / 2}`))).run
				.throttle;
		expect(numbers(await throttles('Throttle', 1))).toEqual([0, 0.5, 1]);
		expect(numbers(await throttles('Throttle', 100))).toEqual([0, 0.5, 1]);
		expect(numbers(await throttles('Throttle [%]', 1))).toEqual([0, 0.5, 1]);
		expect(await throttles('Throttle', 1023)).toBeNull();
		expect(await throttles('Throttle', 5)).toBeNull();
		expect(await throttles('Throttle [V]', 5)).toBeNull();
	});

	test('a distance beside a time is worked out from the speed', async () => {
		const log = await read(table('Time [s],Distance,Speed [m/s],RPM', 3, i => `${i / 10},${i},50,5000`));
		expect(numbers(log.run.distanceM)).toEqual([0, 5, 10]);
		expect(texts(log)[0]).toBe(
			'Distance ("Distance") was not used: its unit is not known. To say it: --column distance="HEADER [unit]".',
		);
	});

	test('a distance alone needs one', async () => {
		const [problem] = await problemsOf(table('Distance,Speed [m/s],RPM', 3, i => `${i},50,5000`));
		expect(problem).toMatchObject({
			kind: 'unit',
			choice: {channel: 'distance', values: expect.arrayContaining(['Distance [m]'])},
		});
	});
});

test.each([
	['rpm', 6000],
	['1/min', 6000],
	['rev/min', 6000],
	['krpm', 6],
	['Hz', 100],
	['rad/s', 628.3185307179587],
])('an engine speed in %s', async (unit, value) => {
	const {run} = await read(table(`Time [s],Speed [m/s],Engine Speed [${unit}]`, 3, i => `${i / 10},50,${value}`));
	expect(run.rpm[0]).toBeCloseTo(6000, 2);
});
