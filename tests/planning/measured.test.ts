import {describe, expect, test} from 'vitest';
import type {Measured, Track} from '../../source/drivetrain/track.ts';
import {isAnchored, measuredPoints} from '../../source/planning/measured.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import {rpmAt} from '../../source/planning/run-place.ts';
import {car, mph, pair, straight, track} from './build.ts';
import {planOf} from './fake-row.ts';

const none: Measured = {endMps: undefined, rpm: undefined, pair: undefined, gearbox: undefined, gear: undefined};

const withMeasured = (measured: Partial<Measured>): Track =>
	track({straights: [straight('Front', {measured: {...none, ...measured}}), straight('Back')]});

/** The model's end speed on Front with the installed pair. */
function modelMps(): number {
	const row = rankRack(car(), withMeasured({endMps: 1}));
	if (!row.ok) throw new Error();
	return row.value.rows.find(({installed}) => installed)!.situations[0]!.straights[0]!.endSpeedMps;
}

const anchoredAt = (measured: Partial<Measured>) => isAnchored(measuredPoints(planOf(car(), withMeasured(measured))));

describe('a track', () => {
	test('is anchored where the model meets the measured speed within 0.2 mph, and not just outside', () => {
		const model = modelMps();
		expect(anchoredAt({endMps: model + 0.199 * mph})).toBe(true);
		expect(anchoredAt({endMps: model - 0.199 * mph})).toBe(true);
		expect(anchoredAt({endMps: model + 0.201 * mph})).toBe(false);
	});

	test('is compared with the pair that it was measured with', () => {
		expect(anchoredAt({endMps: modelMps(), pair: pair(31, 40), gearbox: 'B'})).toBe(false);
		const [point] = measuredPoints(planOf(car(), withMeasured({endMps: 50, pair: pair(31, 40), gearbox: 'B'})));
		expect([point!.candidate!.pairName, point!.candidate!.gearbox.name]).toEqual(['31/40', 'B']);
	});

	test('is not anchored without measured data, nor where nothing says with which pair', () => {
		expect(isAnchored([])).toBe(false);
		const unknown = planOf(car({installed: undefined}), withMeasured({endMps: modelMps()}));
		expect(measuredPoints(unknown)[0]!.candidate).toBeUndefined();
		expect(isAnchored(measuredPoints(unknown))).toBe(false);
	});

	test('has its speed from the measured RPM in the measured gear where no speed is given', () => {
		const plan = planOf(car(), withMeasured({rpm: 8000, gear: 4}));
		const [point] = measuredPoints(plan);
		const overall = point!.candidate!.train.overall[3]!;
		expect(rpmAt(plan.base.vehicle, overall, point!.speedMps!)).toBeCloseTo(8000, 6);
	});
});

describe('the answer', () => {
	const remarksAt = (measured: Partial<Measured>) => {
		const ranking = rankRack(car(), withMeasured(measured));
		return ranking.ok ? ranking.value.remarks[0] : undefined;
	};

	test('says that it is anchored, or shows both speeds', () => {
		expect(remarksAt({endMps: modelMps()})).toBe(
			'Anchored: the model meets the speed measured on Front within 0.2 mph (0.3 km/h).',
		);
		expect(remarksAt({endMps: 100 * mph, rpm: 8000})).toMatch(
			/^Not anchored: Front measured 100\.0 mph \(160\.9 km\/h\), 8000 rpm; model 1\d\d\.\d mph \(\d{3}\.\d km\/h\), \d{4} rpm with 33\/38 A\.$/,
		);
		expect(remarksAt({gear: 3})).toBe('Not anchored: Front has no measured speed or RPM that gives one.');
	});

	test('counts the measured RPM against the limit in the row that it was measured with', () => {
		const ranking = rankRack(car(), withMeasured({rpm: 9300, endMps: 55}));
		const checkOf = (name: string) =>
			ranking.ok && ranking.value.rows.find(row => row.pair === name && row.gearbox === 'A')!.checks[0];
		expect(checkOf('33/38')).toMatchObject({check: 'limit', verdict: 'fail', value: 9300, at: 'Front measured'});
		expect(checkOf('34/37')).not.toMatchObject({value: 9300});
	});
});
