import fc from 'fast-check';
import {expect, test} from 'vitest';
import {runs} from '../runs.ts';
import {read, reading, table, texts} from './log.ts';

const timed = (times: readonly (number | string)[]) =>
	read(table('Time [s],Speed [m/s],RPM', times.length, i => `${times[i]},50,${5000 + i}`));
const close = (values: readonly number[]) => values.map(value => expect.closeTo(value, 9));

test('a run starts at 0', async () => {
	const {run} = await timed([100.5, 100.6, 100.7]);
	expect(Array.from(run.timeS)).toEqual(close([0, 0.1, 0.2]));
	expect(Array.from(run.distanceM)).toEqual(close([0, 5, 10]));
});

test('a row that leaps back or ahead is left out', async () => {
	for (const wrong of [0.15, 0, 99]) {
		const log = await timed([0, 0.1, 0.2, wrong, 0.3, 0.4]);
		expect(Array.from(log.run.timeS)).toEqual(close([0, 0.1, 0.2, 0.3, 0.4]));
		expect(Array.from(log.run.rpm)).toEqual([5000, 5001, 5002, 5004, 5005]);
		expect(texts(log)).toContain('1 single row with a time out of order was left out.');
	}
});

test('a clock that begins anew begins another stint, one step after the last sample', async () => {
	const log = await timed([5, 5.1, 5.2, 0, 0.1, 0.2, 0.3, 0, 0.1]);
	expect(Array.from(log.run.timeS)).toEqual(close([0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8]));
	expect(texts(log)).toContain(
		'The time begins anew 2 times (at 0.30 s, 0.70 s); what follows was joined to what was before, as another stint.',
	);
	expect(log.remarks).toContainEqual(
		expect.objectContaining({kind: 'restart', channel: 'time', atS: close([0.3, 0.7])}),
	);
});

test('a clock that passes midnight goes on', async () => {
	const {run} = await timed(['23:59:59.8', '23:59:59.9', '00:00:00.0', '00:00:00.1']);
	expect(Array.from(run.timeS)).toEqual([0, 0.1, 0.2, 0.3].map(value => expect.closeTo(value, 6)));
});

const placed = (distances: readonly (number | string)[]) =>
	read(table('Time [s],Distance [m],Speed [m/s],RPM', distances.length, i => `${i / 10},${distances[i]},50,5000`));

test('a distance counted anew each lap goes on', async () => {
	const log = await placed([990, 995, 1000, 2, 7, 12]);
	expect(Array.from(log.run.distanceM)).toEqual(close([0, 5, 10, 15, 20, 25]));
	expect(texts(log)).toContain(
		'The distance begins anew 1 time (at 0.30 s); what follows was joined to what was before.',
	);
});

test('where a distance is not known or leaps, the speed carries it on', async () => {
	const log = await placed(['', 5, 900, 15, '', 25]);
	expect(Array.from(log.run.distanceM)).toEqual(close([0, 5, 10, 15, 20, 25]));
});

test('time is worked out from distance where the log has none', async () => {
	const log = await read(table('Distance [m],Speed [m/s],RPM', 5, i => `${10 * i},${20 + 10 * i},5000`));
	// Each step of 10 m at the mean of the speeds at its ends: 25, 35, 45, 55 m/s.
	const steps = [0, 10 / 25, 10 / 35, 10 / 45, 10 / 55];
	expect(Array.from(log.run.timeS)).toEqual(close(steps.map((_, i) => steps.slice(0, i + 1).reduce((a, b) => a + b))));
	expect(texts(log)).toContain(
		'The log has no time; it was worked out from distance and speed, and a standstill is not seen.',
	);
});

test('a speed logged less often than the time is straight in between, for the distance alone', async () => {
	const log = await read(
		table('Time [s],Speed [m/s],RPM', 9, i => `${i / 10},${i % 4 === 0 ? 40 + i : ''},${5000 + i}`),
	);
	// From 40 to 48 m/s in 0.8 s.
	expect(log.run.distanceM[8]).toBeCloseTo(44 * 0.8, 9);
	expect(log.run.speedMps[1]).toBeNaN();
	expect(texts(log)).toContain('The column of speed is empty in 67 % of the rows.');
});

test('time and distance never fall, whatever the log says', async () => {
	const value = fc.oneof(fc.integer({min: -50, max: 50}), fc.constantFrom('', 'x', '1e300', '-1e300'));
	await fc.assert(
		fc.asyncProperty(fc.array(fc.tuple(value, value, value), {minLength: 1, maxLength: 40}), async rows => {
			const first = '0,0,10,5000';
			const answer = await reading(
				`${[`Time [s],Distance [m],Speed [m/s],RPM`, first, ...rows.map((row, i) => `${row.join(',')},${5000 + i}`)].join('\n')}\n`,
			);
			if (!answer.ok) {
				expect(answer.problems.map(({kind}) => kind)).toEqual(['backward']);
				return;
			}
			const {run} = answer;
			for (let i = 1; i < run.samples; i++) {
				expect(run.timeS[i]! >= run.timeS[i - 1]!).toBe(true);
				expect(run.distanceM[i]! >= run.distanceM[i - 1]!).toBe(true);
			}
			for (const column of [run.timeS, run.distanceM, run.speedMps, run.rpm]) expect(column.length).toBe(run.samples);
		}),
		{numRuns: runs(300, 20_000)},
	);
});
