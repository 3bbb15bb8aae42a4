/** Everything about one row: the reason, every check, each straight, RPM at every point; beside the compared row where there is one. */

import type {Ranked} from '../../planning/rank-rack.ts';
import type {Row, RpmPoint} from '../../planning/results.ts';
import {pointsOf} from '../../planning/rpm-table.ts';
import {type Block, cell, gap, line, text} from '../../text/blocks.ts';
import {checkView} from '../../text/check-view.ts';
import {layOut} from '../../text/layout.ts';
import {situationView} from '../../text/run-view.ts';
import {fixed, rpmDown, type Units} from '../../text/units.ts';
import type {Pieces} from '../parts/pieces.ts';
import type {Placed} from '../session/rows.ts';
import {differenceView} from './difference-view.ts';
import {pointsView} from './points-view.ts';
import {timeWords} from './reason-view.ts';

export type Why = {
	readonly ranked: Ranked;
	readonly here: Placed;
	readonly compared: Placed | undefined;
	readonly units: Units;
};

/** The checks first, as they say most in the fewest lines. */
export const whyView = (why: Why, width: number): Pieces[] => layOut(whyBlocks(why), width);

/** The two halves that stand beside each other where there is room. */
export const whyHalves = (why: Why, left: number, right: number): [Pieces[], Pieces[]] => [
	layOut([...headBlocks(why), gap, ...checkBlocks(why), gap, ...compareBlocks(why), ...pitBlocks(why.here.row)], left),
	layOut([...straightBlocks(why), ...pointBlocks(why)], right),
];

const whyBlocks = (why: Why): Block[] => [
	...headBlocks(why),
	gap,
	...checkBlocks(why),
	gap,
	...compareBlocks(why),
	...pitBlocks(why.here.row),
	...straightBlocks(why),
	...pointBlocks(why),
];

function headBlocks({here}: Why): Block[] {
	const {row, name, place} = here;
	const verdict = row.verdict === 'fail' ? 'FAIL' : row.verdict;
	const overall = `overall ${row.overall.map(ratio => fixed(ratio, 3)).join('  ')}`;
	return [
		line(
			cell(name, 'strong'),
			cell(place === undefined ? ' · ' : ` · place ${place} · `),
			cell(verdict, row.verdict),
			cell(` · ${timeWords(row)}`),
		),
		line(cell(overall, 'muted')),
		text(row.reason),
		...row.remarks.map(remark => text(`- ${remark}`, 'plain', 2)),
	];
}

const checkBlocks = ({here, units}: Why): Block[] => checkView(here.row.checks, units);

function compareBlocks({here, compared}: Why): Block[] {
	if (compared === undefined || compared.name === here.name) return [];
	return [differenceView(here.row, compared.row, {row: here.name, other: compared.name}), gap];
}

function pitBlocks({pitRoad}: Row): Block[] {
	if (pitRoad === null) return [];
	const words = `Pit road: gear ${pitRoad.gear}, ${rpmDown(pitRoad.rpm)} rpm at the limit, never above ${rpmDown(pitRoad.toleranceRpm)}`;
	return [text(words, 'plain', 2), gap];
}

const straightBlocks = ({here, units}: Why): Block[] =>
	here.row.situations.flatMap(situation => situationView(situation, units));

function pointBlocks({ranked, here, compared, units}: Why): Block[] {
	const points = pointsFor(ranked, here);
	const others = compared && compared.name !== here.name ? pointsFor(ranked, compared) : undefined;
	return [pointsView(points, others, ranked.ranking.setting, units)];
}

function pointsFor({runs, ground}: Ranked, {name}: Placed): RpmPoint[] {
	const run = runs.get(name);
	return run === undefined ? [] : pointsOf(run, ground);
}
