/** The plan as text for a message. */
import {checkCode, entryCheck} from './check-code.ts';
import type {PlanDocument} from './plan-document.ts';
import {entriesOf} from './plan-entries.ts';

const columns = 60;
const indent = '  ';

/** Lines of at most 60 columns, the last with the check code of all entries. */
export function printPlan(plan: PlanDocument): string {
	const entries = entriesOf(plan);
	const closing = `${closingLabel} ${entries.length} entries, code ${checkCode(canonical(entries))}`;
	const lines = entries.flatMap(entry => wrap(`${entry} [${entryCheck(entry)}]`));
	return `${[...lines, closing].join('\n')}\n`;
}

export const closingLabel = 'Check:';

/** What the check code is taken of. */
export function canonical(entries: readonly string[]): string {
	return entries.join('\n');
}

/** Broken at blanks, later lines indented. No word is longer than a line. */
function wrap(entry: string): string[] {
	const lines: string[] = [];
	let line = '';
	for (const word of entry.split(' ')) {
		if (line.length + 1 + word.length > columns) {
			lines.push(line);
			line = indent + word;
		} else line = line === '' ? word : `${line} ${word}`;
	}
	return [...lines, line];
}
