/** A car and a track of invented numbers for the tests of planning; each test changes what it is about. */
import type {Car, Engine, Pair, RackPair} from '../../source/drivetrain/car.ts';
import type {Change, Situation, Straight, Track} from '../../source/drivetrain/track.ts';

export const mph = 0.44704;
export const foot = 0.3048;
export const inch = 0.0254;

export const add = (value: number): Change => ({kind: 'add', value});
export const scale = (factor: number): Change => ({kind: 'scale', factor});
export const set = (value: number): Change => ({kind: 'set', value});

export const pair = (driving: number, driven: number): Pair => ({driving, driven});
export const rackPair = (driving: number, driven: number, change: Partial<RackPair> = {}): RackPair => ({
	driving,
	driven,
	sets: 1,
	milesM: 0,
	maxMilesM: undefined,
	...change,
});

export const engine = (change: Partial<Engine> = {}): Engine => ({
	name: 'Open',
	for: ['short', 'intermediate', 'road'],
	rpmLimit: 9200,
	inertiaKgM2: 0.14,
	correctedTo: 'J1349',
	limiter: undefined,
	pullRpm: 4000,
	bandShare: 0.9,
	fuelConsumptionKgPerJ: 0.3 / 3.6e6,
	curve: [
		{rpm: 4000, torqueNm: 550},
		{rpm: 5000, torqueNm: 585},
		{rpm: 6000, torqueNm: 610},
		{rpm: 7000, torqueNm: 612},
		{rpm: 8000, torqueNm: 590},
		{rpm: 9000, torqueNm: 545},
		{rpm: 9600, torqueNm: 500},
	],
	...change,
});

export const car = (change: Partial<Car> = {}): Car => ({
	name: 'Test car',
	massKg: 1650,
	rearShare: 0.5,
	dragAreaM2: 0.95,
	downforceAreaM2: 1.6,
	rearDownforceShare: 0.5,
	rolling: 0.018,
	grip: 1.25,
	wheelInertiaKgM2: 4,
	undrivenInertiaKgM2: 2,
	shiftTimeS: 0.1,
	reactionTimeS: 0.25,
	wheelbaseM: undefined,
	cgHeightM: undefined,
	engines: [engine()],
	gearInventory: undefined,
	gearboxes: [
		{name: 'A', ratios: [2.9, 2.04, 1.58, 1.24, 1]},
		{name: 'B', ratios: [2.7, 1.95, 1.5, 1.2, 1]},
	],
	finalDrive: 3.25,
	efficiencies: 0.92,
	fuelDensityKgM3: 745,
	tankM3: undefined,
	tires: {
		leftM: 86.4 * inch,
		rightM: 86.6 * inch,
		growth: 0.008,
		slip: 0.015,
		steadySlip: 0,
		diameterM: undefined,
	},
	rack: {
		toothSums: undefined,
		eitherShaft: false,
		pairs: [rackPair(33, 38), rackPair(32, 39), rackPair(34, 37), rackPair(31, 40), rackPair(35, 36)],
	},
	margins: {
		limitRpm: 100,
		shiftRpm: 100,
		downshiftRpm: 200,
		cleanRpm: 2500,
		settleStartS: 0.6,
		settleEndS: 0.5,
		sameTimeS: 0.02,
		levelS: 0.02,
	},
	installed: {pair: pair(33, 38), gearbox: 'A'},
	rules: {},
	...change,
});

export const straight = (name: string, change: Partial<Straight> = {}): Straight => ({
	name,
	exitMps: 88 * mph,
	minimumMps: undefined,
	lengthM: 650 * foot,
	endMps: undefined,
	entryMps: undefined,
	brakingMps2: undefined,
	grade: 0,
	headingRad: undefined,
	load: 1,
	extraDragN: 0,
	gears: undefined,
	measured: undefined,
	...change,
});

export const situation = (name: string, change: Partial<Situation> = {}): Situation => ({
	name,
	share: 1,
	exit: undefined,
	end: undefined,
	entry: undefined,
	minimum: undefined,
	drag: undefined,
	grip: undefined,
	power: undefined,
	mass: undefined,
	rollout: undefined,
	air: undefined,
	wind: undefined,
	headwindMps: undefined,
	...change,
});

export const track = (change: Partial<Track> = {}): Track => ({
	name: 'Test oval',
	type: 'short',
	lapM: undefined,
	laps: undefined,
	air: undefined,
	wind: undefined,
	pitRoad: {limitMps: 40 * mph, toleranceMps: 5 * mph, gear: undefined},
	restart: {speedMps: 50 * mph, distanceM: 700 * foot, gear: undefined},
	gears: undefined,
	straights: [
		straight('Front', {
			minimumMps: 80 * mph,
			entryMps: 92 * mph,
			brakingMps2: 0.9 * 9.80665,
		}),
		straight('Back', {exitMps: 92 * mph, minimumMps: 84 * mph, lengthM: 800 * foot}),
	],
	situations: [
		situation('Base'),
		situation('In the tow', {drag: scale(0.85), exit: add(0.5 * mph)}),
		situation('Long run', {exit: add(-3 * mph), rollout: add(-0.3 * inch)}),
	],
	rules: {rpmLimit: undefined, gearboxes: undefined, pairs: undefined},
	car: {tires: {}, grip: undefined, massKg: undefined, dragAreaM2: undefined, downforceAreaM2: undefined},
	...change,
});
