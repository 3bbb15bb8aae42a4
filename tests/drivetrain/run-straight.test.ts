import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {monotoneCubic} from '../../source/drivetrain/monotone-cubic.ts';
import {RoadGears} from '../../source/drivetrain/road-gears.ts';
import {runStraight} from '../../source/drivetrain/run-straight.ts';
import {type Carry, shifted} from '../../source/drivetrain/sequence.ts';
import type {Course, GearTrain, SequenceRun, StraightRun, Vehicle} from '../../source/drivetrain/straight.ts';
import {travel} from '../../source/drivetrain/travel.ts';
import {relativeError} from '../close.ts';
import {runs} from '../runs.ts';
import {anyStraight, within} from './any-car.ts';
import {sampleCourse, sampleTrain, sampleVehicle, trainOf} from './sample-car.ts';

const gearsFor = (course: Course, vehicle = sampleVehicle(), train = sampleTrain) =>
	new RoadGears(vehicle, train, course);
const run = (course: Course, vehicle: Vehicle = sampleVehicle(), train: GearTrain = sampleTrain): StraightRun =>
	runStraight(new RoadGears(vehicle, train, course), course);
const fastest = (course: Course, vehicle?: Vehicle, train?: GearTrain): SequenceRun => {
	const result = run(course, vehicle, train);
	if (result.kind !== 'ran') throw new Error(`expected a run, got ${result.kind}`);
	return result.fastest;
};

/** A car that 3280 N push, the same in every gear at every speed, with nothing against it: 2 m/s² for 1640 kg. */
const evenVehicle = (changes: Partial<Vehicle> = {}) =>
	sampleVehicle({
		dragAreaM2: 0,
		downforceAreaM2: 0,
		rolling: 0,
		wheelInertiaKgM2: 0,
		undrivenInertiaKgM2: 0,
		engineInertiaKgM2: 0,
		rolloutM: 2,
		growth: 0,
		slip: 0,
		torqueNm: monotoneCubic([1000, 20_000], [3280 / Math.PI / 4, 3280 / Math.PI / 4]),
		limiterRpm: 7200,
		topRpm: 7200,
		shiftCapRpm: 7200,
		shiftTimeS: 0,
		...changes,
	});
// 7200 rpm at R 4 and 2 m a turn is 60 m/s.
const evenTrain = trainOf([4], 1);
const oneGear = (changes: Partial<Course>) => sampleCourse({highestGear: 1, ...changes});

describe('what cannot be run is said', () => {
	test('overLimit: an exit speed above the limit in every allowed gear', () => {
		expect(run(oneGear({exitMps: 60.001}), evenVehicle(), evenTrain)).toEqual({kind: 'overLimit'});
		expect(run(oneGear({exitMps: 60}), evenVehicle(), evenTrain).kind).toBe('ran');
		expect(run(sampleCourse({exitMps: 60, highestGear: 3})).kind).toBe('overLimit');
		expect(run(sampleCourse({exitMps: 60, highestGear: 4})).kind).toBe('ran');
	});

	test('overLimit is by the limit in force where the limiter lies higher', () => {
		const vehicle = evenVehicle({limiterRpm: 7800});
		expect(run(oneGear({exitMps: 61}), vehicle, evenTrain).kind).toBe('overLimit');
	});

	test('stops: a car that comes to rest on the way', () => {
		const uphill = sampleCourse({grade: 2, exitMps: 20, lowestGear: 5, lengthM: 400});
		expect(run(uphill)).toEqual({kind: 'stops'});
		expect(run({...uphill, lengthM: 5}).kind).toBe('ran');
	});

	test('cannotBrake: an exit speed above the braking curve', () => {
		// From 50 to 30 m/s at 8 m/s² takes 100 m.
		const course = sampleCourse({exitMps: 50, entryMps: 30, brakingMps2: 8, lengthM: 99.999});
		expect(run(course)).toEqual({kind: 'cannotBrake'});
		const just = fastest({...course, lengthM: 100});
		expect(just.timeS).toBeCloseTo(2.5, 9);
		expect([just.topMps, just.finalMps]).toEqual([50, 30]);
	});
});

describe('by hand, at 2 m/s²', () => {
	test('from 40 m/s, 225 m take 5 s and end at 50 m/s and 6000 rpm', () => {
		const {timeS, topMps, finalMps, topRpm, limiterM, reachRpm, ...rest} = fastest(
			oneGear({exitMps: 40, lengthM: 225}),
			evenVehicle(),
			evenTrain,
		);
		expect(relativeError(timeS, 5)).toBeLessThan(1e-12);
		expect(relativeError(topMps, 50)).toBeLessThan(1e-12);
		expect(finalMps).toBe(topMps);
		expect(relativeError(topRpm, 6000)).toBeLessThan(1e-12);
		expect(reachRpm).toBe(topRpm);
		expect(limiterM).toBe(0);
		expect(rest).toEqual({
			firstGear: 1,
			lastGear: 1,
			topGear: 1,
			shifts: [],
			slows: false,
			entryMissed: false,
			pushed: false,
		});
	});

	test('the limiter holds 60 m/s from 500 m on; without it the car would reach √(1600 + 4·800) m/s', () => {
		const held = fastest(oneGear({exitMps: 40, lengthM: 800}), evenVehicle(), evenTrain);
		expect(held.limiterM).toBeCloseTo(300, 9);
		expect(held.timeS).toBeCloseTo(10 + 5, 9);
		expect(held.topMps).toBeCloseTo(60, 12);
		expect(relativeError(held.reachRpm, 120 * Math.sqrt(1600 + 4 * 800))).toBeLessThan(1e-12);
	});

	test('braking ends the hold: at 6 m/s² down to 30 m/s takes 225 m', () => {
		const course = oneGear({exitMps: 40, lengthM: 800, entryMps: 30, brakingMps2: 6});
		const held = fastest(course, evenVehicle(), evenTrain);
		expect(held.limiterM).toBeCloseTo(75, 9);
		expect(held.timeS).toBeCloseTo(10 + 75 / 60 + 5, 9);
		expect(held.finalMps).toBe(30);
		// V² = 1600 + 4s and V² = 900 + 12·(800 − s): s = 556.25 m, V² = 3825.
		expect(relativeError(held.reachRpm, 120 * Math.sqrt(3825))).toBeLessThan(1e-12);
	});

	test('a limit below the limiter does not cut: 62 m/s are reached, above the 60 m/s of the limit', () => {
		const free = fastest(oneGear({exitMps: 40, lengthM: 561}), evenVehicle({limiterRpm: 7800}), evenTrain);
		expect(free.topMps).toBeCloseTo(62, 9);
		expect(free.limiterM).toBe(0);
	});

	test('an entry speed above what is reached is missed and no braking happens', () => {
		const course = oneGear({exitMps: 40, lengthM: 225, entryMps: 55, brakingMps2: 6});
		const missed = fastest(course, evenVehicle(), evenTrain);
		expect(missed.entryMissed).toBe(true);
		expect(missed.timeS).toBeCloseTo(5, 9);
		expect(missed.finalMps).toBeCloseTo(50, 9);
	});

	// To 50 m/s in 5 s and 225 m, 25 m without thrust, then half the thrust: 1 m/s² over 156 m, to √(2500 + 312) m/s.
	test('a shift without thrust for 0.5 s costs 0.5 s at an even speed', () => {
		const vehicle = evenVehicle({shiftTimeS: 0.5, limiterRpm: 6000, topRpm: 6000, shiftCapRpm: 6000});
		const course = sampleCourse({exitMps: 40, lengthM: 225 + 25 + 156, highestGear: 2});
		const story = fastest(course, vehicle, trainOf([4, 2], 1));
		const endMps = Math.sqrt(2812);
		expect(relativeError(story.timeS, 5 + 0.5 + (endMps - 50))).toBeLessThan(1e-12);
		expect(relativeError(story.finalMps, endMps)).toBeLessThan(1e-12);
		expect(story.shifts).toEqual([
			{
				from: 1,
				rpm: expect.closeTo(6000, 8),
				lightRpm: expect.closeTo(5940, 8),
				rpmAfter: expect.closeTo(3000, 8),
				speedMps: expect.closeTo(50, 9),
				distanceM: expect.closeTo(225, 8),
				timeS: expect.closeTo(5, 9),
				leftS: expect.closeTo(endMps - 50, 9),
			},
		]);
	});
});

/** Gears far apart and a long way: the car must shift. */
const shifting = sampleCourse({exitMps: 20, lengthM: 1200, lowestGear: 1, startGear: 2});

describe('shifts', () => {
	test('are told in order, with their RPM, their place and the time left', () => {
		const story = fastest(shifting);
		expect(story.firstGear).toBe(2);
		expect(story.shifts.map(shift => shift.from)).toEqual([2, 3, 4].slice(0, story.shifts.length));
		expect(story.shifts.length).toBeGreaterThan(1);
		let [timeS, distanceM] = [0, 0];
		for (const shift of story.shifts) {
			expect(shift.rpm).toBeLessThanOrEqual(9100 * (1 + 1e-12));
			expect(shift.rpmAfter).toBeLessThan(shift.rpm);
			expect(shift.lightRpm).toBeLessThan(shift.rpm);
			expect(shift.timeS).toBeGreaterThan(timeS);
			expect(shift.distanceM).toBeGreaterThan(distanceM);
			expect(shift.leftS).toBeCloseTo(story.timeS - shift.timeS - 0.08, 9);
			[timeS, distanceM] = [shift.timeS, shift.distanceM];
		}
	});

	test('count where the interruption is over exactly at the end or the brakes, and not a hair later', () => {
		const course = sampleCourse({exitMps: 38, lowestGear: 3, highestGear: 4});
		const gears = gearsFor(course);
		const carry: Carry = (gear, fromMps, goal) => gears.table(gear).travel(fromMps, goal);
		const shift = (change: Partial<Course>) =>
			shifted(gears, {...course, ...change}, 3, {speedMps: 38, distanceM: 0, timeS: 0}, carry);
		const {distanceM, speedMps} = shift({lengthM: 2000})!;
		expect(shift({lengthM: distanceM})).toEqual({...shift({lengthM: 2000}), distanceM, speedMps});
		expect(shift({lengthM: distanceM - 1e-6})).toBeUndefined();
		const braking = {entryMps: speedMps - 10, brakingMps2: 8};
		const brakingM = (speedMps ** 2 - (speedMps - 10) ** 2) / 16;
		expect(shift({lengthM: distanceM + brakingM + 1e-9, ...braking})).toBeDefined();
		expect(shift({lengthM: distanceM + brakingM - 1e-6, ...braking})).toBeUndefined();
	});

	test('the light of a gear entered late is on from its start', () => {
		const vehicle = sampleVehicle({reactionTimeS: 30});
		const story = fastest(shifting, vehicle);
		const gears = gearsFor(shifting, vehicle);
		expect(story.shifts[0]!.lightRpm).toBe(gears.motion(2).rpmAt(20));
		story.shifts.slice(1).forEach((shift, i) => {
			expect(shift.lightRpm).toBe(story.shifts[i]!.rpmAfter);
		});
	});

	test('the light comes one reaction time before the shift', () => {
		const story = fastest(shifting);
		const gears = gearsFor(shifting);
		const [first] = story.shifts;
		const lightMps = gears.motion(2).speedAt(first!.lightRpm);
		const goal = {distanceM: 1e5, toMps: first!.speedMps, braking: undefined};
		expect(relativeError(travel(gears.motion(2), lightMps, goal).timeS, 0.25)).toBeLessThan(1e-9);
	});

	test('between two like gears is possible and gains nothing', () => {
		const twins = trainOf([5.9, 5.9]);
		const course = sampleCourse({exitMps: 35, lengthM: 300, highestGear: 2});
		const {chosen} = run(course, sampleVehicle(), twins) as {chosen: SequenceRun};
		expect(chosen.shifts).toEqual([]);
	});
});

describe('marked on the run', () => {
	test('slows: the end is slower than the exit', () => {
		const uphill = sampleCourse({grade: 0.2, exitMps: 75, lowestGear: 5});
		const story = fastest(uphill);
		expect(story.slows).toBe(true);
		expect(story.topMps).toBe(75);
		expect(story.finalMps).toBeLessThan(75);
		expect(fastest(sampleCourse()).slows).toBe(false);
	});

	test('pushed: a grade that alone would take the car past the limiter', () => {
		const steep = sampleCourse({grade: -0.2, exitMps: 50, lengthM: 2000, highestGear: 3, startGear: 3});
		const story = fastest(steep);
		expect(story.pushed).toBe(true);
		expect(relativeError(story.topRpm, 9200)).toBeLessThan(1e-9);
		expect(fastest({...steep, grade: 0}).pushed).toBe(false);
		expect(fastest({...steep, grade: 0}).limiterM).toBeGreaterThan(0);
	});

	test('a start gear is the gear at the exit, up to the limit', () => {
		for (const startGear of [2, 3, 4])
			expect(fastest(sampleCourse({exitMps: 30, startGear})).firstGear).toBe(startGear);
		expect(run(sampleCourse({exitMps: 45, startGear: 2})).kind).toBe('overLimit');
	});

	// Above the shift speed, below the limit: it may stay or shift at once, also where no gear gains speed.
	test.each([0, 0.25])('a start gear whose shift speed is behind shifts at once or stays (grade %f)', grade => {
		const vehicle = sampleVehicle({limiterRpm: 9500, topRpm: 9500, shiftCapRpm: 8000});
		const course = sampleCourse({exitMps: 56, grade, startGear: 3, lengthM: 300});
		const gears = gearsFor(course, vehicle);
		expect(gears.shift(3).speedMps).toBeLessThan(56);
		const alone = fastest({...course, highestGear: 3}, vehicle);
		const free = fastest(course, vehicle);
		expect(free.timeS).toBeLessThanOrEqual(alone.timeS);
		if (free.shifts.length > 0) expect([free.shifts[0]!.timeS, free.shifts[0]!.speedMps]).toEqual([0, 56]);
	});
});

const shape = (result: StraightRun) => (result.kind === 'ran' ? [result.chosen, result.fastest] : []);

test('every number is finite and every answer has a kind, for any car on any straight', () => {
	fc.assert(
		fc.property(anyStraight, ({vehicle, train, course}) => {
			const result = run(course, vehicle, train);
			expect(['ran', 'overLimit', 'stops', 'cannotBrake']).toContain(result.kind);
			for (const story of shape(result)) {
				const {shifts, ...rest} = story;
				for (const part of [rest, ...shifts])
					for (const [name, value] of Object.entries(part))
						if (typeof value === 'number') expect(Number.isFinite(value), name).toBe(true);
				expect(story.firstGear).toBeGreaterThanOrEqual(course.lowestGear);
				expect(story.lastGear).toBeLessThanOrEqual(course.highestGear);
				expect(story.shifts.length).toBe(story.lastGear - story.firstGear);
				expect(story.topMps).toBeGreaterThanOrEqual(Math.max(course.exitMps, story.finalMps) * (1 - 1e-12));
				expect(story.timeS).toBeGreaterThan(0);
				expect(story.timeS).toBeGreaterThanOrEqual((course.lengthM / story.topMps) * (1 - 1e-9));
				for (const shift of story.shifts) expect(shift.lightRpm).toBeLessThanOrEqual(shift.rpm * (1 + 1e-12));
			}
			if (result.kind === 'ran') {
				expect(result.fastest.timeS).toBeLessThanOrEqual(result.chosen.timeS);
				expect(result.chosen.timeS).toBeLessThanOrEqual(result.fastest.timeS + vehicle.sameTimeS);
			}
		}),
		{numRuns: runs(300, 5000)},
	);
});

/** Fastest time; Infinity where the car stops; undefined where a limit keeps it from starting. */
const timeOf = (vehicle: Vehicle, train: GearTrain, course: Course) => {
	const result = run(course, vehicle, train);
	if (result.kind === 'ran') return result.fastest.timeS;
	return result.kind === 'stops' ? Number.POSITIVE_INFINITY : undefined;
};
const single = anyStraight.map(({vehicle, train, course}) => ({
	vehicle: {...vehicle, sameTimeS: 0},
	train: trainOf(train.overall.slice(0, 1)),
	course: {...course, lowestGear: 1, highestGear: 1, startGear: undefined},
}));
const notSlower = (better: number | undefined, worse: number | undefined) => {
	if (better === undefined || worse === undefined || worse === Number.POSITIVE_INFINITY) return;
	expect(better).toBeLessThanOrEqual(worse * (1 + 1e-9));
};

// In one gear: with shifts the planned shift point moves with power and grip, and is the best one only without shift time.
describe('in one gear', () => {
	test('more power is never slower', () => {
		fc.assert(
			fc.property(single, within(1, 1.5), ({vehicle, train, course}, factor) => {
				const {torqueNm} = vehicle;
				const stronger = {
					...torqueNm,
					coefficients: torqueNm.coefficients.map(value => value * factor),
					last: torqueNm.last * factor,
				};
				notSlower(timeOf({...vehicle, torqueNm: stronger}, train, course), timeOf(vehicle, train, course));
			}),
			{numRuns: runs(200, 3000)},
		);
	});

	test('less drag against the wind is never slower, nor is more grip', () => {
		fc.assert(
			fc.property(single, within(0.5, 1), ({vehicle, train, course}, factor) => {
				const against = {...course, headwindMps: Math.abs(course.headwindMps)};
				const sleek = {...vehicle, dragAreaM2: vehicle.dragAreaM2 * factor};
				notSlower(timeOf(sleek, train, against), timeOf(vehicle, train, against));
				notSlower(timeOf(vehicle, train, course), timeOf({...vehicle, grip: vehicle.grip * factor}, train, course));
			}),
			{numRuns: runs(200, 3000)},
		);
	});

	// Where grip holds, force and mass grow together; on the level without downforce nothing else grows with mass but inertia and rolling.
	test('more mass on the level without downforce is never faster while the car gains speed', () => {
		fc.assert(
			fc.property(single, within(1, 1.5), ({vehicle, train, course}, factor) => {
				const calm = {...course, grade: 0, headwindMps: 0, entryMps: undefined, brakingMps2: undefined};
				const light = {...vehicle, downforceAreaM2: 0, undrivenInertiaKgM2: 0, grip: 50, cgHeightRatio: 0};
				const result = run(calm, light, train);
				if (result.kind !== 'ran' || result.fastest.slows) return;
				notSlower(result.fastest.timeS, timeOf({...light, massKg: light.massKg * factor}, train, calm));
			}),
			{numRuns: runs(200, 3000)},
		);
	});

	test('a longer straight takes longer, and two parts add up to the whole', () => {
		fc.assert(
			fc.property(single, within(0.05, 0.95), ({vehicle, train, course}, share) => {
				const free = {...course, entryMps: undefined, brakingMps2: undefined};
				const whole = run(free, vehicle, train);
				const first = run({...free, lengthM: share * free.lengthM}, vehicle, train);
				if (whole.kind !== 'ran' || first.kind !== 'ran') return;
				expect(first.fastest.timeS).toBeLessThan(whole.fastest.timeS);
				const exitMps = Math.min(
					first.fastest.finalMps,
					gearsFor(free, vehicle, train).motion(1).speedAt(vehicle.topRpm),
				);
				// Between the limit and a limiter above it no straight starts.
				if (exitMps < first.fastest.finalMps * (1 - 1e-12)) return;
				const second = run({...free, lengthM: (1 - share) * free.lengthM, exitMps}, vehicle, train);
				if (second.kind !== 'ran') throw new Error(second.kind);
				expect(relativeError(first.fastest.timeS + second.fastest.timeS, whole.fastest.timeS)).toBeLessThan(1e-8);
				expect(relativeError(second.fastest.finalMps, whole.fastest.finalMps)).toBeLessThan(1e-8);
			}),
			{numRuns: runs(200, 3000)},
		);
	});
});

test('a longer straight takes longer in all gears', () => {
	fc.assert(
		fc.property(anyStraight, within(1.001, 2), ({vehicle, train, course}, factor) => {
			const free = {...course, entryMps: undefined, brakingMps2: undefined};
			const [short, long] = [
				timeOf(vehicle, train, free),
				timeOf(vehicle, train, {...free, lengthM: free.lengthM * factor}),
			];
			if (short === undefined || long === undefined || short === Number.POSITIVE_INFINITY) return;
			expect(long).toBeGreaterThan(short);
		}),
		{numRuns: runs(200, 3000)},
	);
});
