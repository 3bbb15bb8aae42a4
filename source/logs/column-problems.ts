/** What is wrong with the columns, with the option that answers it. */
import {nearest} from '../documents/nearest.ts';
import {shortened} from '../documents/problem.ts';
import type {ChannelName} from './channels.ts';
import {columnOption} from './column-option.ts';
import type {FoundAsked} from './find-asked.ts';
import {usualNames} from './header-names.ts';
import {nameFor, valueFor} from './header-values.ts';
import type {Header} from './headers.ts';
import {unitChoices} from './log-units.ts';
import type {LogProblem} from './reading.ts';

export type ColumnProblem = LogProblem & {readonly channel: ChannelName};

const mostListed = 24;

const required = 'speed, rpm, and one of time and distance';

export function missing(channel: ChannelName, headers: readonly Header[]): ColumnProblem {
	const near = nearestHeader(channel, headers);
	const what = channel === 'time' ? 'time or distance' : channel;
	return {
		kind: 'missing',
		channel,
		where: `the column of ${what}`,
		found: `no such column; the headers are ${listed(headers)}`,
		allowed: `${required}; a header such as ${usualNames[channel]}`,
		do: near
			? `If it is "${shortened(near.written)}": ${optionFor(channel, near, headers)}.`
			: `Say which column it is: ${columnOption(channel, 'HEADER')}.`,
		choice: {channel, values: headers.map(header => valueFor(header, headers))},
	};
}

export function ambiguous(
	channel: ChannelName,
	candidates: readonly Header[],
	headers: readonly Header[],
): ColumnProblem {
	const isRequired = channel === 'speed' || channel === 'rpm';
	const values = candidates.map(header => valueFor(header, headers));
	const options = values.map(value => columnOption(channel, value));
	return {
		kind: 'ambiguous',
		channel,
		where: `the column of ${channel}`,
		found: `${candidates.length} columns that it may be: ${firstOf(candidates.map(named))}`,
		allowed: 'one of them',
		do: `Say which: ${firstOf(options, ', or ')}${isRequired ? '' : `; without it: ${columnOption(channel, 'none')}`}.`,
		choice: {channel, values: isRequired ? values : [...values, 'none']},
	};
}

export function wrongAsked(
	channel: ChannelName,
	wish: string,
	found: Extract<FoundAsked, {kind: 'several' | 'nothing'}>,
	headers: readonly Header[],
): ColumnProblem {
	if (found.kind === 'several') return {...ambiguous(channel, found.headers, headers), kind: 'asked'};
	const near = nearest(
		wish,
		headers.map(({written}) => written),
	);
	return {
		kind: 'asked',
		channel,
		where: `the column of ${channel}`,
		found: `no header "${shortened(wish)}"; the headers are ${listed(headers)}`,
		allowed:
			'a header as it stands in the log, its number as in #3, with or without a unit as in "Speed [mph]", or none',
		do: near === undefined ? 'Name one of them.' : `Did you mean "${shortened(near)}"?`,
		choice: {channel, values: headers.map(header => valueFor(header, headers))},
	};
}

export function takenTwice(
	channel: ChannelName,
	other: ChannelName,
	header: Header,
	headers: readonly Header[],
): ColumnProblem {
	return {
		kind: 'asked',
		channel,
		where: `the column of ${channel}`,
		found: `${named(header)}, which is ${other} already`,
		allowed: 'a column of its own for each',
		do: `Name another one for ${channel} or for ${other}, or leave one out: ${columnOption(channel, 'none')}.`,
		choice: {channel, values: headers.filter(one => one !== header).map(one => valueFor(one, headers))},
	};
}

/** A column of numbers that say nothing without their unit. */
export function withoutUnit(channel: ChannelName, header: Header, headers: readonly Header[]): ColumnProblem {
	const values = unitChoices(channel).map(unit => `${nameFor(header, headers)} [${unit}]`);
	return {
		kind: 'unit',
		channel,
		where: `the column of ${channel}, ${named(header)}`,
		found: 'no unit, neither in the header, nor in a row under it, nor in the cells',
		allowed: unitChoices(channel).join(', '),
		do: `Say which: ${columnOption(channel, values[0]!)}, with the unit in the brackets.`,
		choice: {channel, values},
	};
}

export function unknownUnit(
	channel: ChannelName,
	header: Header,
	unit: string,
	headers: readonly Header[],
): ColumnProblem {
	const choices = unitChoices(channel);
	const example = columnOption(channel, `${nameFor(header, headers)} [${choices[0] ?? 'unit'}]`);
	return {
		...withoutUnit(channel, header, headers),
		found: `the unit "${shortened(unit)}"`,
		do: `If the numbers are in another unit than the log says: ${example}, with the unit in the brackets.`,
	};
}

const optionFor = (channel: ChannelName, header: Header, headers: readonly Header[]): string =>
	columnOption(channel, valueFor(header, headers));

const named = ({written, column}: Header): string =>
	written === '' ? `#${column} without a header` : `"${shortened(written)}" (#${column})`;

const listed = (headers: readonly Header[]): string => firstOf(headers.map(({written}) => `"${shortened(written)}"`));

/** As many as a message lists. */
function firstOf(texts: readonly string[], between = ', '): string {
	const left = texts.length - mostListed;
	return `${texts.slice(0, mostListed).join(between)}${left > 0 ? ` and ${left} more` : ''}`;
}

/** The header that is spelled most like a usual one. */
function nearestHeader(channel: ChannelName, headers: readonly Header[]): Header | undefined {
	const free = headers.filter(header => header.channel === undefined && header.written !== '');
	for (const usual of usualNames[channel].split(', ')) {
		const near = nearest(
			usual,
			free.map(({name}) => name),
		);
		if (near !== undefined) return free.find(({name}) => name === near);
	}
	return free.find(({name}) => name.toLowerCase().includes(channel));
}
