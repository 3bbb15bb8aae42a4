import {expect, test} from 'vitest';
import {groupLevelsEvened} from '../../../source/practice/fit/group-levels.ts';
import {huberFit} from '../../../source/practice/fit/huber.ts';
import {trimmedMean} from '../../../source/practice/fit/robust.ts';
import {chance} from '../chance.ts';

/** y = 5 + 2·x, in groups that each see a part of x and are off by a level of their own. */
function readings(levelSd: number, noise: number, seed: number) {
	const dice = chance(seed);
	const [groups, each] = [40, 12];
	const [x, y, of]: [number[], number[], number[]] = [[], [], []];
	for (let g = 0; g < groups; g++) {
		const [level, from] = [levelSd * dice.normal(), dice.share()];
		for (let i = 0; i < each; i++) {
			x.push(from + i / each);
			y.push(5 + 2 * x.at(-1)! + level + noise * dice.normal());
			of.push(g);
		}
	}
	const columns = [Float64Array.from(x, () => 1), Float64Array.from(x)];
	return {columns, y: Float64Array.from(y), of};
}

function slopes(levelSd: number, noise: number, seed: number) {
	const {columns, y, of} = readings(levelSd, noise, seed);
	const first = huberFit(columns, y, of)!;
	const evened = groupLevelsEvened(columns, y, of, first);
	return {plain: first.coefficients[1]!, evened: huberFit(evened.columns, evened.y, of)!.coefficients};
}

const rms = (values: readonly number[]) =>
	Math.sqrt(values.reduce((sum, value) => sum + value ** 2, 0) / values.length);
const seeds = Array.from({length: 60}, (_, i) => i + 1);

test('where groups err as a whole, the slope comes from within them', () => {
	const all = seeds.map(seed => slopes(1, 0.1, seed));
	// Within groups alone: 0.1 ÷ √(480 · 0.0828), the variance of 12 places a twelfth apart; 95 % as efficient by Huber.
	expect(rms(all.map(({evened}) => evened[1]! - 2))).toBeLessThan(0.02);
	expect(rms(all.map(({plain}) => plain - 2))).toBeGreaterThan(0.1);
});

test('the level stays: it is that of the mean group', () => {
	const all = seeds.map(seed => slopes(1, 0.1, seed).evened[0]!);
	// 1/√40, and a little for the slope.
	expect(rms(all.map(level => level - 5))).toBeLessThan(0.25);
});

test('where groups do not differ, it is the plain fit', () => {
	for (const seed of seeds) {
		const {plain, evened} = slopes(0, 0.1, seed);
		expect(Math.abs(evened[1]! - plain)).toBeLessThan(0.02);
	}
});

test('a reading alone in each group changes nothing', () => {
	const {columns, y} = readings(0.5, 0.1, 1);
	const alone = Array.from(y, (_, i) => i);
	const first = huberFit(columns, y)!;
	expect(groupLevelsEvened(columns, y, alone, first)).toEqual({columns, y});
});

test.each([
	[[], Number.NaN],
	[[1, 2, 9], 4],
	[[0, 1, 2, 3], 1.5],
	[[-90, 1, 2, 3, 4, 5, 6, 7, 8, 99], 4.5],
])('the trimmed mean of %j is %d', (values, mean) => {
	expect(trimmedMean(values, 0.1)).toBe(mean);
});
