/** Which gears to build, as the person at the bench reads it: the sets, how their gears overlap, the checks. */
import type {BuiltRow, CommonSet, GearboxAnswer, GearStep, TrackGears} from '../loading/gearbox-results.ts';
import {checkNames} from '../planning/check-names.ts';
import {counted, secondsText} from '../planning/words.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {checkView} from './check-view.ts';
import {caution, verdictCell} from './heading-view.ts';
import {absent, fixed, rpm, rpmDown, seconds, signed, type Units} from './units.ts';

/** Ratios in columns of their own are read across sets. */
export const ratiosText = (ratios: readonly number[]): string => ratios.map(ratio => fixed(ratio, 3)).join(' ');

const setName = ({gearbox, ratios}: {gearbox: string; ratios: readonly number[]}): string =>
	gearbox === ratios.join(' ') ? '' : gearbox;

const causes = ({verdict, checks}: BuiltRow): string =>
	checks
		.filter(check => verdict !== 'pass' && check.verdict === verdict)
		.map(({check}) => checkNames[check])
		.join(', ');

const usedText = ({used}: BuiltRow): string =>
	used === null ? absent : used.lowest === used.highest ? `${used.lowest}` : `${used.lowest}-${used.highest}`;

export const rowColumns: readonly Making<BuiltRow>[] = [
	{head: 'gears', align: 'left', keep: 0, cell: row => cell(ratiosText(row.ratios), 'strong')},
	{head: 'is set', align: 'left', keep: 5, cell: row => cell(setName(row))},
	{head: 'pair', align: 'left', keep: 0, cell: row => cell(row.pair, 'strong')},
	{head: 'time s', align: 'right', keep: 1, cell: row => cell(seconds(row.fastestS))},
	{head: 'behind s', align: 'right', keep: 2, cell: row => cell(seconds(row.behindS))},
	{head: 'used', align: 'left', keep: 3, cell: row => cell(usedText(row))},
	{head: 'change', align: 'right', keep: 4, cell: row => cell(row.changes === null ? absent : String(row.changes))},
	{head: 'verdict', align: 'left', keep: 0, cell: row => verdictCell(row.verdict)},
	{head: 'because of', align: 'left', keep: 6, shortest: 12, cell: row => cell(causes(row), 'muted')},
];

export const stepColumns: readonly Making<GearStep>[] = [
	{head: 'shift', align: 'left', keep: 0, cell: ({from}) => cell(`${from}-${from + 1}`, 'strong')},
	{head: 'step', align: 'right', keep: 1, cell: ({step}) => cell(fixed(step, 3))},
	{head: 'from rpm', align: 'right', keep: 1, cell: one => cell(rpmDown(one.rpm))},
	{head: 'to rpm', align: 'right', keep: 0, cell: ({rpmAfter}) => cell(rpm(rpmAfter))},
	{
		head: 'over band',
		align: 'right',
		keep: 0,
		cell: ({overBandRpm}) => cell(signed(overBandRpm, 0), overBandRpm < 0 ? 'near' : 'plain'),
	},
	{head: 'driven', align: 'left', keep: 2, cell: ({used}) => cell(used ? 'yes' : 'no', 'muted')},
];

/** "0.021 s a lap faster than 33/36 B, the best of the sets that are built" */
export const ownWords = ({rows, own}: TrackGears): string => {
	const [best] = rows;
	if (best === undefined || own === null) return '';
	const name = `${own.pair} ${own.gearbox}, the best of the sets that are built`;
	if (best.verdict === 'fail') return 'Every set fails a check here; this is the fastest.';
	if (own.verdict === 'fail') return `Every set that is built fails a check here.`;
	if (own.fastestS === null || best.fastestS === null) return '';
	const gainS = own.fastestS - best.fastestS;
	return gainS < 0.0005 ? `No faster than ${name}.` : `${secondsText(gainS)} a lap faster than ${name}.`;
};

const settingWords = ({setting}: TrackGears): string =>
	`  limit ${rpm(setting.rpmLimit)} rpm (${setting.limitFrom}), band ${rpm(setting.bandLowRpm)}-${rpm(setting.bandHighRpm)}, engine ${setting.engine}`;

const overlapWords =
	'highest planned shifts, and what the next gear turns above the low end of the band; driven: on the straights or the restart.';

const trackView = (track: TrackGears, units: Units): Block[] => {
	const [best] = track.rows;
	if (best === undefined) return [text(`${track.track} · nothing to build`, 'strong', 2), gap];
	return [
		text(`${track.track} · ${counted(track.sets, 'set')} · ${ownWords(track)}`, 'strong', 2),
		text(settingWords(track), 'muted', 4),
		tableOf(rowColumns, track.rows, 2),
		gap,
		text(`Overlap of the best set: ${overlapWords}`, 'muted', 2),
		tableOf(stepColumns, best.steps, 2),
		gap,
		...checkView(best.checks, units),
		gap,
	];
};

type CommonTrack = CommonSet['tracks'][number];

export const commonTrackColumns: readonly Making<CommonTrack>[] = [
	{head: 'track', align: 'left', keep: 0, shortest: 10, cell: ({track}) => cell(track)},
	{head: 'pair', align: 'left', keep: 0, cell: ({row}) => cell(row.pair, 'strong')},
	{head: 'time s', align: 'right', keep: 1, cell: ({row}) => cell(seconds(row.fastestS))},
	{head: 'costs s', align: 'right', keep: 0, cell: ({costS}) => cell(fixed(costS, 3))},
	{head: 'used', align: 'left', keep: 3, cell: ({row}) => cell(usedText(row))},
	{head: 'verdict', align: 'left', keep: 0, cell: ({row}) => verdictCell(row.verdict)},
	{head: 'because of', align: 'left', keep: 6, shortest: 12, cell: ({row}) => cell(causes(row), 'muted')},
];

export const commonColumns: readonly Making<CommonSet>[] = [
	{head: 'gears', align: 'left', keep: 0, cell: set => cell(ratiosText(set.ratios), 'strong')},
	{head: 'is set', align: 'left', keep: 3, cell: set => cell(setName(set))},
	{head: 'all laps s', align: 'right', keep: 1, cell: ({totalS}) => cell(seconds(totalS))},
	{head: 'behind s', align: 'right', keep: 0, cell: ({behindS}) => cell(fixed(behindS, 3))},
	{head: 'change', align: 'right', keep: 2, cell: ({changes}) => cell(changes === null ? absent : String(changes))},
];

const commonView = (common: readonly CommonSet[]): Block[] => {
	const [best] = common;
	if (best === undefined) return [];
	const cost = best.tracks.reduce((sum, {costS}) => sum + costS, 0);
	return [
		text(`One set for all · costs ${secondsText(cost)} over a lap of each, against the best set there`, 'strong', 2),
		tableOf(commonColumns, common, 2),
		gap,
		tableOf(commonTrackColumns, best.tracks, 2),
		gap,
		text(`Overlap at ${best.tracks[0]!.track}: ${overlapWords}`, 'muted', 2),
		tableOf(stepColumns, best.tracks[0]!.row.steps, 2),
		gap,
	];
};

/** All but heading and caution. */
export const gearboxBlocks = (answer: GearboxAnswer, units: Units): Block[] => [
	text(`${counted(answer.sets, 'set')} of the inventory go together; every one with every pair was run.`, 'plain', 2),
	text(
		'Sets that differ only in gears that nothing is gained with are told once; change: gears to change in the installed set.',
		'muted',
		2,
	),
	gap,
	...commonView(answer.common),
	...answer.tracks.flatMap(track => trackView(track, units)),
	...answer.remarks.map(remark => text(`- ${remark}`, 'plain', 2)),
];

export const gearboxView = (heading: {car: string; day: string}, answer: GearboxAnswer, units: Units): Block[] => [
	text(`${heading.car} · ${heading.day} · gears to build`, 'strong', 2),
	...gearboxBlocks(answer, units),
	text(caution, 'muted'),
];
