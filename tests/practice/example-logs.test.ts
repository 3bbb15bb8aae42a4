import {describe, expect, test} from 'vitest';
import {findInLog} from '../../source/practice/find/find-in-log.ts';
import {exampleLog, exampleLogs} from './example-logs.ts';
import {logAsCsv} from './log-as-csv.ts';
import {named, samplePlan} from './sample.ts';

const directory = new URL('../../tracks/logs/', import.meta.url).pathname;

describe.each(exampleLogs)('the example log of $track', example => {
	test('is what the generator gives (npm run logs writes it), and small', async () => {
		const text = logAsCsv((await exampleLog(example)).run);
		expect(text.length).toBeLessThan(150_000);
		await expect(text).toMatchFileSnapshot(`${directory}${example.track}.csv`);
	});

	test('shows the circumference that the car really had', async () => {
		const {run, vehicle} = await exampleLog(example);
		const {circumference, mounted} = findInLog(run, await samplePlan(example.track), named(example.mounted));
		const {atMps, circumferenceM} = circumference!;
		const truth = vehicle.rolloutM * (1 + vehicle.growth * (atMps / 44.704) ** 2);
		expect(mounted.verdict).toBe('asInstalled');
		expect(Math.abs(circumferenceM.value - truth)).toBeLessThan(2.5 * circumferenceM.se);
		expect(Math.abs(circumferenceM.value / truth - 1)).toBeLessThan(0.001);
	});
});
