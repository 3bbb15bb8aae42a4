import fc from 'fast-check';
import {describe, expect, test} from 'vitest';
import {shown} from '../../source/screens/parts/theme.ts';
import {type Chart, drawChart, type Point} from '../../source/text/chart.ts';
import {niceTicks, tickLabels} from '../../source/text/ticks.ts';
import {displayWidth} from '../../source/text/width.ts';
import {runs} from '../runs.ts';

const plain = (chart: Chart, width: number, height: number, ascii: boolean): string[] =>
	drawChart(chart, {width, height, ascii}).map(pieces =>
		pieces
			.map(({text}) => shown(text, {color: false, ascii}))
			.join('')

			.trimEnd(),
	);

const line = (points: readonly Point[], mark = 'o'): Chart['series'][number] => ({
	name: mark,
	mark,
	tone: 'plain',
	points,
});
const chart = (...series: Chart['series'][number][]): Chart => ({x: {name: 'mph'}, y: {name: 'rpm'}, series});

const rising = chart(
	line([
		[0, 0],
		[10, 5],
		[20, 10],
	]),
);

describe('niceTicks', () => {
	test('are multiples of 1, 2, 2.5 or 5', () => {
		expect(niceTicks(0, 10, 5)).toEqual([0, 2, 4, 6, 8, 10]);
		expect(niceTicks(3100, 9050, 6)).toEqual([4000, 5000, 6000, 7000, 8000, 9000]);
		expect(niceTicks(-0.03, 0.02, 5)).toEqual([-0.03, -0.02, -0.01, 0, 0.01, 0.02]);
	});
	test('end where numbers are too near each other to have round ones between', () => {
		expect(niceTicks(5e-324, 1e-323, 5)).toHaveLength(1);
		expect(niceTicks(1e17, 1e17 + 16, 5)).toHaveLength(1);
	});
	test('of a single value are that value, of nothing nothing', () => {
		expect(niceTicks(5, 5, 4)).toEqual([5]);
		expect(niceTicks(Number.NaN, 1, 4)).toEqual([]);
	});
	test('have the digits that the finest of them needs', () => {
		expect(tickLabels([0, 2.5, 5])).toEqual(['0.0', '2.5', '5.0']);
		expect(tickLabels([-0, 1000])).toEqual(['0', '1000']);
	});
});

test('a rising line in ASCII, with both axes, their numbers and names', () => {
	expect(plain(rising, 26, 9, true)).toEqual([
		'   rpm',
		'10 +                    oo',
		'   |                 ooo',
		'   |             oooo',
		' 5 +         oooo',
		'   |   oooooo',
		' 0 +ooo',
		'   ++----------+---------+',
		'    0         10       mph',
	]);
});

test('the same in braille', () => {
	expect(plain(rising, 26, 9, false)).toEqual([
		'   rpm',
		'10 ┤                  ⢀⡠⠔o',
		'   │               ⣀⠤⠒⠁',
		'   │           ⢀⡠⠔⠊',
		' 5 ┤        ⣀⠤⠒⠁',
		'   │    ⣀⠤⠒⠉',
		' 0 ┤⣀⠤⠒⠉',
		'   └┬──────────┬─────────┬',
		'    0         10       mph',
	]);
});

test('the lines of a picture are as many and as wide as asked for', () => {
	for (const ascii of [false, true])
		for (const [width, height] of [
			[40, 10],
			[80, 18],
			[140, 40],
		] as const) {
			const lines = plain(
				chart(
					line([
						[0, 3000],
						[100, 9000],
					]),
				),
				width,
				height,
				ascii,
			);
			expect(lines).toHaveLength(height);
			for (const one of lines) expect(displayWidth(one)).toBeLessThanOrEqual(width);
		}
});

test('in ASCII there is nothing else', () => {
	const drawn = {
		...chart(
			line([
				[0, 1],
				[9, 4],
			]),
		),
		levels: [{y: 3, name: 'limit'}],
	};
	expect(plain(drawn, 50, 12, true).join('')).toMatch(/^[\x20-\x7e]*$/);
});

test('what is not finite is a gap, and does not stretch the axes', () => {
	const gap = plain(
		chart(
			line([
				[0, 0],
				[4, 0],
				[5, Number.NaN],
				[6, 0],
				[10, 0],
				[Number.POSITIVE_INFINITY, 3],
				[3, Number.NEGATIVE_INFINITY],
			]),
		),
		33,
		5,
		true,
	);
	const drawn = gap.find(one => one.includes('oo'))!;
	expect(drawn).toMatch(/o+ +o+/);
	expect(gap.at(-1)).toContain('mph');
});

test('nothing finite is said in words', () => {
	expect(plain(chart(line([])), 40, 10, false)).toEqual(['Nothing to draw.']);
	expect(plain(chart(line([[Number.NaN, 1]])), 40, 10, false)).toEqual(['Nothing to draw.']);
});

test('a single point is drawn', () => {
	expect(plain(chart(line([[5, 5]])), 30, 8, true).join('')).toContain('o');
});

test('a level has its name, and gives way to a line', () => {
	const drawn = plain(
		{
			...chart(
				line([
					[0, 0],
					[10, 10],
				]),
			),
			levels: [{y: 5, name: 'limit '}],
		},
		40,
		12,
		true,
	);
	const level = drawn.find(one => one.includes('limit'))!;
	expect(level).toMatch(/limit -+o+-+/);
});

test('a sign outside of the lines widens the axes to it', () => {
	const signs = [{x: 50, y: 20, text: 'M', tone: 'strong'}] as const;
	expect(
		plain(
			{
				...chart(
					line([
						[0, 0],
						[10, 10],
					]),
				),
				signs,
			},
			40,
			12,
			true,
		)[1],
	).toMatch(/M$/);
});

test('any numbers at any size end in a picture of that size', () => {
	const value = fc.oneof(
		fc.double(),
		fc.integer({min: -1000, max: 1000}),
		fc.constantFrom(0, -0, 1e300, -1e300, 5e-324),
	);
	fc.assert(
		fc.property(
			fc.array(fc.tuple(value, value), {maxLength: 20}),
			fc.integer({min: 20, max: 160}),
			fc.integer({min: 6, max: 50}),
			fc.boolean(),
			(points, width, height, ascii) => {
				const drawn = plain(
					{...chart(line(points)), signs: points.slice(0, 2).map(([x, y]) => ({x, y, text: 'S', tone: 'plain'}))},
					width,
					height,
					ascii,
				);
				expect([1, height]).toContain(drawn.length);
			},
		),
		{numRuns: runs(200, 10_000)},
	);
});
