/** The entries of a plan inside a message, each held against its check. */
import {type Problem, shortened} from '../documents/problem.ts';
import {checkCode, entryCheck} from './check-code.ts';
import {longestMessage, mostWords, type Word, wordsOf} from './message-words.ts';
import {canonical, closingLabel} from './print-plan.ts';

export type Entry = {text: string; line: number};
export type Found = {ok: true; entries: Entry[]} | {ok: false; problems: Problem[]};

/** Far more than a valid plan has. */
export const mostEntries = 3000;
const newestVersion = 1;
const asSent = 'the entry as it was sent';

/** Everything from the first line of the plan to its check code; a greeting before and a signature after are left out. */
export function findEntries(message: string): Found {
	if (message.length > longestMessage)
		return refused({path: '', found: `${message.length} characters`, allowed: `at most ${longestMessage}`});
	const words = wordsOf(message);
	if (words === undefined) return refused({path: '', found: 'more words', allowed: `at most ${mostWords}`});
	const start = words.findIndex((word, i) => word.text === 'DROPRACK' && words[i + 1]?.text === 'PLAN');
	if (start < 0)
		return refused({path: '', found: 'no plan', allowed: 'a text with a line that starts "DROPRACK PLAN 1:"'});
	const version = /^(\d{1,9}):$/.exec(words[start + 2]?.text ?? '')?.[1];
	if (version !== undefined && Number(version) > newestVersion) {
		const hint = 'A newer program made this plan, or the line was damaged.';
		return refused({
			path: '',
			line: words[start]!.line,
			found: `plan version ${version}`,
			allowed: `at most ${newestVersion}`,
			hint,
		});
	}
	return collect(words, start);
}

function collect(words: readonly Word[], start: number): Found {
	const entries: Entry[] = [];
	const problems: Problem[] = [];
	let from = start;
	for (let i = start; i < words.length; i++) {
		if (words[i]!.text === closingLabel) {
			if (i > from) problems.push(damaged({text: textOf(words.slice(from, i)), line: words[from]!.line}));
			return close(words.slice(i, i + 5), entries, problems);
		}
		const check = /^\[(.*)\]$/.exec(words[i]!.text)?.[1];
		if (check === undefined) continue;
		const entry = {text: textOf(words.slice(from, i)), line: words[from]!.line};
		if (entryCheck(entry.text) !== check) problems.push(damaged(entry));
		entries.push(entry);
		if (entries.length > mostEntries)
			return refused({path: '', line: entry.line, found: 'more entries', allowed: `at most ${mostEntries}`});
		from = i + 1;
	}
	const last = words[from] ?? words.at(-1)!;
	problems.push({
		path: '',
		line: last.line,
		found: `no end of the plan after "${shortened(entries.at(-1)?.text ?? last.text)}"`,
		allowed: `entries that end in [check], then a line "${closingLabel} … code …"`,
		hint: 'The text was cut off, or a bracket was changed.',
	});
	return {ok: false, problems};
}

function textOf(words: readonly Word[]): string {
	return words.map(word => word.text).join(' ');
}

function damaged({text, line}: Entry): Problem {
	return {path: labelOf(text), line, found: `"${shortened(text)}", which does not match its check`, allowed: asSent};
}

/** What an entry is called in a message to the person. */
function labelOf(text: string): string {
	const end = text.indexOf(':');
	return end > 0 ? shortened(text.slice(0, end)) : '';
}

/** The last line: how many entries, and the code of all of them. */
function close(words: readonly Word[], entries: Entry[], problems: Problem[]): Found {
	const line = words[0]!.line;
	const [, count, code] = /^Check: (\d{1,6}) entries, code ([0-9a-f]{8})/.exec(textOf(words)) ?? [];
	if (count === undefined || code === undefined) {
		problems.push({path: 'Check', line, found: `"${shortened(textOf(words))}"`, allowed: 'the line as it was sent'});
	} else if (problems.length === 0 && Number(count) !== entries.length) {
		problems.push({
			path: 'Check',
			line,
			found: `${entries.length} entries`,
			allowed: `${count} entries, as it was sent`,
		});
	} else if (problems.length === 0 && code !== checkCode(canonical(entries.map(({text}) => text)))) {
		const hint = 'Something was changed, exchanged or put in that the checks of the entries do not show.';
		problems.push({
			path: 'Check',
			line,
			found: 'a text that does not match its code',
			allowed: 'the text as it was sent',
			hint,
		});
	}
	return problems.length === 0 ? {ok: true, entries} : {ok: false, problems};
}

function refused(problem: Problem): Found {
	return {ok: false, problems: [problem]};
}
