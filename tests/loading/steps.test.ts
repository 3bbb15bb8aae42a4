import {expect, test} from 'vitest';
import {stepsFrom} from '../../source/loading/steps.ts';
import {row} from '../commands/answers.ts';

const rows = (...ratios: number[]) => ratios.map(pairRatio => row({pair: `${pairRatio}`, pairRatio}));
const ratiosOf = (steps: readonly {pairRatio: number}[][]) => steps.map(step => step.map(({pairRatio}) => pairRatio));

test('a step is the next distinct ratio, the nearest first, each way', () => {
	const rack = rows(1.1, 1, 1.05, 0.95, 0.9);
	expect(ratiosOf(stepsFrom(rack, 1, 'shorter', 0, 2))).toEqual([[1.05], [1.1]]);
	expect(ratiosOf(stepsFrom(rack, 1, 'taller', 0, 2))).toEqual([[0.95], [0.9]]);
});

test('the same ratio by other teeth is the same step, and the ratio itself is none', () => {
	// 32/36, 24/27 and 40/45 are all 1.125.
	expect(ratiosOf(stepsFrom(rows(1, 36 / 32, 27 / 24, 45 / 40), 1, 'shorter', 0, 3))).toEqual([[1.125, 1.125, 1.125]]);
});

test('ratios too close to be told apart are no step, and belong to the step that they are close to', () => {
	const rack = rows(1, 1.004, 1.006, 1.01, 1.0115, 1.03);
	// More than 0.5 % beyond 1 begins at 1.006; up to 1.01103 belongs to it; 1.0115 is the next step.
	expect(ratiosOf(stepsFrom(rack, 1, 'shorter', 0.005, 2))).toEqual([[1.006, 1.01], [1.0115]]);
});

test('where the rack ends there are fewer steps', () => {
	expect(stepsFrom(rows(1, 1.02), 1, 'shorter', 0, 3)).toHaveLength(1);
	expect(stepsFrom(rows(1, 1.02), 1, 'taller', 0, 3)).toHaveLength(0);
	expect(stepsFrom(rows(1, 1.02), 1, 'shorter', 0, 0)).toEqual([]);
});
