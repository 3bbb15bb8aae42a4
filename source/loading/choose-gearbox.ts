/** Which gears to build into the box: the best set for each track, and one set for all of them. */
import type {Car, Gearbox, Pair} from '../drivetrain/car.ts';
import {samePair} from '../drivetrain/gear-pair.ts';
import type {Track} from '../drivetrain/track.ts';
import {candidateOf, mountable} from '../planning/candidates.ts';
import {done, failed, fault} from '../planning/faults.ts';
import {type Plan, planFor, settingOf} from '../planning/plan.ts';
import type {Outcome, Row} from '../planning/results.ts';
import {rowOf} from '../planning/row.ts';
import {groundOf} from '../planning/run-rack.ts';
import {runRow} from '../planning/run-row.ts';
import {type Built, bestSets} from './best-sets.ts';
import {builtRow} from './built-row.ts';
import {type Common, commonSets} from './common-sets.ts';
import {buildableSets} from './gear-sets.ts';
import type {CommonSet, GearboxAnswer, TrackGears} from './gearbox-results.ts';
import {TrackSets} from './track-sets.ts';
import {isUsable} from './usable.ts';

export type GearboxOptions = {
	/** The only pair; the best of the rack unless given. */
	readonly pair: Pair | undefined;
	/** One set for all tracks besides. */
	readonly together: boolean;
	/** How many sets to tell of a track, and how many common ones. */
	readonly count: number;
};

export type NamedTrack = {readonly name: string; readonly track: Track};

type Entry = {readonly name: string; readonly plan: Plan; readonly sets: TrackSets; readonly allowed: number};

/** The answer, or what keeps it from being given. */
export function chooseGearbox(
	car: Car,
	tracks: readonly NamedTrack[],
	options: GearboxOptions,
): Outcome<GearboxAnswer> {
	const steps = gearboxSteps(car, tracks, options);
	for (;;) {
		const step = steps.next();
		if (step.done) return step.value;
	}
}

/** The same step by step, for a caller that has other things to do in between; how far it is, as a part of 1. */
export function* gearboxSteps(
	car: Car,
	tracks: readonly NamedTrack[],
	options: GearboxOptions,
): Generator<number, Outcome<GearboxAnswer>, void> {
	const inventory = car.gearInventory;
	if (inventory === undefined) return failed([noInventory]);
	const built = buildableSets(inventory, car.gearboxes);
	if (built.length === 0) return failed([nothingBuilt]);
	const changesOf = changesFrom(car, built);
	const entries: Entry[] = [];
	const told: {entry: Entry; best: readonly Built[]; gears: TrackGears}[] = [];
	for (const {name, track} of tracks) {
		const entry = entryOf(car, name, track, built, options);
		if (!entry.ok) return entry;
		entries.push(entry.value);
		for (const part of entry.value.sets.timeSteps()) yield (entries.length - 1 + part) / tracks.length;
		const best = bestSets(entry.value.sets, changesOf, options.count);
		told.push({entry: entry.value, best, gears: trackGears(car, entry.value, best, changesOf)});
		yield entries.length / tracks.length;
	}
	const common = options.together
		? commonSets(
				entries.map(({sets}) => sets),
				changesOf,
				options.count,
			)
		: [];
	return done({
		sets: built.length,
		tracks: told.map(({gears}) => gears),
		common: common.map(one => commonSet(one, common[0]!, told, built, changesOf)),
		remarks: remarksOn(entries, options, common),
	});
}

const noInventory = fault('car', 'gearInventory', 'no single gears', 'the gears that a gearbox may be built from');
const nothingBuilt = fault(
	'car',
	'gearInventory',
	'no set that goes together',
	'gears on hand for every place, each taller than the one before, within the steps, with a group in common',
);

/** Gears to change in the installed set, to build a set; as many as it has without one of so many gears. */
function changesFrom(car: Car, sets: readonly Gearbox[]): (set: number) => number {
	const installed = car.gearboxes.find(({name}) => name === car.installed?.gearbox)?.ratios;
	const counts = sets.map(({ratios}) =>
		installed?.length === ratios.length ? ratios.filter((ratio, i) => ratio !== installed[i]).length : ratios.length,
	);
	return set => counts[set]!;
}

function entryOf(
	car: Car,
	name: string,
	track: Track,
	built: readonly Gearbox[],
	{pair}: GearboxOptions,
): Outcome<Entry> {
	const own = new Set(car.gearboxes.map(gearbox => gearbox.name));
	const plan = planFor({...car, gearboxes: [...car.gearboxes, ...built.filter(set => !own.has(set.name))]}, track);
	if (!plan.ok) return plan;
	const ground = groundOf(plan.value);
	const books = [car.rules[track.type]?.gearboxes, track.rules.gearboxes];
	const mayUse = built.map(set => books.every(names => names === undefined || names.includes(set.name)));
	const first = mayUse.indexOf(true);
	const isOnHand = (one: (typeof pairs)[number]) =>
		first >= 0 && isUsable(rowOf(runRow(plan.value, candidateOf(plan.value.car, one, built[first]!)), ground));
	const pairs = mountable(plan.value.car).filter(one => pair === undefined || samePair(one, pair));
	const usable = pairs.filter(isOnHand);
	const sets = new TrackSets(ground, built, usable, mayUse);
	return done({name, plan: plan.value, sets, allowed: mayUse.filter(Boolean).length});
}

function trackGears(
	car: Car,
	{name, plan, sets, allowed}: Entry,
	best: readonly Built[],
	changesOf: (set: number) => number,
): TrackGears {
	const bestS = best[0]?.row.fastestS ?? null;
	const own = ownBest(car, plan, sets);
	return {
		track: name,
		setting: settingOf(plan, sets.ground.anchored),
		sets: allowed,
		rows: best.map(one => builtRow(one, plan, sets.sets[one.set]!, bestS, changesOf(one.set))),
		own:
			own === undefined ? null : {pair: own.pair, gearbox: own.gearbox, fastestS: own.fastestS, verdict: own.verdict},
	};
}

/** The best row of the sets that are built, with the same pairs. */
function ownBest(car: Car, plan: Plan, {pairs, ground}: TrackSets): Row | undefined {
	const rows = pairs.flatMap(pair =>
		car.gearboxes.map(gearbox => rowOf(runRow(plan, candidateOf(plan.car, pair, gearbox)), ground)),
	);
	const time = (row: Row) => row.fastestS ?? Number.POSITIVE_INFINITY;
	const isBefore = (one: Row, other: Row) =>
		(one.verdict === 'fail') === (other.verdict === 'fail') ? time(one) < time(other) : other.verdict === 'fail';
	return rows.reduce<Row | undefined>(
		(best, row) => (best === undefined || isBefore(row, best) ? row : best),
		undefined,
	);
}

function commonSet(
	{set, totalS, built}: Common,
	best: Common,
	told: readonly {entry: Entry; best: readonly Built[]}[],
	sets: readonly Gearbox[],
	changesOf: (set: number) => number,
): CommonSet {
	const {name, ratios} = sets[set]!;
	return {
		gearbox: name,
		ratios: [...ratios],
		changes: changesOf(set),
		totalS,
		behindS: totalS - best.totalS,
		tracks: told.map(({entry, best: own}, i) => {
			const bestS = own[0]?.row.fastestS ?? null;
			const row = builtRow(built[i]!, entry.plan, sets[set]!, bestS, changesOf(set));
			return {track: entry.name, row, costS: row.behindS ?? 0};
		}),
	};
}

function remarksOn(entries: readonly Entry[], {together}: GearboxOptions, common: readonly Common[]): string[] {
	return [
		...entries.flatMap(({name, plan, sets, allowed}) => {
			if (allowed === 0)
				return [`${name}: the rules name the sets that may be used, and none of them can be built from the inventory.`];
			if (sets.pairs.length === 0)
				return [`${name}: no pair fits the housing, is permitted, on hand and has miles left.`];
			const named = allowed < sets.sets.length;
			return [
				...(named ? [`${name}: the rules name the sets that may be used; ${allowed} of them can be built.`] : []),
				...(plan.track.straights.every(({lengthM}) => lengthM === undefined)
					? [`${name}: no straight has a length, so there are no times to choose by.`]
					: []),
			];
		}),
		...(together && common.length === 0
			? ['There is no set that may be used, and has a lap time, at all of the tracks.']
			: []),
	];
}
