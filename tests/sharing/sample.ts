/** Documents of invented numbers, as people write them, and the plan made from them. */
import {readCar, readTrack} from '../../source/documents/read.ts';
import {rpmTable} from '../../source/planning/rpm-table.ts';
import {runPair} from '../../source/planning/run-pair.ts';
import {makePlan} from '../../source/sharing/make-plan.ts';

export const trackDocument = {
	kind: 'track',
	version: 1,
	name: 'Pine Hollow',
	type: 'short',
	lap: '0.6 mi',
	air: {temperature: '75 °F', pressure: '28.9 inHg', humidity: '40 %'},
	wind: {speed: '8 mph', from: '270 deg'},
	pitRoad: {limit: '40 mph', tolerance: '5 mph', gear: 2},
	restart: {speed: '50 mph', distance: '700 ft'},
	straights: [
		{
			name: 'Front',
			exit: '88 mph',
			minimum: '80 mph',
			length: '650 ft',
			entry: '92 mph',
			braking: '0.9 g',
			heading: '90 deg',
			measured: {end: '116 mph', rpm: 8420, pair: '33/38', gearbox: 'A', gear: 4},
		},
		{
			name: "Joe's back stretch",
			exit: '90 mph',
			minimum: '82 mph',
			length: '700 ft',
			entry: '92 mph',
			braking: '0.9 g',
		},
		{name: 'Short chute', exit: '95 mph', length: '300 ft', grade: '-0.5 %'},
		{name: 'Dogleg', exit: '97 mph', length: '420 ft', load: 1.2, extraDrag: '300 N'},
	],
	situations: [
		{name: 'In the tow', drag: '-15 %', exit: '+0.5 mph'},
		{name: 'Long run', exit: '-3 mph', rollout: '-0.3 in'},
		{name: 'Cool night', air: {temperature: '58 degF'}},
	],
	rules: {rpmLimit: 9400},
	car: {tires: {left: '86.1 in', right: '86.3 in'}, grip: 1.2},
};

const torques = [405, 418, 430, 441, 449, 455, 458, 459, 457, 452, 446, 438, 428, 417, 404, 388, 371, 352, 330, 305];

export const carDocument = {
	kind: 'car',
	version: 1,
	name: 'Test car 7',
	mass: '3650 lb',
	rearShare: 0.5,
	dragArea: '0.95 m^2',
	downforceArea: '1.6 m^2',
	rearDownforceShare: 0.55,
	rolling: 0.018,
	grip: 1.25,
	wheelInertia: '4 kg m^2',
	shiftTime: '0.08 s',
	engines: [
		{
			name: 'Open',
			for: ['short', 'intermediate', 'road'],
			rpmLimit: 9200,
			limiter: 9300,
			inertia: '0.14 kg m^2',
			correctedTo: 'J1349',
			curve: torques.map((torque, i) => ({rpm: 4000 + 300 * i, torque: `${torque} lbf ft`})),
		},
		{
			name: 'Restricted',
			for: ['superspeedway'],
			rpmLimit: 9000,
			inertia: '0.14 kg m^2',
			curve: torques.map((torque, i) => ({rpm: 4000 + 300 * i, torque: `${torque - 60} lbf ft`})),
		},
	],
	gearboxes: [
		{name: 'A', ratios: [2.9, 2.04, 1.58, 1.24, 1]},
		{name: 'B', ratios: [2.7, 1.95, 1.5, 1.2, 1]},
	],
	finalDrive: 3.25,
	efficiency: 0.92,
	tires: {left: '86.4 in', right: '86.6 in', growth: '0.8 %', slip: '1.5 %'},
	rack: {
		toothSums: [71, 72],
		pairs: [
			{driving: 33, driven: 38, sets: 2, miles: 310, maxMiles: 1200},
			{driving: 32, driven: 39},
			{driving: 34, driven: 37},
			{driving: 34, driven: 38},
			{driving: 36, driven: 36},
		],
	},
	installed: {pair: '33/38', gearbox: 'A'},
	rules: {short: {pairs: ['33/38', '32/39', '34/37']}, superspeedway: {rpmLimit: 8600}},
};

/** What the sample documents are read and run to, with one pair and set. */
export async function ground(
	track: object = trackDocument,
	car: object = carDocument,
	pair = {driving: 34, driven: 37},
) {
	const readings = [await readTrack(JSON.stringify(track)), await readCar(JSON.stringify(car))] as const;
	const [trackReading, carReading] = readings;
	if (!trackReading.ok || !carReading.ok) throw new Error(JSON.stringify(readings));
	const choice = {pair, gearbox: 'A'};
	const run = runPair(carReading.value, trackReading.value, choice);
	const table = rpmTable(carReading.value, trackReading.value, choice);
	if (!run.ok || !table.ok) throw new Error(JSON.stringify([run, table]));
	return {track: trackReading.value, car: carReading.value, table: table.value, ...run.value};
}

export const date = '2025-06-14T18:05:00-04:00';

/** The plan of the sample, or of the sample with fewer or other parts. */
export async function samplePlan(track: Record<string, unknown> = trackDocument, notes?: string) {
	const {row, setting, table} = await ground(track);
	return makePlan({track, car: carDocument, row, setting, table, date, notes});
}
