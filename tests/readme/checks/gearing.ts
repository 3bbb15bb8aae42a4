/** Ratios, engine speed and road speed, gears in mesh. */
import {inchM, mileM, mphMps} from '../../../source/drivetrain/constants.ts';
import {powerW} from '../../../source/drivetrain/engine.ts';
import {centerDistanceM, turnsUntilMeeting} from '../../../source/drivetrain/gear-mesh.ts';
import {handTurns, overallRatios} from '../../../source/drivetrain/gear-pair.ts';
import {monotoneCubic} from '../../../source/drivetrain/monotone-cubic.ts';
import {engineRpm, speedAtRpmMps} from '../../../source/drivetrain/tire.ts';
import {roadCars, turnsPerMile} from '../../road-cars.ts';
import {casesOf, type OutsideCheck} from '../outside-check.ts';

const poundForceN = 0.45359237 * 9.80665;
const evenPair = {driving: 36, driven: 36};

/** Gillespie, Fundamentals of Vehicle Dynamics (SAE, 1992), p. 32: gears, final drive 2.92, 801 rev/mile. */
const gillespieMph = (rpm: number, gear: number) =>
	speedAtRpmMps(rpm, overallRatios([gear], evenPair, 2.92)[0]!, mileM / 801, 0, 0) / mphMps;

/** What the engine gives at 4400 rpm, 201 lbf ft, less the losses, over the road speed: the thrust. */
const gillespiePounds = (gear: number, efficiency: number) => {
	const torqueNm = 201 * poundForceN * 0.3048;
	const powerAtWheelsW = powerW(monotoneCubic([800, 5200], [torqueNm, torqueNm]), 4400) * efficiency * 0.99;
	return powerAtWheelsW / (gillespieMph(4400, gear) * mphMps) / poundForceN;
};

/** Mannering's slippage i is V = ω·r·(1 − i); SAE J670's slip ratio is i/(1 − i). */
const slipRatio = (slippage: number) => slippage / (1 - slippage);

export const gearing: readonly OutsideCheck[] = [
	{
		what: 'Engine speed at 130 mph, overall 2.5, 12.6 in radius, 3 % slippage',
		source: 'Mannering & Washburn, problem 2.7',
		mark: 'published',
		unit: 'rpm',
		cases: casesOf([['4469.15', 130]], mph =>
			engineRpm(mph * mphMps, 2.5, 2 * Math.PI * 12.6 * inchM, 0, slipRatio(0.03)),
		),
		tolerance: 2e-6,
	},
	{
		what: 'Engine speed at 60 mph of 20 road cars, by ratio and tire',
		source: 'Consumer Reports, April 1990 (R, rpart::car90)',
		mark: 'published',
		unit: 'rpm',
		cases: roadCars.map(([size, overall, rpm]) => ({
			outside: String(rpm),
			ours: engineRpm(60 * mphMps, overall, mileM / turnsPerMile[size]!, 0, 0),
		})),
		tolerance: 3.5e-3,
	},
	{
		what: 'Road speed at 4400 rpm in first and fifth',
		source: 'Gillespie, Fundamentals of Vehicle Dynamics, p. 32',
		mark: 'from memory',
		unit: 'mph',
		cases: casesOf(
			[
				['26.4', 4.28],
				['113', 1],
			],
			gear => gillespieMph(4400, gear),
		),
		tolerance: 2e-3,
	},
	{
		what: 'The same in all five gears',
		source: 'the same data, by hand',
		mark: 'recomputed',
		unit: 'mph',
		cases: casesOf(
			[
				['26.372', 4.28],
				['40.456', 2.79],
				['61.679', 1.83],
				['82.995', 1.36],
				['112.873', 1],
			],
			gear => gillespieMph(4400, gear),
		),
		tolerance: 3e-5,
	},
	{
		what: 'Thrust there in first and fifth, 201 lbf ft',
		source: 'Gillespie, p. 32',
		mark: 'from memory',
		unit: 'lbf',
		cases: casesOf(
			[
				['2290', 4.28, 0.966],
				['537', 1, 0.97],
			],
			gillespiePounds,
		),
		tolerance: 1e-3,
	},
	{
		what: 'Last shaft of the compound train 20/50, 25/75, 26/65 at 975 rpm',
		source: 'Khurmi & Gupta, Theory of Machines, ex. 13.1',
		mark: 'published',
		unit: 'rpm',
		cases: casesOf([['52', 975]], rpm => rpm / overallRatios([50 / 20], {driving: 25, driven: 75}, 65 / 26)[0]!),
		tolerance: 1e-15,
	},
	{
		what: 'Pinion of a 12/60 differential, wheels at 210 and 190 rpm',
		source: 'Khurmi & Gupta, fig. 13.24',
		mark: 'published',
		unit: 'rpm',
		cases: casesOf([['1000', 210, 190]], (left, right) => handTurns(60 / 12, left, right)),
		tolerance: 1e-15,
	},
	{
		what: 'Turns until two teeth meet again, six pairs',
		source: 'z2/gcd (Euclid)',
		mark: 'recomputed',
		unit: 'turns',
		cases: casesOf(
			[
				['43', 17, 43],
				['67', 23, 67],
				['36', 25, 36],
				['25', 28, 100],
				['3', 24, 36],
				['3', 20, 60],
			],
			turnsUntilMeeting,
		),
		tolerance: 1e-15,
	},
	{
		what: 'Center distance, module 3, 12 and 24 teeth',
		source: 'KHK gear handbook, table 4.1 (ISO 21771)',
		mark: 'from memory',
		unit: 'mm',
		cases: casesOf([['54.000', 36]], sum => 1000 * centerDistanceM(0.003, sum)),
		tolerance: 1e-14,
	},
];
