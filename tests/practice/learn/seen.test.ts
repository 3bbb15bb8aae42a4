import {describe, expect, test} from 'vitest';
import {mphMps} from '../../../source/drivetrain/constants.ts';
import {anchor} from '../../../source/practice/learn/anchor.ts';
import {
	candidateFor,
	type Learning,
	learnFromMeasured,
	learnFromSeen,
	type Subject,
} from '../../../source/practice/learn/learn.ts';
import {modelOf} from '../../../source/practice/learn/model.ts';
import {known} from '../../../source/practice/learn/reading.ts';
import type {Held, Seen} from '../../../source/practice/learn/seen.ts';
import {type Trim, untrimmed} from '../../../source/practice/learn/trim.ts';
import {runs} from '../../runs.ts';
import {demoDocuments, subjectOf} from './subject.ts';

const demo = subjectOf(demoDocuments());
const mounted = candidateFor(demo.car, {driving: 34, driven: 35}, 'C');
if (!mounted.ok) throw new Error('34/35 and set C are not on the demo rack');
const candidate = mounted.value;
const [front, back] = [0, 1];

const learned = (seen: readonly Seen[], held: Held, subject: Subject = demo): Learning => {
	const outcome = learnFromSeen(subject, seen, held);
	if (!outcome.ok) throw new Error(JSON.stringify(outcome.faults));
	return outcome.value;
};

/** What would be seen at the end of a straight of a car that is so much different from its documents. */
function truth(index: number, trim: Partial<Trim>) {
	const reading = {
		index,
		name: '',
		candidate,
		gear: undefined,
		endMps: undefined,
		endRpm: undefined,
		speedSeen: false,
		exitMps: undefined,
		lengthM: undefined,
		timeS: undefined,
		gears: undefined,
		limited: false,
	};
	return modelOf(demo.car, demo.track)(reading, {...untrimmed, ...trim})!;
}

describe('one number', () => {
	test('with a known speed gives the circumference', () => {
		// Recomputed, by hand from n = 60·V·(1 + κ)·R/C: V = 180 mph = 80.4672 m/s, κ = 0.021, R = 0.94·35/34·4.1 = 3.967353,
		// n = 8650: C = 60·80.4672·1.021·3.967353/8650 = 2.2609 m; growth 0.9 % at 100 mph: ÷ 1.02916 = 2.19684 m.
		const {circumference, held} = learned(
			[{index: back, rpm: 8650, speedMps: 180 * mphMps, gear: 5, candidate}],
			'speed',
		);
		expect(circumference?.rolloutM.value).toBeCloseTo(2.19684, 4);
		// 20 rpm of 8650 and 0.5 mph of 180: 0.231 % and 0.278 %, together 0.361 %.
		expect(circumference!.rolloutM.se / circumference!.rolloutM.value).toBeCloseTo(0.00361, 5);
		expect(circumference).toMatchObject({growth: undefined, slipHeld: 0.021, readings: 1, withHeldSpeed: 0});
		expect(held).toBeUndefined();
	});

	test('with the circumference held gives a speed, and the drag with which the model reaches it', () => {
		const {
			circumference,
			held,
			anchor: found,
			compared,
		} = learned([{index: back, rpm: 8450, candidate}], 'circumference');
		expect([circumference, held]).toEqual([undefined, 'circumference']);
		expect(found?.drag?.value).toBeGreaterThan(1.05);
		expect(compared[0]?.after?.endRpm).toBeCloseTo(8450, 3);
		expect(compared[0]?.before?.endRpm).toBeCloseTo(8537, 0);
	});

	test('with the speed held gives the circumference with which the model turns it', () => {
		const {circumference, held, anchor: found, compared} = learned([{index: back, rpm: 8600, candidate}], 'speed');
		expect([circumference?.withHeldSpeed, held, found]).toEqual([1, 'speed', undefined]);
		expect(circumference?.factor).toBeLessThan(1);
		expect(compared[0]?.after?.endRpm).toBeCloseTo(8600, 3);
	});

	test('on the limiter says nothing about drag', () => {
		const {anchor: found, readings} = learned([{index: front, rpm: 8995, candidate}], 'circumference');
		expect(readings[0]?.limited).toBe(true);
		expect(found).toBeUndefined();
	});

	test('that no drag explains is told as such', () => {
		const {anchor: found} = learned([{index: back, rpm: 7000, gear: 5, candidate}], 'circumference');
		expect(found).toMatchObject({drag: undefined, power: undefined});
		expect(found?.straights[0]?.alone).toBeUndefined();
	});
});

describe('numbers of a car that differs from its documents', () => {
	const seen = (index: number, trim: Partial<Trim>, speed: boolean): Seen => {
		const {endRpm: rpm, endMps, endGear: gear} = truth(index, trim);
		return {index, rpm, gear, candidate, ...(speed && {speedMps: endMps})};
	};

	test('give back its drag', () => {
		const different = {drag: 1.06};
		const {anchor: found} = learned([seen(front, different, false), seen(back, different, false)], 'circumference');
		expect(found?.drag?.value).toBeCloseTo(1.06, 4);
		expect(found?.misfit).toBeLessThan(1e-3);
		for (const {afterMps} of found?.straights ?? []) expect(Math.abs(afterMps)).toBeLessThan(1e-3);
	});

	test('give back circumference and drag at once where the speeds are known', () => {
		const different = {drag: 0.95, rollout: 1.004};
		const {anchor: found, circumference} = learned(
			[seen(front, different, true), seen(back, different, true)],
			'speed',
		);
		expect(circumference?.factor).toBeCloseTo(1.004, 6);
		expect(found?.drag?.value).toBeCloseTo(0.95, 4);
	});

	test('are known better with each further one', () => {
		const numbers = [front, back, front, back].map(index => seen(index, {drag: 1.03}, false));
		const errors = [1, 2, 3, 4].map(count => learned(numbers.slice(0, count), 'circumference').anchor!.drag!.se);
		expect(errors.toSorted((a, b) => b - a)).toEqual(errors);
		expect(errors[3]! / errors[0]!).toBeCloseTo(0.5, 1);
	});

	test('have honest standard errors: the truth is inside two of them in nineteen of twenty cases', () => {
		const cases = runs(60, 400);
		const normal = normals(5);
		const different = {drag: 1.04, rollout: 0.998};
		const ends = [front, back, front, back].map(index => truth(index, different));
		let inside = {drag: 0, rollout: 0};
		for (let i = 0; i < cases; i++) {
			const numbers = ends.map(({endRpm, endMps, endGear: gear}, at): Seen => {
				const [rpm, speedMps] = [endRpm + 20 * normal(), endMps + 0.5 * mphMps * normal()];
				return {index: at % 2, rpm, speedMps, gear, candidate};
			});
			const {anchor: found, circumference} = learned(numbers, 'speed');
			const isInside = (value: number, truly: number, se: number) => (Math.abs(value - truly) <= 2 * se ? 1 : 0);
			inside = {
				drag: inside.drag + isInside(found!.drag!.value, different.drag, found!.drag!.se),
				rollout: inside.rollout + isInside(circumference!.factor, different.rollout, seOf(circumference!)),
			};
		}
		for (const count of Object.values(inside)) {
			expect(count / cases).toBeGreaterThan(0.9);
			expect(count / cases).toBeLessThanOrEqual(1);
		}
	}, 120_000);
});

const seOf = ({rolloutM, factor}: {rolloutM: {value: number; se: number}; factor: number}) =>
	(rolloutM.se * factor) / rolloutM.value;

/** Standard normal numbers by Box and Muller's method from a linear congruential generator (Numerical Recipes' constants). */
function normals(seed: number) {
	let state = seed >>> 0;
	const uniform = () => {
		state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
		return (state + 0.5) / 2 ** 32;
	};
	return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

describe('anchoring', () => {
	test('to what the track holds as measured hardly moves a demo that agrees with it', () => {
		const outcome = learnFromMeasured(demo);
		if (!outcome.ok) throw new Error('no plan');
		const {anchor: found} = outcome.value;
		expect(found?.straights.map(({tells}) => tells)).toEqual(['drag', 'drag']);
		expect(found?.drag?.value).toBeCloseTo(1, 2);
	});

	test('takes a short straight for power: 1 % of drag moves its end by less than 0.2 mph', () => {
		const short = {...demo.track, straights: demo.track.straights.map(one => ({...one, lengthM: 150, exitMps: 40}))};
		const ask = modelOf(demo.car, {...short, gears: undefined});
		const reading = {
			index: front,
			name: 'Front',
			candidate,
			gear: undefined,
			endRpm: undefined,
			speedSeen: true,
			exitMps: undefined,
			lengthM: undefined,
			timeS: undefined,
			gears: undefined,
			limited: false,
		};
		const weaker = ask({...reading, endMps: undefined}, {...untrimmed, power: 0.97})!.endMps;
		const found = anchor(ask, [{...reading, endMps: known(weaker, 0.1)}], untrimmed);
		expect(found?.straights[0]?.tells).toBe('power');
		expect(found?.drag).toBeUndefined();
		expect(found?.power?.value).toBeCloseTo(0.97, 4);
	});

	test('takes nothing from a straight at whose end grip decides', () => {
		const slippery = {...demo.track, car: {...demo.track.car, grip: 0.3}};
		const ask = modelOf(demo.car, slippery);
		const reading = {
			index: back,
			name: 'Back',
			candidate,
			gear: undefined,
			endMps: known(70, 0.1),
			endRpm: undefined,
			speedSeen: true,
			exitMps: known(40, 0.1),
			lengthM: 150,
			timeS: undefined,
			gears: undefined,
			limited: false,
		};
		const found = anchor(ask, [reading], untrimmed);
		expect(found).toMatchObject({drag: undefined, power: undefined});
		expect(found?.straights[0]?.tells).toBeUndefined();
	});

	test('is not carried away by one straight of four that is not as the track has it', () => {
		const ask = modelOf(demo.car, demo.track);
		const readings = [0, 0.1, -0.1, 4].map((offMps, i) => {
			const index = i % 2;
			const endMps = known(truth(index, {drag: 1.05}).endMps + offMps, 0.1);
			return {
				index,
				name: '',
				candidate,
				gear: undefined,
				endMps,
				endRpm: undefined,
				speedSeen: true,
				exitMps: undefined,
				lengthM: undefined,
				timeS: undefined,
				gears: undefined,
				limited: false,
			};
		});
		const {drag} = anchor(ask, readings, untrimmed)!;
		expect(Math.abs(drag!.value - 1.05)).toBeLessThan(0.02);
	});

	test('leaves the exit speed its part in the standard error', () => {
		const ask = modelOf(demo.car, demo.track);
		const end = truth(back, {}).endMps;
		const reading = (exitSe: number) => ({
			index: back,
			name: 'Back',
			candidate,
			gear: undefined,
			endMps: known(end, 0.1),
			endRpm: undefined,
			speedSeen: true,
			exitMps: known(demo.track.straights[back]!.exitMps, exitSe),
			lengthM: undefined,
			timeS: undefined,
			gears: undefined,
			limited: false,
		});
		const [sure, unsure] = [0.01, 1].map(se => anchor(ask, [reading(se)], untrimmed)!.drag!.se);
		expect(unsure! / sure!).toBeGreaterThan(2);
	});
});

test('a circumference that the document states with its uncertainty is held to that', () => {
	const {track, car} = demoDocuments();
	const tires = {...(car.tires as object), left: '87.3 in ± 0.5 in', right: '88.1 in ± 0.5 in'};
	const loose = subjectOf({track, car: {...car, tires}});
	const number = [{index: back, rpm: 8500, gear: 5, candidate}];
	const [tape, loosely] = [demo, loose].map(subject => learned(number, 'circumference', subject).anchor!.drag!.se);
	expect(loosely! / tape!).toBeGreaterThan(1.5);
});
