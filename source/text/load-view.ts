/** The load list as the person who packs the truck reads it: the pairs, what each is for, then every track. */
import type {LoadedPair, LoadedTrack, LoadList, Without} from '../loading/load-results.ts';
import {counted, highestText, secondsText} from '../planning/words.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {caution} from './heading-view.ts';
import {absent, fixed, type Units} from './units.ts';

export type LoadHeading = {car: string; day: string};

const percent = 100;

export const milesLeft = ({milesM, maxMilesM}: LoadedPair, units: Units): string =>
	maxMilesM === null ? absent : units.number('longDistance', maxMilesM - milesM);

const count = ({roles}: LoadedPair, isBest: boolean): string => {
	const number = roles.filter(({role}) => (role === 'best') === isBest).length;
	return number === 0 ? absent : String(number);
};

export const pairColumns = (units: Units): Making<LoadedPair>[] => [
	{head: 'carry', align: 'left', keep: 0, cell: pair => cell(pair.pair, 'strong')},
	{head: 'ratio', align: 'right', keep: 2, cell: pair => cell(fixed(pair.pairRatio, 4))},
	{head: 'sets', align: 'right', keep: 1, cell: pair => cell(String(pair.sets))},
	{head: `${units.label('longDistance')} left`, align: 'right', keep: 1, cell: pair => cell(milesLeft(pair, units))},
	{
		head: `races ${units.label('longDistance')}`,
		align: 'right',
		keep: 4,
		cell: ({raceM}) => cell(units.number('longDistance', raceM)),
	},
	{head: 'best at', align: 'right', keep: 3, cell: pair => cell(count(pair, true))},
	{head: 'step at', align: 'right', keep: 3, cell: pair => cell(count(pair, false))},
];

const steps = (pairs: readonly string[]): string => (pairs.length === 0 ? absent : pairs.join(' '));

export const trackColumns: readonly Making<LoadedTrack>[] = [
	{head: 'track', align: 'left', keep: 0, shortest: 10, cell: ({track}) => cell(track)},
	{head: 'taller', align: 'left', keep: 0, cell: ({taller}) => cell(steps(taller.toReversed()))},
	{head: 'best', align: 'left', keep: 0, cell: ({served}) => cell(`${served.pair} ${served.gearbox}`, 'strong')},
	{head: 'shorter', align: 'left', keep: 0, cell: ({shorter}) => cell(steps(shorter))},
	{
		head: 'off best s',
		align: 'right',
		keep: 1,
		cell: ({served}) => cell(served.lossS === null ? absent : fixed(served.lossS, 3)),
	},
	{head: 'very best', align: 'left', keep: 2, cell: ({best}) => cell(`${best.pair} ${best.gearbox}`, 'muted')},
	{head: 'choices', align: 'right', keep: 3, cell: ({choices}) => cell(String(choices), 'muted')},
];

/** "Without it Tarrowdale is 0.012 s a lap slower, with 34/35 C." */
export const withoutWords = (without: Without | null): string => {
	if (without === null) return '';
	const {track} = without;
	if (without.kind === 'nothing') return `Without it ${track} has no pair that passes.`;
	if (without.kind === 'slower')
		return `Without it ${track} is ${secondsText(without.lossS)} a lap slower, with ${without.pair} ${without.gearbox}.`;
	if (without.kind === 'nearest')
		return `Without it the nearest at ${track} is ${without.pair}, ${highestText(without.rpm)} rpm away.`;
	if (without.kind === 'noStep') return `Without it ${track} has nothing ${without.role} than ${without.than}.`;
	return `Without it the step ${without.role} at ${track} is ${without.pair}, ${highestText(without.rpm)} rpm further.`;
};

const stepWords = ({shorter, taller}: LoadList): string => {
	const parts = [
		...(shorter > 0 ? [`${counted(shorter, 'step')} shorter`] : []),
		...(taller > 0 ? [`${taller} taller`] : []),
	];
	return parts.length === 0 ? 'without steps' : `with ${parts.join(' and ')}`;
};

export const loadSummary = (list: LoadList): string =>
	`${counted(list.pairs.length, 'pair')} for ${counted(new Set(list.tracks.map(({track}) => track)).size, 'track')}, ${stepWords(list)}`;

export const loadMeaning = ({withinS, stepRatio}: LoadList): string =>
	[
		`A pair within ${fixed(withinS, 3)} s a lap of the best, with the same checks kept, stands for it`,
		stepRatio > 0
			? `ratios within ${Number((percent * stepRatio).toPrecision(4))} % are no step apart`
			: 'every other ratio is a step',
		'no shorter list does all of this.',
	].join('; ');

/** All but heading and caution. */
export const loadBlocks = (list: LoadList, units: Units): Block[] => [
	text(loadSummary(list), 'plain', 2),
	text(loadMeaning(list), 'muted', 2),
	gap,
	tableOf(pairColumns(units), list.pairs),
	text('races: of the tracks that it is the best for; step at: tracks that it is a step for', 'muted', 2),
	gap,
	...list.pairs.map(pair => text(`${pair.pair}  ${pair.reason} ${withoutWords(pair.without)}`.trimEnd(), 'plain', 7)),
	gap,
	tableOf(trackColumns, list.tracks),
	text('off best s: a lap more than the very best of the rack; choices: pairs that would do as the best', 'muted', 2),
	gap,
	...(list.short.length === 0
		? []
		: [text('Short', 'near'), ...list.short.map(one => text(`- ${one}`, 'plain', 2)), gap]),
];

export const loadView = (heading: LoadHeading, list: LoadList, units: Units): Block[] => [
	text(`${heading.car} · ${heading.day} · load list`, 'strong', 2),
	...loadBlocks(list, units),
	text(caution, 'muted'),
];
