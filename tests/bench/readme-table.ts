/** The README's table of what the last run with `--write-readme` measured. */
import {readFileSync, writeFileSync} from 'node:fs';
import {type Budget, type BudgetName, boundText, budgets, figure, type Measured} from './budgets.ts';
import {machine} from './harness.ts';

const file = 'README.md';

/** Between the two marks, each on a line of its own. */
export const benchSection = /(?<=^<!-- bench -->\n)[\s\S]*?(?=^<!-- \/bench -->$)/m;

export function benchTable(measured: Measured, on: string): string {
	const rows = (Object.entries(budgets) as [BudgetName, Budget][]).map(([name, budget]) => {
		const value = measured.get(name);
		if (value === undefined) throw new Error(`${name} was not measured`);
		return `| ${budget.what} | ${figure(value)} ${budget.unit} | ${boundText(budget)} |`;
	});
	return ['| what | measured | budget |', '| --- | --- | --- |', ...rows, '', `Measured on ${on}.`, ''].join('\n');
}

export function writeReadme(measured: Measured): void {
	const text = readFileSync(file, 'utf8');
	if (!benchSection.test(text)) throw new Error(`${file} lacks <!-- bench --> ... <!-- /bench -->.`);
	writeFileSync(
		file,
		text.replace(benchSection, () => benchTable(measured, machine())),
	);
}
