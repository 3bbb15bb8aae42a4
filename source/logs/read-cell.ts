/** One cell as text: what the fast way over the bytes leaves. */
import type {ChannelName} from './channels.ts';
import {clockS} from './clock.ts';
import {logUnit} from './log-units.ts';

export type CellRule = {
	readonly channel: ChannelName;
	/** To SI, for a number without a unit; undefined where such a number says nothing. */
	readonly factor: number | undefined;
};

export type Cell =
	| {readonly kind: 'value'; readonly value: number; readonly unit?: string}
	| {readonly kind: 'empty'}
	| {readonly kind: 'text'};

/** Which mark a file has before the fraction: undefined until the first one is seen. */
export type Decimals = {mark: '.' | ',' | undefined};

const number = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eE][+-]?\d+)?/;
const nothing = /^(?:|-+|\?+|nan|null|nil|none|n\/a|na|#n\/a)$/i;
/** Beyond this nothing is measured, and sums would lose their digits. */
const largest = 1e15;
/** Longer is no number, and no time. */
const longestCell = 60;

const empty: Cell = {kind: 'empty'};
const text: Cell = {kind: 'text'};

export function readCell(cell: string, {channel, factor}: CellRule, decimals: Decimals): Cell {
	const trimmed = cell.trim();
	if (nothing.test(trimmed)) return empty;
	if (trimmed.length > longestCell) return text;
	const digits = number.exec(trimmed)?.[0];
	if (digits === undefined)
		return channel === 'gear' && /^n(eutral)?$/i.test(trimmed) ? {kind: 'value', value: 0} : text;
	const rest = trimmed.slice(digits.length).trimStart();
	if (channel === 'time' && rest.startsWith(':')) return valueOr(clockS(trimmed));
	if (channel === 'time' && rest.startsWith('-')) return valueOr(clockS(trimmed));
	const value = numberFrom(digits, decimals);
	if (rest === '') return factor === undefined ? text : valueOr(value * factor);
	const unit = logUnit(rest, channel);
	return unit === undefined ? text : valueOr(value * unit.factor, unit.name);
}

function valueOr(value: number, unit?: string): Cell {
	return Math.abs(value) <= largest ? {kind: 'value', value, ...(unit !== undefined && {unit})} : text;
}

/** NaN where the number has the other mark than those before it. */
function numberFrom(digits: string, decimals: Decimals): number {
	const mark = digits.includes(',') ? ',' : digits.includes('.') ? '.' : undefined;
	if (mark === undefined) return Number(digits);
	decimals.mark ??= mark;
	return mark === decimals.mark ? Number(digits.replace(',', '.')) : Number.NaN;
}
