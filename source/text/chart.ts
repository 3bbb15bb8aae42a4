/** A picture of lines over two labeled axes, as lines of text. What is not finite is a gap. */

import {Canvas} from './canvas.ts';
import {type Cell, cell, type Line, type Tone} from './cell.ts';
import {niceTicks, tickLabels} from './ticks.ts';
import {displayWidth} from './width.ts';

export type Point = readonly [x: number, y: number];

export type Series = {
	/** Stands at the end of the line. */
	readonly name: string;
	/** One ASCII character: how the line is drawn where there is no braille. */
	readonly mark: string;
	readonly tone: Tone;
	/** Drawn as single dots: tells two lines apart without color. */
	readonly dotted?: boolean;
	readonly points: readonly Point[];
};
/** A level line over the whole width, such as a limit. */
export type Level = {readonly y: number; readonly name: string};
/** A place with a sign, such as a shift. */
export type Sign = {readonly x: number; readonly y: number; readonly text: string; readonly tone: Tone};
export type Axis = {readonly name: string /** Always inside. */; readonly include?: readonly number[]};

export type Chart = {
	readonly x: Axis;
	readonly y: Axis;
	readonly series: readonly Series[];
	readonly levels?: readonly Level[];
	readonly signs?: readonly Sign[];
};

export type ChartSize = {readonly width: number; readonly height: number; readonly ascii: boolean};

/** A tick on the upright axis for so many lines, and one on the other for so many columns. */
const linesPerTick = 4;
const columnsPerTick = 12;
/** Axis, its numbers, and the name of the upright axis above. */
const linesAround = 3;

type Span = {readonly from: number; readonly to: number};

export function drawChart(chart: Chart, size: ChartSize): Line[] {
	const spans = spansOf(chart);
	if (spans === undefined) return [[cell('Nothing to draw.', 'muted')]];
	const rows = Math.max(2, size.height - linesAround);
	const yTicks = niceTicks(spans.y.from, spans.y.to, Math.max(2, Math.round(rows / linesPerTick)));
	const yLabels = tickLabels(yTicks);
	const gutter = Math.max(...yLabels.map(label => label.length)) + 1;
	const columns = Math.max(8, size.width - gutter - 1);
	const canvas = new Canvas(columns, rows, size.ascii);
	const place = {
		x: (value: number) => Math.round(((value - spans.x.from) / (spans.x.to - spans.x.from)) * (canvas.wide - 1)),
		y: (value: number) => Math.round(((spans.y.to - value) / (spans.y.to - spans.y.from)) * (canvas.high - 1)),
	};
	drawLevels(chart, canvas, place);
	drawSeries(chart, canvas, place);
	for (const {x, y, text, tone} of chart.signs ?? []) canvas.label(place.x(x), place.y(y), text, tone);
	for (const one of chart.series) nameLine(one, canvas, place);

	const {wide, high} = canvas.dotsPerCell;
	const labelOfRow = new Map(yTicks.map((tick, i) => [Math.floor(place.y(tick) / high), yLabels[i]!]));
	const body = canvas.lines().map((cells, row): Line => {
		const label = labelOfRow.get(row);
		return [cell(`${(label ?? '').padStart(gutter - 1)}${label === undefined ? ' │' : ' ┤'}`, 'muted'), ...cells];
	});
	const column = (value: number) => Math.floor(place.x(value) / wide);
	return [
		[cell(`${' '.repeat(gutter)}${chart.y.name}`, 'muted')],
		...body,
		...axisBelow(chart, spans.x, column, gutter, columns),
	];
}

function spansOf({x, y, series, levels = [], signs = []}: Chart): {x: Span; y: Span} | undefined {
	const points = series.flatMap(({points}) => points.filter(isFinitePoint));
	if (points.length === 0) return undefined;
	const ys = [...points.map(([, y]) => y), ...levels.map(({y}) => y), ...signs.map(({y}) => y)];
	return {
		x: spanOf([...points.map(([x]) => x), ...signs.map(({x}) => x), ...(x.include ?? [])]),
		y: spanOf([...ys, ...(y.include ?? [])]),
	};
}

const isFinitePoint = ([x, y]: Point) => Number.isFinite(x) && Number.isFinite(y);

/** A single value gets some room around it. */
function spanOf(values: readonly number[]): Span {
	let [from, to] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
	for (const value of values.filter(Number.isFinite)) [from, to] = [Math.min(from, value), Math.max(to, value)];
	return from < to ? {from, to} : {from: from - 1, to: to + 1};
}

type Place = {x: (value: number) => number; y: (value: number) => number};

function drawLevels({levels = []}: Chart, canvas: Canvas, place: Place): void {
	for (const {y} of levels) canvas.rule(place.y(y), '╌', 'muted');
	for (const {y, name} of levels) canvas.label(0, place.y(y), name, 'muted');
}

function drawSeries({series}: Chart, canvas: Canvas, place: Place): void {
	for (const one of series) {
		const pen = {mark: one.mark, tone: one.tone, ...(one.dotted && {every: 3})};
		let last: Point | undefined;
		for (const point of one.points) {
			if (isFinitePoint(point)) {
				const [fromX, fromY] = last ?? point;
				canvas.line(place.x(fromX), place.y(fromY), place.x(point[0]), place.y(point[1]), pen);
			}
			last = isFinitePoint(point) ? point : undefined;
		}
	}
}

/** The name stands at the end of its line, or further back where that place is taken. */
function nameLine({name, tone, points}: Series, canvas: Canvas, place: Place): void {
	const finite = points.filter(isFinitePoint);
	const {wide, high} = canvas.dotsPerCell;
	for (const share of [1, 0.85, 0.7, 0.5, 0.3]) {
		const point = finite[Math.round((finite.length - 1) * share)];
		if (point === undefined) return;
		const x = Math.max(0, place.x(point[0]) - (displayWidth(name) - 1) * wide);
		// Beside the line where it is long, on it where it is one digit.
		const y = Math.max(0, place.y(point[1]) - (displayWidth(name) > 1 ? high : 0));
		if (!canvas.isFree(x, y, displayWidth(name))) continue;
		canvas.label(x, y, name, tone);
		return;
	}
}

function axisBelow({x}: Chart, span: Span, column: (value: number) => number, gutter: number, columns: number): Line[] {
	const ticks = niceTicks(span.from, span.to, Math.max(2, Math.round(columns / columnsPerTick)));
	const labels = tickLabels(ticks);
	const rule = Array.from({length: columns}, () => '─');
	let below = ' '.repeat(columns);
	const name = ` ${x.name}`;
	for (const [i, tick] of ticks.entries()) {
		const at = Math.min(columns - 1, Math.max(0, column(tick)));
		rule[at] = '┬';
		const label = labels[i]!;
		const start = Math.min(columns - label.length, Math.max(0, at - Math.floor(label.length / 2)));
		const isClear = below.slice(Math.max(0, start - 1), start + label.length + 1).trim() === '';
		if (isClear) below = below.slice(0, start) + label + below.slice(start + label.length);
	}
	// The name of the axis takes the place of the last number where there is no room behind it.
	const numbers = below
		.slice(0, columns - displayWidth(name))
		.replace(/\S+$/, cut => (below[columns - displayWidth(name)] === ' ' ? cut : ''));
	const axis: Cell[] = [cell(`${' '.repeat(gutter)}└${rule.join('')}`, 'muted')];
	return [axis, [cell(`${' '.repeat(gutter + 1)}${numbers.padEnd(columns - displayWidth(name))}${name}`, 'muted')]];
}
