/** Two pictures of a log: in which gears it was driven, and a lap beside the model. */
import type {LapPicture, RatioPicture} from '../practice/learn/pictures.ts';
import type {Block} from './blocks.ts';
import {type Chart, drawChart, type Series, type Sign} from './chart.ts';
import type {Units} from './units.ts';

/** A chart in so many lines, as wide as there is room. */
export const picture = (chart: Chart, height: number): Block => ({
	kind: 'drawn',
	draw: (width, ascii) => drawChart(chart, {width, height, ascii}),
});

/** Engine speed over road speed: a hump a gear, and the gears of the pair that explains it best. */
export function ratioChart({points, gears}: RatioPicture): Chart {
	const highest = Math.max(1, ...points.map(([, samples]) => samples));
	const signs = gears.map(({gear, ratio}): Sign => ({x: ratio, y: 1.12 * highest, text: String(gear), tone: 'strong'}));
	return {
		x: {name: 'overall'},
		y: {name: 'samples at full throttle', include: [0]},
		series: [{name: '', mark: '*', tone: 'first', points}],
		signs,
	};
}

export const ratioTitle = (pair: string | undefined): string =>
	pair === undefined
		? 'Engine speed over road speed, as an overall ratio'
		: `Engine speed over road speed, as an overall ratio; the digits are the gears of ${pair}`;

/** Speed along a lap: the log, the model as it was, and as it is with what was learned. */
export function lapChart({logged, before, after}: LapPicture, units: Units): Chart {
	const scaled = (points: readonly (readonly [number, number])[]) =>
		points.map(([x, y]) => [inUnits(units, 'distance', x), inUnits(units, 'speed', y)] as const);
	// One line with gaps between the straights.
	const joined = (pieces: LapPicture['before']) =>
		pieces.flatMap(piece => [...scaled(piece), [Number.NaN, Number.NaN] as const]);
	const series: Series[] = [
		{name: '', mark: '.', tone: 'muted', points: scaled(logged)},
		{name: '', mark: '-', tone: 'second', dotted: true, points: joined(before)},
		{name: '', mark: 'o', tone: 'first', points: joined(after)},
	];
	return {x: {name: units.label('distance')}, y: {name: units.label('speed')}, series};
}

export const lapTitle = ({lap}: LapPicture): string => `Speed along lap ${lap}`;

/** The number in the units that are read, not rounded. */
function inUnits(units: Units, quantity: 'distance' | 'speed', value: number): number {
	return value * units.perSi(quantity);
}

export const lapLegend = 'dim: the log; solid over it: the model with what was learned; dotted: the model as it was.';
