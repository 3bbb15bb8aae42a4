import {expect, test} from 'vitest';
import type {Track} from '../../source/drivetrain/track.ts';
import {fuelAnswer, lifeAnswer} from '../../source/life/answer.ts';
import type {LifeOptions} from '../../source/life/options.ts';
import type {Block} from '../../source/text/blocks.ts';
import {gearBar} from '../../source/text/dwell-view.ts';
import {fuelView} from '../../source/text/fuel-view.ts';
import {layOut} from '../../source/text/layout.ts';
import {lifeView} from '../../source/text/life-view.ts';
import {unitsOf} from '../../source/text/units.ts';
import {displayWidth} from '../../source/text/width.ts';
import {heading} from '../commands/answers.ts';
import {car, straight, track} from '../planning/build.ts';

const us = unitsOf('us');
const lines = (blocks: Block[], width: number) =>
	layOut(blocks, width).map(cells => cells.map(({text}) => text).join(''));
const at = (changes: Partial<Track> = {}) => track({lapM: 804.672, laps: 300, ...changes});
const life = (width = 100, options: LifeOptions = {}, changes: Partial<Track> = {}) => {
	const told = lifeAnswer(car(), at(changes), options);
	if (!told.ok) throw new Error('no answer');
	return lines(lifeView(heading, told.value, us), width);
};
const fuel = (width = 100, changes: Partial<Track> = {}) => {
	const told = fuelAnswer(car({tankM3: 0.0757}), at(changes));
	if (!told.ok) throw new Error('no answer');
	return lines(fuelView(heading, told.value, us), width);
};
const lineWith = (all: string[], start: RegExp) => all.find(each => start.test(each)) ?? `no line with ${start}`;
const dwell = (gear: number, lapS: number) => ({gear, fromRpm: 7500, toRpm: 7750, lapS, raceS: null});

test('a bar is as long as the time, and each of its characters the gear', () => {
	expect(gearBar([dwell(3, 1), dwell(4, 0.5)], 0.25)).toBe('333344');
	expect(gearBar([dwell(12, 0.5)], 0.25)).toBe('cc');
});

test('a short time is a dot, none is nothing', () => {
	expect(gearBar([dwell(3, 0.01)], 0.25)).toBe('.');
	expect(gearBar([], 0.25)).toBe('');
});

test('the parts of a bar together are never longer than the time', () => {
	expect(gearBar([dwell(3, 0.37), dwell(4, 0.37), dwell(5, 0.37)], 0.25)).toHaveLength(4);
});

test('a difference is the first less the second', () => {
	const [one, other, difference] = lineWith(life(), /^highest rpm/)
		.match(/[+-]?\d+/g)!
		.map(Number);
	expect(Math.abs(one! - other! - difference!)).toBeLessThanOrEqual(1);
});

test('the highest RPM stands first', () => {
	const steps = life()
		.filter(each => /^\d{4,5}-\d{4,5} /.test(each))
		.map(each => Number.parseInt(each, 10));
	expect(steps).toEqual([...steps].sort((a, b) => b - a));
});

test('where parts of the lap are left out nothing is called a race or a lap', () => {
	const all = life(100, {}, {straights: [straight('Front'), straight('Back', {lengthM: undefined})]});
	expect(all.some(each => /a race {2}|a lap {2}/.test(each))).toBe(false);
	expect(lineWith(all, /^engine turns/)).toMatch(/^engine turns in the known part/);
	expect(all.join(' ')).toContain('nothing is told of fuel or of a whole race');
});

test.each([40, 60, 80, 120, 160])('nothing is wider than %d columns', width => {
	for (const each of [...life(width), ...fuel(width)]) expect(displayWidth(each)).toBeLessThanOrEqual(width);
});

test('at 80 columns the dwell of both pairs and its difference stand beside a bar', () => {
	expect(lineWith(life(80), /^rpm /)).toMatch(/^rpm +\S+ A\* +min\/race +in gears +\S+ \S+ +difference$/);
});

test('fuel names what it stands on', () => {
	expect(lineWith(fuel(120), /^- Assumed/)).toBe(
		'- Assumed: 0.300 kg/kWh (0.493 lb/(hp h)) at every load, fuel of 0.745 kg/L (6.22 lb/gal), a tank of 20.0 gal.',
	);
});
