import {describe, expect, test} from 'vitest';
import {dayOf} from '../../../source/odds/day.ts';
import {worldOfDraw} from '../../../source/odds/draws/draw.ts';
import {RowDraws} from '../../../source/odds/row-draw.ts';
import {noShift, shifted} from '../../../source/odds/world.ts';
import {candidatesOf} from '../../../source/planning/candidates.ts';
import {planFor} from '../../../source/planning/plan.ts';
import {rankRack} from '../../../source/planning/rank-rack.ts';
import {runs} from '../../runs.ts';
import {shippedCar, shippedTrack, trackFiles} from '../../tracks/demo.ts';
import {plainRows, setupOf} from '../plain.ts';

const car = await shippedCar('demo.json');

describe.each(trackFiles)('at %s', file => {
	test('the documents as they stand give the times and the highest RPM of the ranking', async () => {
		// A restart ends or is shifted at the limiter at the latest, so it is not run: the other RPM are compared.
		const track = {...(await shippedTrack(file)), restart: undefined};
		const {plan, measured, world} = setupOf(car, track);
		const draws = new RowDraws({plan, measured});
		const day = dayOf(plan, shifted(world, noShift(track)));
		const ranking = rankRack(car, track);
		if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
		const rows = new Map(ranking.value.rows.map(row => [`${row.pair} ${row.gearbox}`, row]));
		const errors = candidatesOf(plan.car).flatMap(candidate => {
			const row = rows.get(`${candidate.pairName} ${candidate.gearbox.name}`)!;
			if (row.fastestS === null) return [];
			const quick = draws.run(day, {candidate});
			const limit = row.checks.find(({check}) => check === 'limit')!;
			return [
				{
					s: Math.abs(quick.timeS - row.fastestS),
					rpm: Math.abs(quick.highestRpm - limit.value!),
					same: quick.isOver === (limit.verdict === 'fail'),
				},
			];
		});
		expect(errors.length).toBeGreaterThan(10);
		for (const {s, same} of errors) {
			expect(s).toBeLessThan(1e-3);
			expect(same).toBe(true);
		}
		// Where grip holds two gears at an exit they are equal, and either may be taken: the RPM at the exit is another then.
		expect(errors.filter(({rpm}) => rpm > 3).length / errors.length).toBeLessThan(0.2);
	});

	test('in draws of all numbers a row passes the limit where the ranking of those numbers says so', async () => {
		const track = await shippedTrack(file);
		const {plan, inputs, measured, world} = setupOf(car, track);
		const rowDraws = new RowDraws({plan, measured});
		const asItStands = dayOf(plan, shifted(world, noShift(track)));
		const candidates = candidatesOf(plan.car).filter((_, i) => i % 5 === 0);
		let [compared, different, worstS] = [0, 0, 0];
		for (let draw = 0; draw < runs(4, 64); draw++) {
			const drawn = worldOfDraw(world, inputs, draw, 1);
			const rows = new Map(plainRows(drawn).map(row => [row.name, row]));
			const day = dayOf(plan, drawn);
			for (const candidate of candidates) {
				const plain = rows.get(`${candidate.pairName} ${candidate.gearbox.name}`)!;
				const worthwhile = rowDraws.worthwhile(asItStands, candidate);
				const quick = rowDraws.run(day, {candidate, worthwhile});
				compared++;
				if (quick.isOver !== plain.isOver) different++;
				if (Number.isNaN(quick.timeS) !== Number.isNaN(plain.timeS)) different++;
				if (!Number.isNaN(plain.timeS)) worstS = Math.max(worstS, Math.abs(quick.timeS - plain.timeS));
			}
		}
		// Where two sequences are as fast to a hair, another one may be taken.
		expect(different / compared).toBeLessThan(0.01);
		expect(worstS).toBeLessThan(2e-3);
	});
});

test('a draw that moves nothing is the plan itself', async () => {
	const track = await shippedTrack('hesper-ridge.json');
	const {plan, world} = setupOf(car, track);
	const day = dayOf(plan, shifted(world, noShift(track)));
	expect(day.conditions.map(({condition}) => condition.vehicle)).toEqual(plan.conditions.map(({vehicle}) => vehicle));
	expect(day.conditions.map(({condition}) => condition.weight)).toEqual(plan.conditions.map(({weight}) => weight));
});

test('a draw is the plan of its documents', async () => {
	const track = await shippedTrack('tarrowdale.json');
	const {plan, inputs, world} = setupOf(car, track);
	const drawn = worldOfDraw(world, inputs, 3, 1);
	const again = planFor(drawn.car, drawn.track);
	if (!again.ok) throw new Error(JSON.stringify(again.faults));
	dayOf(plan, drawn).conditions.forEach(({condition}, i) => {
		const expected = again.value.conditions[i]!;
		expect(condition.vehicle.rolloutM).toBe(expected.vehicle.rolloutM);
		expect(condition.vehicle.torqueNm.last).toBeCloseTo(expected.vehicle.torqueNm.last, 9);
		condition.places.forEach((place, k) => {
			expect(place.straight).toEqual(expected.places[k]!.straight);
		});
	});
});
