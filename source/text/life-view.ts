/** What a race asks of the engine: turns, time above an RPM, time by RPM and gear. */
import type {EngineLife, LifeAnswer} from '../life/results.ts';
import {grouped} from '../planning/words.ts';
import {type Block, gap, text} from './blocks.ts';
import {comparisonView, type Figure, installedView, pairWords} from './comparison-view.ts';
import {dwellView} from './dwell-view.ts';
import {closingView, type Heading, headingView} from './heading-view.ts';
import {fixed, rpm, rpmUp, type Units} from './units.ts';

const minuteS = 60;

const figuresOf = ({aboveRpm, lapM}: LifeAnswer): Figure<EngineLife>[] => {
	const above = `above ${rpm(aboveRpm)} rpm`;
	const lap = lapM === null ? 'in the known part' : 'a lap';
	const turns = (value: number) => grouped(value);
	const seconds = (value: number) => fixed(value, 2);
	const minutes = (value: number) => fixed(value / minuteS, 1);
	const percent = (value: number) => `${fixed(100 * value, 1)} %`;
	return [
		{name: 'engine turns a race', value: each => each.turnsPerRace, write: turns},
		{name: `engine turns ${lap}`, value: each => each.turnsPerLap, write: turns, inPercent: true},
		{name: `${above}, min a race`, value: each => each.aboveRaceS, write: minutes},
		{name: `${above}, s ${lap}`, value: each => each.aboveLapS, write: seconds},
		{name: 'highest rpm', value: each => each.highestRpm, write: rpmUp},
		{name: 'mean rpm', value: each => each.meanRpm, write: rpm},
		{name: 'at full throttle', value: each => each.fullThrottleS / each.lapS, write: percent},
		{name: lapM === null ? 'the known part, s' : 'lap, s', value: each => each.lapS, write: seconds},
	];
};

/** "mean of 5 situations · 300 laps". */
export const aboutWords = ({
	situation,
	situations,
	laps,
}: Pick<LifeAnswer, 'situation' | 'situations' | 'laps'>): string =>
	[
		situation ?? (situations === 1 ? 'one situation' : `mean of ${situations} situations`),
		...(laps === null ? [] : [`${grouped(laps)} ${laps === 1 ? 'lap' : 'laps'}`]),
	].join(' · ');

/** "33/38 A* against 32/39 A". */
export const againstWords = (pairs: readonly {pair: string; gearbox: string; installed: boolean}[]): string =>
	pairs.map(pairWords).join(' against ');

export const lifeFigures = (answer: LifeAnswer): Block => comparisonView(answer.pairs, figuresOf(answer));

export const lifeView = (heading: Heading, answer: LifeAnswer, units: Units): Block[] => [
	...headingView(heading, `engine life, ${againstWords(answer.pairs)} · ${aboutWords(answer)}`, answer.setting, units),
	gap,
	lifeFigures(answer),
	gap,
	...dwellView(answer.pairs),
	gap,
	...installedView(answer.pairs),
	...answer.assumptions.map(each => text(`- ${each}`, 'plain', 2)),
	...closingView(answer.remarks),
];
