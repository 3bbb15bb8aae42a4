import {visible} from './visible.ts';

/** What is wrong at one place of a document. All text in it is safe to show. */
export type Problem = {
	/** Like `straights[1].exit`; empty: the document as a whole. */
	path: string;
	/** Counted from 1, where they can be had. */
	line?: number;
	column?: number;
	found: string;
	allowed: string;
	hint?: string;
	/** The line of the document with a mark under the place. */
	excerpt?: string;
};

// Nobody reads more of them at once; the first ones cause the others as often as not.
const mostListed = 100;

/** One paragraph a problem: `FILE:LINE:COLUMN: PATH: found X; allowed Y. Hint`. */
export function describeProblems(file: string, problems: readonly Problem[]): string {
	const listed = problems.slice(0, mostListed).map(problem => describeProblem(file, problem));
	const left = problems.length - listed.length;
	if (left > 0) listed.push(`${visible(file)}: and ${left} more ${left === 1 ? 'problem' : 'problems'}`);
	return listed.join('\n');
}

function describeProblem(file: string, {path, line, column, found, allowed, hint, excerpt}: Problem): string {
	const place = [file, line, column].filter(part => part !== undefined).join(':');
	const sentence = `${path === '' ? '' : `${path}: `}found ${found}; allowed ${allowed}.`;
	const text = visible(`${place}: ${sentence}${hint === undefined ? '' : ` ${hint}`}`);
	return excerpt === undefined ? text : `${text}\n${excerpt.split('\n').map(visible).join('\n')}`;
}

// Enough to recognize what was written.
const longestShown = 60;

/** A value of a document as it is shown in a message: short, on one line, without control characters. */
export function shown(value: unknown): string {
	if (value === undefined) return 'nothing';
	if (Array.isArray(value)) return `a list of ${value.length}`;
	if (typeof value === 'object' && value !== null) return 'an object';
	if (typeof value !== 'string') return String(value);
	return `"${shortened(value)}"`;
}

/** Text cut to what a message can hold, without control characters. */
export function shortened(text: string): string {
	return visible(text.length > longestShown ? `${text.slice(0, longestShown - 1)}…` : text);
}

/** The path as people write it: `straights[1].exit`, names that are not plain words in brackets. */
export function pathText(path: readonly PropertyKey[]): string {
	let text = '';
	for (const part of path) {
		if (typeof part === 'number') text += `[${part}]`;
		else if (/^[\p{L}_][\p{L}\d_]*$/u.test(String(part))) text += `${text === '' ? '' : '.'}${shortened(String(part))}`;
		else text += `["${shortened(String(part))}"]`;
	}
	return text;
}
