/** The pictures, each for the question that it answers. */

import type {TracePoint} from '../../drivetrain/speed-trace.ts';
import {type Curve, gearCurves, traceOf} from '../../planning/pictures.ts';
import type {Ranked} from '../../planning/rank-rack.ts';
import type {RpmPoint, StraightResult} from '../../planning/results.ts';
import {pointsOf} from '../../planning/rpm-table.ts';
import type {RowRun} from '../../planning/run-row.ts';
import {type Chart, type ChartSize, drawChart, type Point, type Series, type Sign} from '../../text/chart.ts';
import {type Quantity, rpm, signed, type UnitSystem, unitsOf} from '../../text/units.ts';
import {line, type Pieces} from '../parts/pieces.ts';
import type {Placed} from '../session/rows.ts';
import type {Picture} from '../session/session.ts';

export type PictureGiven = {
	readonly ranked: Ranked;
	readonly here: Placed;
	readonly compared: Placed | undefined;
	readonly situation: string | undefined;
	readonly straight: number;
	readonly units: UnitSystem;
};

type Drawn = {readonly title: string; readonly chart: Chart | undefined; readonly notes: readonly string[]};

/** Title, picture, and what the letters in it stand for. */
export function pictureView(picture: Picture, given: PictureGiven, size: ChartSize): Pieces[] {
	const {title, chart, notes} = makers[picture](given);
	const drawn =
		chart === undefined
			? [line('Nothing to draw.', 'muted')]
			: drawChart(chart, {...size, height: size.height - 1 - notes.length});
	return [line(title, 'strong'), ...drawn, ...notes.map(note => line(note, 'muted'))];
}

const makers: Record<Picture, (given: PictureGiven) => Drawn> = {
	rpm: rpmPicture,
	thrust: thrustPicture,
	speed: speedPicture,
};

/** In what the speeds are read; an RPM stays an RPM. */
function readIn(units: UnitSystem) {
	const words = unitsOf(units);
	const number = (quantity: Quantity, value: number) => scale(quantity, units) * value;
	return {label: words.label, number};
}

const sizes: Record<UnitSystem, Partial<Record<Quantity, number>>> = {
	us: {speed: 1 / 0.44704, distance: 1 / 0.3048},
	metric: {speed: 3.6, distance: 1},
};
const forces: Record<UnitSystem, {label: string; size: number}> = {
	us: {label: 'lbf', size: 1 / 4.4482216152605},
	metric: {label: 'kN', size: 1e-3},
};
const scale = (quantity: Quantity, units: UnitSystem): number => sizes[units][quantity] ?? 1;

const runOf = ({runs}: Ranked, {name}: Placed): RowRun | undefined => runs.get(name);
const situationOf = ({here, situation}: PictureGiven): string => situation ?? here.row.situations[0]?.name ?? '';
const straightIn = (given: PictureGiven, placed: Placed): StraightResult | undefined =>
	placed.row.situations.find(({name}) => name === situationOf(given))?.straights[given.straight];

/** Is the engine in its band at every point of the track, and under the limit? */
function rpmPicture(given: PictureGiven): Drawn {
	const {ranked, here, units} = given;
	const run = runOf(ranked, here);
	const {setting} = ranked.ranking;
	const read = readIn(units);
	const points = run === undefined ? [] : pointsOf(run, ranked.ground).filter(point => isIn(point, situationOf(given)));
	const used = [...new Set(points.flatMap(({gear}) => gear ?? []))].sort((a, b) => a - b);
	const curves = run && gearCurves(run, ranked.ground, situationOf(given), 0);
	const speeds = points.map(({speedMps}) => speedMps);
	const [slowest, fastest] = [Math.min(...speeds) * 0.9, Math.max(...speeds) * 1.05];
	const series = used.map((gear): Series => {
		const inside = (curves?.rpm[gear - 1] ?? []).filter(([speed]) => speed >= slowest && speed <= fastest);
		return {name: `gear ${gear}`, mark: String(gear), tone: 'plain', points: scaled(inside, scale('speed', units), 1)};
	});
	const signs = points.flatMap((point): Sign[] => {
		const value = point.gear === null ? undefined : point.rpm[point.gear - 1];
		return value === undefined
			? []
			: [{x: read.number('speed', point.speedMps), y: value, text: letterOf(point), tone: 'strong'}];
	});
	const levels = [
		{y: setting.rpmLimit, name: `limit ${rpm(setting.rpmLimit)} `},
		{y: setting.bandLowRpm, name: `band from ${rpm(setting.bandLowRpm)} `},
	];
	return {
		title: `RPM over speed, ${here.name}, ${situationOf(given)}`,
		chart: {x: {name: read.label('speed')}, y: {name: 'rpm'}, series, levels, signs},
		notes: ['m minimum  x exit  T top  E entry  M measured'],
	};
}

/** Points under full throttle and around it; pit road and restart would press the rest together. */
const isIn = ({situation, at}: RpmPoint, name: string) => situation === name && at !== 'restart';

/** The last word of a point says what it is. */
function letterOf({at}: RpmPoint): string {
	const letters: Record<string, string> = {minimum: 'm', exit: 'x', top: 'T', end: 'T', entry: 'E', measured: 'M'};
	return letters[at.split(' ').at(-1) ?? ''] ?? 'x';
}

/** Which gear pulls most at each speed, where do shifts fall, and where is nothing left? */
function thrustPicture(given: PictureGiven): Drawn {
	const {ranked, here, units} = given;
	const run = runOf(ranked, here);
	const curves = run && gearCurves(run, ranked.ground, situationOf(given), given.straight);
	const straight = straightIn(given, here);
	const read = readIn(units);
	if (curves === undefined || straight === undefined)
		return {title: 'Thrust and resistance', chart: undefined, notes: []};
	const across = scale('speed', units);
	const force = forces[units];
	const gear = (curve: Curve, i: number): Series => ({
		name: `${i + 1}`,
		mark: String(i + 1),
		tone: 'plain',
		points: scaled(curve, across, force.size),
	});
	const series: Series[] = [
		...curves.thrustN.map(gear),
		{name: 'resistance', mark: '.', tone: 'second', points: scaled(curves.resistanceN, across, force.size)},
		{name: 'grip', mark: ':', tone: 'muted', dotted: true, points: scaled(curves.gripN, across, force.size)},
	];
	const signs = straight.shifts.map((shift): Sign => {
		const thrust = valueNear(curves.thrustN[shift.from - 1]!, shift.speedMps);
		return {x: read.number('speed', shift.speedMps), y: thrust * force.size, text: 'S', tone: 'strong'};
	});
	const shifts = straight.shifts.map(
		({from, rpm: at, speedMps}) => `${from}-${from + 1} at ${rpm(at)} rpm, ${unitsOf(units).text('speed', speedMps)}`,
	);
	return {
		title: `Thrust and resistance over speed, ${here.name}, ${straight.name}, ${situationOf(given)}`,
		chart: {x: {name: read.label('speed')}, y: {name: force.label, include: [0]}, series, signs},
		notes: [shifts.length > 0 ? `S shift: ${shifts.join('; ')}` : 'No shift on this straight.'],
	};
}

/** Where on the straight is this pair ahead of the other? */
function speedPicture(given: PictureGiven): Drawn {
	const {here, compared, units} = given;
	const straight = straightIn(given, here);
	const title = `Speed along ${straight?.name ?? 'the straight'}, ${here.name}, ${situationOf(given)}`;
	const mine = traceIn(given, here);
	if (mine === undefined || straight === undefined)
		return {
			title,
			chart: undefined,
			notes: ['No run here: the straight has no length, or the car does not get through.'],
		};
	const read = readIn(units);
	const other = compared && compared.name !== here.name ? compared : undefined;
	const its = other && traceIn(given, other);
	const along = (trace: readonly TracePoint[]): Point[] =>
		trace.map(({distanceM, speedMps}) => [read.number('distance', distanceM), read.number('speed', speedMps)]);
	const series: Series[] = [
		...(its ? [{name: other!.name, mark: '.', tone: 'second' as const, dotted: true, points: along(its)}] : []),
		{name: here.name, mark: 'o', tone: 'first', points: along(mine)},
	];
	const signs = straight.shifts.map(
		({distanceM, speedMps}): Sign => ({
			x: read.number('distance', distanceM),
			y: read.number('speed', speedMps),
			text: 'S',
			tone: 'strong',
		}),
	);
	const notes = [`S shift  gears ${[straight.exitGear, ...straight.shifts.map(({from}) => from + 1)].join('-')}`];
	if (its) notes.push(aheadWords(mine, its, given, other!.name));
	return {title, chart: {x: {name: read.label('distance')}, y: {name: read.label('speed')}, series, signs}, notes};
}

function traceIn(given: PictureGiven, placed: Placed): TracePoint[] | undefined {
	const run = runOf(given.ranked, placed);
	return run && traceOf(run, given.ranked.ground, situationOf(given), given.straight);
}

/** Ahead in time at the thirds of the way: two lines of speed lie too near each other to see it. */
function aheadWords(
	mine: readonly TracePoint[],
	its: readonly TracePoint[],
	{units}: PictureGiven,
	name: string,
): string {
	const words = unitsOf(units);
	const at = [1 / 3, 2 / 3, 1].map(share => Math.round((mine.length - 1) * share));
	const parts = at.map(i => {
		const ahead = signed(its[i]!.timeS - mine[i]!.timeS, 3);
		return `${ahead} at ${words.text('distance', mine[i]!.distanceM)}`;
	});
	return `Seconds ahead of ${name}: ${parts.join(', ')}`;
}

const scaled = (curve: Curve, x: number, y: number): Point[] => curve.map(([a, b]) => [a * x, b * y]);

function valueNear(curve: Curve, x: number): number {
	return curve.reduce((best, point) => (Math.abs(point[0] - x) < Math.abs(best[0] - x) ? point : best), curve[0]!)[1];
}
