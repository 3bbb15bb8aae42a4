/** Engine life and fuel of a row beside another: figures and dwell, under each other or in two halves. */
import {fuelOfRows, lifeOfRows} from '../../life/answer.ts';
import {heldAgainst, runs} from '../../life/compared-rows.ts';
import type {Ranked} from '../../planning/rank-rack.ts';
import type {Row} from '../../planning/results.ts';
import {type Block, gap, text} from '../../text/blocks.ts';
import {installedView} from '../../text/comparison-view.ts';
import {dwellView} from '../../text/dwell-view.ts';
import {assumedWords, fuelFigures} from '../../text/fuel-view.ts';
import {caution} from '../../text/heading-view.ts';
import {layOut} from '../../text/layout.ts';
import {aboutWords, againstWords, lifeFigures} from '../../text/life-view.ts';
import type {Units} from '../../text/units.ts';
import type {Pieces} from '../parts/pieces.ts';

export type LifeGiven = {
	readonly ranked: Ranked;
	readonly row: Row;
	/** The row that all are compared with; undefined: the installed one. */
	readonly compared: Row | undefined;
	readonly situation: string | undefined;
	readonly units: Units;
};

export function lifePlaceView(given: LifeGiven, width: number): Pieces[] {
	const {life, dwell, fuel, notes} = partsOf(given);
	return layOut([...life, gap, ...dwell, gap, ...fuel, gap, ...notes], width);
}

export function lifeHalves(given: LifeGiven, leftWidth: number, rightWidth: number): [Pieces[], Pieces[]] {
	const {life, dwell, fuel, notes} = partsOf(given);
	return [layOut([...life, gap, ...fuel, gap, ...notes], leftWidth), layOut(dwell, rightWidth)];
}

type Parts = {readonly [part in 'life' | 'dwell' | 'fuel' | 'notes']: Block[]};

function partsOf({ranked, row, compared, situation, units}: LifeGiven): Parts {
	if (!ranked.ground.plan.track.straights.some(({lengthM}) => lengthM !== undefined))
		return notTold('No straight of this track has a length: e gives it one.');
	if (!runs(row)) return notTold(`${row.pair} ${row.gearbox} does not run here. ${row.reason}`);
	const other = compared !== undefined && compared !== row && runs(compared) ? compared : undefined;
	const against = other ?? heldAgainst(row, ranked.ranking.rows);
	const shown = {rows: against === undefined ? [row] : [row, against], remarks: []};
	const life = lifeOfRows(ranked, shown, {situation});
	const fuel = fuelOfRows(ranked, shown, {situation});
	const said = [assumedWords(fuel, units), ...life.assumptions, ...fuel.assumptions, ...fuel.remarks];
	return {
		life: [text(`${againstWords(life.pairs)} · ${aboutWords(life)}`, 'strong', 2), lifeFigures(life)],
		dwell: dwellView(life.pairs),
		fuel: [fuelFigures(fuel, units)],
		notes: [
			...installedView(life.pairs),
			...[...new Set(said)].map(one => text(`- ${one}`, 'plain', 2)),
			text(caution, 'muted'),
		],
	};
}

const notTold = (words: string): Parts => ({life: [text(words)], dwell: [], fuel: [], notes: []});
