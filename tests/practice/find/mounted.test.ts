import {describe, expect, test} from 'vitest';
import {fittingName} from '../../../source/practice/find/mounted-words.ts';
import {found, hesperRidge, quillmere, type Sample, tarrowdale} from '../sample.ts';

const few = {driving: {laps: 5}};

describe('what is mounted', () => {
	test.each([
		['what is installed, on a short track', {...quillmere}],
		['what is installed, where growth makes much', {...tarrowdale}],
		['what is installed, on a road course', {...hesperRidge}],
		['what is installed, with a rollout 1.5 % off', {...hesperRidge, truth: {rolloutM: 1.985 * 1.123, growth: 0.009}}],
	] as [string, Sample][])('is %s', async (_, sample) => {
		const {findings} = await found({...few, ...sample});
		expect(findings.mounted.verdict).toBe('asInstalled');
		expect(fittingName(findings.mounted.best!)).toBe(sample.mounted.replace(' ', ' set '));
		expect(findings.mounted.certain).toBe(true);
	});

	test('is the next pair on the rack when that is what the log fits', async () => {
		const {findings} = await found({...hesperRidge, ...few, mounted: '34/35 A', installed: '33/35 A', truth: {}});
		expect(findings.mounted.verdict).toBe('otherFits');
		expect(fittingName(findings.mounted.best!)).toBe('34/35 set A');
		expect(findings.mounted.installed!.circumferenceFactor).toBeGreaterThan(1.025);
		expect(findings.mounted.why).toMatch(/^The log fits 34\/35 set A .* not 33\/35 set A, which is installed/);
	});

	test('is the installed pair with its gears on the wrong shafts', async () => {
		const {findings} = await found({...hesperRidge, ...few, mounted: '38/30 A', installed: '30/38 A', truth: {}});
		expect(findings.mounted.verdict).toBe('flippedFits');
		expect(fittingName(findings.mounted.best!)).toBe('38/30 set A');
		expect(findings.mounted.why).toContain('30/38 with its gears on the wrong shafts');
	});

	test('is another set', async () => {
		const {findings} = await found({...hesperRidge, ...few, mounted: '33/35 B', installed: '33/35 A', truth: {}});
		expect(findings.mounted.verdict).toBe('otherFits');
		expect(fittingName(findings.mounted.best!)).toBe('33/35 set B');
	});

	test('is not told from others by one gear alone: they are named, and the fits are not certain', async () => {
		const {findings} = await found({...quillmere, ...few, mounted: '36/33 A', installed: '33/35 A'});
		const {verdict, alsoFit, best, certain, why} = findings.mounted;
		expect(verdict).toBe('otherFits');
		expect(certain).toBe(false);
		expect([best!, ...alsoFit].map(fittingName)).toContain('36/33 set A');
		expect(why).toContain('Only one gear was used');
	});

	test('is what is installed even if another is nearer, while both are plausible', async () => {
		// A rollout 1.8 % larger than documented: 34/35, a tooth away, would need only 1.2 % less.
		const {findings, plan} = await found({
			...hesperRidge,
			...few,
			truth: {rolloutM: 2.2274 * 1.018, growth: 0.009},
		});
		expect(plan.base.vehicle.rolloutM).toBeCloseTo(2.2275, 3);
		expect(findings.mounted.verdict).toBe('asInstalled');
		expect(findings.mounted.alsoFit.map(fittingName)).toContain('34/35 set A');
	});
});

describe('a log of the wrong car', () => {
	const other = {driving: {laps: 5}, truth: {rolloutM: 2.62, growth: 0.009}};

	test('fits nothing: the nearest and how far off it is are said, and nothing is fitted', async () => {
		// Ratios between those of every set: gears 2 to 5 squeezed together by a quarter.
		const {findings} = await found({
			...hesperRidge,
			...other,
			change: run => ({...run, rpm: run.rpm.map((rpm, i) => rpm * (run.speedMps[i]! / 40) ** 0.25)}),
		});
		expect(findings.mounted.verdict).toBe('nothingFits');
		expect(findings.mounted.nearest).toBeDefined();
		expect(findings.mounted.why).toMatch(/No pair and set on the rack fits/);
		expect(findings.circumference).toBeUndefined();
		expect(findings.shifts).toEqual([]);
		expect(findings.straights[0]!.endMps!.count).toBe(findings.straights[0]!.passes);
		expect(findings.notes.map(({code}) => code)).toContain('wrongCar');
	});

	test('or of the wrong unit is not certain of anything, and the unit is named', async () => {
		const {findings} = await found({
			...hesperRidge,
			driving: {laps: 5},
			change: run => ({...run, speedMps: run.speedMps.map(mps => mps * 1.609344)}),
		});
		expect(findings.mounted.certain).toBe(false);
		expect(findings.mounted.why).toContain('km/h read as mph');
	});
});

test('of the others that fit too the likeliest three are named, and how many more there are', async () => {
	const {findings} = await found({...tarrowdale, ...few});
	const {alsoFit, why} = findings.mounted;
	expect(alsoFit.length).toBeGreaterThan(3);
	const [first, , third, fourth] = alsoFit.map(fittingName);
	expect(why).toContain(`cannot tell it from ${first} (circumference`);
	expect(why).toContain(`${third} (`);
	expect(why).not.toContain(`${fourth} (`);
	expect(why).toContain(`and ${alsoFit.length - 3} more; what is installed is kept.`);
});
