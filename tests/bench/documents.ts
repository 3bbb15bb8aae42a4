/** A car and a track as the reader gives them, from documents of a size drawn from a seed. */
import {readCar, readTrack} from '../../source/documents/read.ts';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {seeded} from './harness.ts';

export type Size = {readonly pairs: number; readonly straights: number; readonly situations: number};
export type Documents = {readonly car: Car; readonly track: Track};

/** As many pairs, two gearbox sets, straights on three grades, every other one under braking, and situations that all change the car. */
export async function readDocuments(size: Size, seed: number): Promise<Documents> {
	const car = await readCar(JSON.stringify(carDocument(spread(everyPair(), size.pairs))));
	const track = await readTrack(JSON.stringify(trackDocument(size, seed)));
	if (!car.ok) throw new Error(JSON.stringify(car.problems));
	if (!track.ok) throw new Error(JSON.stringify(track.problems));
	return {car: car.value, track: track.value};
}

export const carDocument = (pairs: readonly Teeth[]) => ({
	kind: 'car',
	version: 1,
	name: 'Benchmark car',
	mass: '1640 kg',
	rearShare: 0.5,
	dragArea: '0.95 m^2',
	downforceArea: '1.6 m^2',
	rearDownforceShare: 0.55,
	rolling: 0.018,
	grip: 1.25,
	wheelInertia: '4 kg m^2',
	shiftTime: '0.08 s',
	engines: [{name: 'Open', for: ['road'], rpmLimit: 9200, inertia: '0.14 kg m^2', limiter: 9200, curve}],
	gearboxes: [
		{name: 'A', ratios: [2.9, 2.04, 1.58, 1.24, 1]},
		{name: 'B', ratios: [2.6, 1.9, 1.47, 1.19, 1]},
	],
	finalDrive: 3.25,
	efficiency: 0.92,
	tires: {left: '2.19 m', right: '2.21 m', growth: '0.8 %', slip: '1.5 %'},
	rack: {toothSums: housingSums, pairs},
	installed: {pair: `${pairs[0]!.driving}/${pairs[0]!.driven}`, gearbox: 'A'},
});

const curve = Object.entries({4000: 540, 5000: 610, 6000: 650, 7000: 660, 8000: 620, 9000: 540, 9500: 470}).map(
	([rpm, torqueNm]) => ({rpm: Number(rpm), torque: `${torqueNm} N m`}),
);

type Teeth = {readonly driving: number; readonly driven: number};

const [longestRatio, shortestRatio] = [1.02, 1.35];

/** The tooth sums of the pairs. The housing takes most of them, so that some rows fail. */
const sums = Array.from({length: 41}, (_, i) => 60 + i);
const housingSums = sums.filter(sum => sum % 8 !== 0);

/** From the longest to the shortest. */
export function everyPair(): Teeth[] {
	const ratio = ({driving, driven}: Teeth) => driven / driving;
	return sums
		.flatMap(sum => Array.from({length: sum - 1}, (_, i) => ({driving: i + 1, driven: sum - 1 - i})))
		.filter(pair => ratio(pair) >= longestRatio && ratio(pair) <= shortestRatio)
		.sort((one, other) => ratio(one) - ratio(other));
}

/** So many of them, evenly from the first to the last. */
export function spread<T>(all: readonly T[], count: number): T[] {
	if (count > all.length) throw new Error(`only ${all.length} of ${count}`);
	return Array.from({length: count}, (_, i) => all[Math.round((i * (all.length - 1)) / Math.max(1, count - 1))]!);
}

const grades = ['-2 %', '0 %', '3 %'];

function trackDocument({straights, situations}: Size, seed: number) {
	const random = seeded(seed);
	const between = (low: number, high: number) => low + (high - low) * random();
	return {
		kind: 'track',
		version: 1,
		name: 'Benchmark course',
		type: 'road',
		air: {temperature: '24 degC', pressure: '985 hPa', humidity: '45 %'},
		pitRoad: {limit: '45 mph', tolerance: '5 mph'},
		straights: Array.from({length: straights}, (_, i) => {
			const exitMps = between(17, 38);
			const braking = i % 2 === 0 ? {entry: `${between(28, 36)} m/s`, braking: '9 m/s^2'} : {};
			return {
				name: `Straight ${i + 1}`,
				exit: `${exitMps} m/s`,
				minimum: `${0.95 * exitMps} m/s`,
				length: `${between(150, 700)} m`,
				grade: grades[i % grades.length]!,
				...braking,
			};
		}),
		situations: Array.from({length: situations - 1}, (_, i) => ({
			name: `Situation ${i + 2}`,
			drag: `${signed(between(-12, 5))} %`,
			grip: `${signed(between(-8, 5))} %`,
			rollout: `${signed(between(-1, 1))} cm`,
			exit: `${signed(between(-0.5, 0.5))} m/s`,
			air: {temperature: `${between(12, 34)} degC`},
		})),
	};
}

const signed = (value: number) => (value < 0 ? `${value}` : `+${value}`);
