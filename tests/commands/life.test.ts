import {readFileSync} from 'node:fs';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {fixture, makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
});
afterAll(() => program.remove());

const oval = JSON.parse(readFileSync(fixture('oval.json'), 'utf8'));
const car = JSON.parse(readFileSync(fixture('car.json'), 'utf8'));
const lapped = JSON.stringify({...oval, lap: '0.5 mi', laps: 300});

test('life gives the turns of both pairs in the shape for programs', async () => {
	const {status, out, err} = await program.run(['life', '-', '--json', '--above', '8000'], {input: lapped});
	expect({status, err}).toEqual({status: 0, err: ''});
	const told = JSON.parse(out);
	expect(told).toMatchObject({track: oval.name, car: car.name, laps: 300, aboveRpm: 8000, stepRpm: 250});
	expect(told.pairs).toHaveLength(2);
	for (const {dwell, lapS, turnsPerLap, turnsPerRace} of told.pairs) {
		expect(dwell.reduce((sum: number, each: {lapS: number}) => sum + each.lapS, 0)).toBeCloseTo(lapS, 9);
		expect(turnsPerRace).toBeCloseTo(300 * turnsPerLap, 6);
	}
});

test('life as text shows the turns, the time above an RPM, and a bar for each step', async () => {
	const {out} = await program.run(['life', '-', '--laps', '40', '--ascii'], {input: lapped});
	expect(out).toMatch(/engine life, \S+ \S+\* against \S+ \S+ - mean of \d\s+situations - 40\s+laps/);
	expect(out).toMatch(/^engine turns a race +[\d,]+ +[\d,]+ +[+-][\d,]+$/m);
	expect(out).toMatch(/^\d{4}-\d{4} +\d+\.\d\d +\d+\.\d {2}(\d+|\.)/m);
	expect(out).toMatch(/An estimate: the engine builder's limit, the rule book and officials decide\.\n$/);
	expect(out).toMatch(/^[\n\x20-\x7e]*$/);
});

test('fuel tells mileage, laps to a tank and stops, in either units', async () => {
	const words = ['fuel', '-', '--car', fixture('car.json')];
	const us = await program.run(words, {input: lapped});
	expect(us.out).toMatch(/^miles a gallon +\d+\.\d\d/m);
	expect(us.out).toMatch(/^gal a race +\d+\.\d/m);
	expect(us.out).toMatch(
		/Assumed: 0\.300 kg\/kWh \(0\.493 lb\/\(hp h\)\) at every load, fuel of 0\.745\s+kg\/L\s+\(6\.22 lb\/gal\)\./,
	);
	expect(us.out).toContain('The car has no "tank".');
	expect(us.out).not.toMatch(/laps a tank/);
	const metric = await program.run([...words, '--units', 'metric'], {input: lapped});
	expect(metric.out).toMatch(/^L a race +\d+\.\d/m);
});

test('the tank and the consumption may be in any unit', async () => {
	const told = async (fuelConsumption: string, fuelDensity: string, tank: string) => {
		const engines = car.engines.map((engine: object) => ({...engine, fuelConsumption}));
		const input = JSON.stringify({...car, engines, fuelDensity, tank});
		const reply = await program.run(['fuel', fixture('oval.json'), '--car', '-', '--json'], {input});
		expect(reply.err).toBe('');
		const {fuelConsumptionKgPerJ, fuelDensityKgM3, tankM3} = JSON.parse(reply.out);
		return [fuelConsumptionKgPerJ * 3.6e6, fuelDensityKgM3, tankM3 * 1000];
	};
	// Recomputed: 0.5 lb/(hp h) are 0.30414 kg/kWh, 6.2173 lb/gal 744.997 kg/m³, 20 gal 75.708 L.
	const [us, metric] = [
		await told('0.5 lb/(hp h)', '6.2173 lb/gal', '20 gal'),
		await told('304.14 g/kWh', '0.745 kg/L', '75.708 L'),
	];
	us.forEach((value, i) => {
		expect(Math.abs(value / metric[i]! - 1)).toBeLessThan(1e-5);
	});
});

test('without the length of a lap no fuel is told, and why', async () => {
	const {lap: _, ...without} = oval;
	const {out} = await program.run(['fuel', '-'], {input: JSON.stringify(without)});
	expect(out).toContain('The track has no "lap": its corners are left out.');
	expect(out).not.toMatch(/miles a gallon/);
});

test.each([
	[['life', '-', '--laps', '0'], /--laps is a whole number from 1 to 10000, found 0/],
	[['life', '-', '--above', 'high'], /--above is a whole number from 100 to 99999, found high/],
	[['fuel', '-', '--against', '33'], /--against is driving\/driven, such as 33\/38, found 33/],
	[['fuel', '-', '--above', '8000'], /takes no --above/],
	[['fuel', '-', '--against', '1/2'], /against: found "1\/2"; allowed a pair on the rack/],
])('%j is bad input', async (words, wanted) => {
	const {status, out, err} = await program.run(words, {input: lapped});
	expect({status, out}).toEqual({status: 2, out: ''});
	expect(err).toMatch(wanted);
});
