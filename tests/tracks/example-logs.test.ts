import {readFileSync, statSync} from 'node:fs';
import {fileURLToPath} from 'node:url';
import {describe, expect, test} from 'vitest';
import {circumferenceM} from '../../source/drivetrain/tire.ts';
import {findInLog} from '../../source/practice/find/find-in-log.ts';
import {read, texts} from '../logs/log.ts';
import {samplePlan} from '../practice/sample.ts';
import {hesperRidgeLog, quillmereLog} from './example-logs.ts';

const folder = fileURLToPath(new URL('../../tracks/logs/', import.meta.url));
const file = (name: string) => `${folder}${name}.csv`;

describe.each([
	[
		'quillmere',
		quillmereLog,
		['4 lines around the header are no part of the table.', 'The distance was worked out from time and speed.'],
	],
	['hesper-ridge', hesperRidgeLog, ['The distance was worked out from time and speed.']],
] as const)('the example log of %s', (name, make, expected) => {
	test('is what the generator gives; else: npm run logs', async () => {
		await expect((await make()).csv).toMatchFileSnapshot(file(name));
	});

	test('is small', () => {
		expect(statSync(file(name)).size).toBeLessThan(150_000);
	});

	test('is read without a question, and only what one should know is said', async () => {
		expect(texts(await read(readFileSync(file(name))))).toEqual(expected);
	});

	test('holds the car that drove it', async () => {
		const {vehicle} = await make();
		const {run} = await read(readFileSync(file(name)));
		const found = findInLog(run, await samplePlan(name), {pair: {driving: 33, driven: 35}, gearbox: 'A'});
		expect(found.mounted.verdict).toBe('asInstalled');
		const {atMps, circumferenceM: learned} = found.circumference!;
		const trueM = circumferenceM(vehicle.rolloutM, vehicle.growth, atMps);
		expect(Math.abs(learned.value / trueM - 1)).toBeLessThan(0.001);
	});
});
