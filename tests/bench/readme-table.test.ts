import {readFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {type BudgetName, boundText, budgets} from './budgets.ts';
import {benchSection, benchTable} from './readme-table.ts';

const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

/** Times differ from run to run; what is measured, and against what, does not. */
const shapeOf = (table: string) =>
	table.replace(/\| [\d.]+ (×|MB|bytes|frames) \| at/g, '| … $1 | at').replace(/^Measured on .+\.$/m, 'Measured on ….');

test('the README has a figure for every budget; else: npm run bench -- --write-readme', () => {
	const any = new Map((Object.keys(budgets) as BudgetName[]).map(name => [name, 1]));
	expect(shapeOf(benchSection.exec(readme)?.[0] ?? '')).toBe(shapeOf(benchTable(any, 'a machine')));
});

test('a table without a figure is refused', () => {
	expect(() => benchTable(new Map([['rank', 0.1]]), 'a machine')).toThrow('odex was not measured');
});

test('a budget says which side of its bound is the good one', () => {
	expect([boundText(budgets.rank), boundText(budgets.odex)]).toEqual(['at most 0.25 ×', 'at least 200 ×']);
});
