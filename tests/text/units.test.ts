import {expect, test} from 'vitest';
import {fixed, rpmDown, rpmUp, signed, unitsOf} from '../../source/text/units.ts';

const [us, metric] = [unitsOf('us'), unitsOf('metric')];

// Definitions: 1 mi = 1609.344 m, 1 ft = 0.3048 m, 1 hp = 550 ft lbf/s = 745.69987 W, 1 inHg = 3386.389 Pa.
test('US units', () => {
	expect(us.text('speed', 44.704)).toBe('100.0 mph');
	expect(us.text('distance', 30.48)).toBe('100 ft');
	expect(us.text('longDistance', 1_609_344)).toBe('1000 mi');
	expect(us.text('temperature', 25)).toBe('77°F');
	expect(us.text('temperature', -40)).toBe('-40°F');
	expect(us.text('pressure', 101_325)).toBe('29.92 inHg');
	expect(us.text('power', 745_699.87)).toBe('1000 hp');
	// 1.225 kg/m³ = 0.0765 lb/ft³ (standard atmosphere at sea level).
	expect(us.text('density', 1.225)).toBe('0.0765 lb/ft³');
});

test('metric units', () => {
	expect(metric.text('speed', 10)).toBe('36.0 km/h');
	expect(metric.text('pressure', 99_000)).toBe('990 hPa');
	expect(metric.text('temperature', 25)).toBe('25°C');
	expect(metric.text('power', 490_400)).toBe('490 kW');
});

test('what is absent is a dash', () => {
	expect([us.text('speed', null), us.number('speed', null), rpmDown(null), signed(null, 3)]).toEqual([
		'-',
		'-',
		'-',
		'-',
	]);
});

test('RPM is rounded so that a limit never looks kept when it is not', () => {
	expect([rpmUp(8900.2), rpmDown(-0.2), rpmDown(4211.9)]).toEqual(['8901', '-1', '4211']);
	expect([rpmUp(8900 + 1e-9), rpmDown(8900 - 1e-9)]).toEqual(['8900', '8900']);
});

test('a difference has its sign, and zero has none', () => {
	expect([signed(0.0123, 3), signed(-0.0123, 3), signed(-0.0001, 3), signed(0, 3)]).toEqual([
		'+0.012',
		'-0.012',
		'0.000',
		'0.000',
	]);
	expect(fixed(-0.4, 0)).toBe('0');
});
