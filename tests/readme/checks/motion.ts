/** Runs whose answer has a closed form: 1500 kg, ½·ρ·C_dA = 0.539 kg/m where there is drag. */
import {mphMps} from '../../../source/drivetrain/constants.ts';
import type {Motion} from '../../../source/drivetrain/quadrature.ts';
import {type Travel, travel} from '../../../source/drivetrain/travel.ts';
import {type Case, casesOf, type OutsideCheck} from '../outside-check.ts';

const massKg = 1500;
const dragKgPerM = 0.539;
const powerW = 300_000;
const quarterMileM = 402.336;
const horsepowerW = 745.6998715822702;
const poundKg = 0.45359237;

const moved = (forceN: (speedMps: number) => number, kinks: readonly number[] = []): Motion => ({
	acceleration: speedMps => forceN(speedMps) / massKg,
	breaks: [0, ...kinks, 200],
});
const constantThrust = moved(speed => 4000 - dragKgPerM * speed ** 2);
const constantPower = moved(speed => powerW / speed - dragKgPerM * speed ** 2);
const coasting = moved(speed => -250 - dragKgPerM * speed ** 2);
/** 6000 N of grip, then 300 kW from 50 m/s on. */
const gripThenPower = moved(speed => Math.min(6000, powerW / speed), [50]);
const powerAgainstAll = moved(speed => powerW / speed - dragKgPerM * speed ** 2 - 250);

/** At rest the acceleration of constant power is infinite; from here on what came before is far below the printed digits. */
const nearlyAtRestMps = 1e-3;

const over = (motion: Motion, fromMps: number, distanceM: number): Travel =>
	travel(motion, fromMps, {distanceM, toMps: Number.POSITIVE_INFINITY, braking: undefined});

type Row = readonly [fromMps: number, distanceM: number, speedMps: string, timeS: string];

/** Speed and time at the end of each distance. */
const runs = (motion: Motion, rows: readonly Row[]): Case[] =>
	rows.flatMap(([fromMps, distanceM, speedMps, timeS]) => {
		const end = over(motion, fromMps, distanceM);
		return [
			{outside: speedMps, ours: end.speedMps, unit: 'm/s'},
			{outside: timeS, ours: end.timeS, unit: 's'},
		];
	});

/** 3400 lb and 350 hp. */
const dragster = (): Travel => {
	const perMass = (350 * horsepowerW) / (3400 * poundKg);
	return over({acceleration: speed => perMass / speed, breaks: [0, 200]}, nearlyAtRestMps, quarterMileM);
};

export const motion: readonly OutsideCheck[] = [
	{
		what: 'Constant thrust against drag: speed and time, four runs',
		source: 'closed form (tanh, ln cosh)',
		mark: 'recomputed',
		cases: runs(constantThrust, [
			[0, quarterMileM, '43.167426304', '17.792441009'],
			[0, 1000, '61.677135774', '29.051884048'],
			[30, 200, '42.107721293', '5.525057528'],
			[30, 500, '53.558043258', '11.770078274'],
		]),
		tolerance: 1e-9,
	},
	{
		what: 'Constant power against drag: speed and time, five runs',
		source: 'closed form (logarithm, arctangent)',
		mark: 'recomputed',
		cases: runs(constantPower, [
			[nearlyAtRestMps, quarterMileM, '58.074574194', '9.972480872'],
			[nearlyAtRestMps, 1000, '71.608579186', '19.056575537'],
			[nearlyAtRestMps, 2000, '78.951988351', '32.217303120'],
			[40, 400, '61.844451332', '7.623180375'],
			[40, 800, '70.381731128', '13.637341572'],
		]),
		tolerance: 1e-9,
	},
	{
		what: 'Coasting from 60 m/s to rest: time and distance',
		source: 'closed form (arctangent, logarithm)',
		mark: 'recomputed',
		cases: [
			{outside: '158.445625468', ours: over(coasting, 60, 10_000).timeS, unit: 's'},
			{outside: '3020.00724027', ours: over(coasting, 60, 10_000).distanceM, unit: 'm'},
		],
		tolerance: 1e-9,
	},
	{
		what: 'Grip, then power: speed and time at the quarter mile',
		source: 'closed form (by pieces)',
		mark: 'recomputed',
		cases: runs(gripThenPower, [[0, quarterMileM, '56.347079109', '14.187483310']]),
		tolerance: 1e-9,
	},
	{
		what: 'Top speed of constant power against drag and 250 N',
		source: 'root of P = k·V³ + 250·V',
		mark: 'recomputed',
		unit: 'm/s',
		cases: casesOf([['80.378667577', 40]], from => over(powerAgainstAll, from, 100_000).speedMps),
		tolerance: 1e-9,
	},
	{
		what: 'Quarter mile without losses: time times speed',
		source: '1.5 × the distance (Fox, Am. J. Phys. 41, 1973)',
		mark: 'recomputed',
		unit: 'mph s',
		cases: [{outside: '1350', ours: (dragster().timeS * dragster().speedMps) / mphMps}],
		tolerance: 1e-9,
	},
	{
		what: 'The same for 3400 lb and 350 hp: time and speed',
		source: 'closed form, (9·m·X²/8·P)^⅓',
		mark: 'recomputed',
		cases: [
			{outside: '10.24741', ours: dragster().timeS, unit: 's'},
			{outside: '131.7406', ours: dragster().speedMps / mphMps, unit: 'mph'},
		],
		tolerance: 1e-6,
	},
];
