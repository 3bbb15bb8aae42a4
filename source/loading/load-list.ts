/** The fewest pairs to carry for the tracks ahead. */
import type {Car, RackPair} from '../drivetrain/car.ts';
import {pairName, pairRatio} from '../drivetrain/gear-pair.ts';
import {mountable} from '../planning/candidates.ts';
import type {Row} from '../planning/results.ts';
import type {CoverProblem, Way} from './cover.ts';
import {fewest} from './fewest.ts';
import {needsOf, type PairWay, type RankedTrack, type ServedNeed, type TrackNeed} from './load-needs.ts';
import {loadReason} from './load-reasons.ts';
import type {LoadedPair, LoadedTrack, LoadList, LoadOptions, Role} from './load-results.ts';
import {raceM} from './race-miles.ts';
import {shortages} from './shortages.ts';
import {withoutPair} from './without-pair.ts';

/**
 * The fewest pairs of the rack with which every track has its best pair, or one level with it, and `shorter` and `taller`
 * steps beside that one. Among lists of the same length the one that loses the least time over the tracks, then the one with
 * the most spare sets and the least worn pairs.
 */
export function loadList(car: Car, tracks: readonly RankedTrack[], options: LoadOptions): LoadList {
	const withinS = options.withinS ?? car.margins.levelS;
	const needs = needsOf(tracks, options, withinS);
	const pairs = mountable(car).toSorted((one, other) => pairRatio(one) - pairRatio(other));
	const names = pairs.map(pairName);
	const cover = fewest(problemOf(needs, pairs, names));
	if (cover === undefined) throw new Error('a track has no way to be served');
	const carried = cover.things.map(thing => names[thing]!);
	const served = needs.map(need => ({...need, way: servingWay(need, carried)}));
	const roles = served.map(need => rolesOf(need, carried));
	return {
		pairs: cover.things.map(thing =>
			loadedPair(pairs[thing]!, carried, served, roles.flat(), withinS, options.eachSet),
		),
		tracks: served.map((need, i) => loadedTrack(need, roles[i]!)),
		short: shortages(car, tracks, served, options),
		shorter: options.shorter,
		taller: options.taller,
		withinS,
		stepRatio: options.stepRatio,
	};
}

function problemOf(needs: readonly TrackNeed[], pairs: readonly RackPair[], names: readonly string[]): CoverProblem {
	const numbers = new Map(names.map((name, i) => [name, i]));
	const demand = (rows: readonly Row[]) => rows.map(({pair}) => numbers.get(pair)!);
	const wayOf = ({row, lossS, shorter, taller}: PairWay): Way => ({
		loss: lossS,
		demands: [[row], ...shorter, ...taller].map(demand),
	});
	return {unease: pairs.map(uneaseOf), needs: needs.map(({ways}) => ways.map(wayOf))};
}

/** 1 for a pair without a spare set, and the share of its allowed miles that it has run. */
function uneaseOf({sets, milesM, maxMilesM}: RackPair): number {
	return (sets > 1 ? 0 : 1) + (maxMilesM === undefined ? 0 : milesM / maxMilesM);
}

function servingWay({ways}: TrackNeed, carried: readonly string[]): PairWay {
	const has = (row: Row) => carried.includes(row.pair);
	const there = ways.filter(
		({row, shorter, taller}) => has(row) && [...shorter, ...taller].every(step => step.some(has)),
	);
	return there.reduce((best, way) => (way.lossS < best.lossS ? way : best));
}

/** Best first, then the steps, each with the nearest pair that is carried for it. */
function rolesOf({track, way}: ServedNeed, carried: readonly string[]): (Role & {pair: string})[] {
	const role = (name: Role['role'], row: Row, step: number): Role & {pair: string} => ({
		pair: row.pair,
		track: track.name,
		gearbox: row.gearbox,
		role: name,
		step,
		lossS: name === 'best' && row.fastestS !== null ? way.lossS : null,
	});
	const stepRoles = (name: 'shorter' | 'taller') =>
		way[name].map((rows, i) => role(name, rows.find(({pair}) => carried.includes(pair))!, i + 1));
	return [role('best', way.row, 0), ...stepRoles('shorter'), ...stepRoles('taller')];
}

function loadedPair(
	pair: RackPair,
	carried: readonly string[],
	needs: readonly ServedNeed[],
	allRoles: readonly (Role & {pair: string})[],
	withinS: number,
	eachSet: boolean,
): LoadedPair {
	const name = pairName(pair);
	const roles = allRoles.filter(role => role.pair === name).map(({pair: _, ...role}) => role);
	return {
		pair: name,
		pairRatio: pairRatio(pair),
		sets: pair.sets,
		milesM: pair.milesM,
		maxMilesM: pair.maxMilesM ?? null,
		raceM: raceM(needs, name) ?? null,
		roles,
		reason: loadReason(roles, eachSet),
		without: withoutPair(name, carried, needs, roles, withinS),
	};
}

function loadedTrack({track, best, way, ways}: ServedNeed, roles: readonly (Role & {pair: string})[]): LoadedTrack {
	const pairsOf = (name: Role['role']) => roles.filter(({role}) => role === name).map(({pair}) => pair);
	return {
		track: track.name,
		best: {pair: best.pair, gearbox: best.gearbox, fastestS: best.fastestS},
		served: {pair: way.row.pair, gearbox: way.row.gearbox, lossS: way.row.fastestS === null ? null : way.lossS},
		shorter: pairsOf('shorter'),
		taller: pairsOf('taller'),
		choices: ways.length,
	};
}
