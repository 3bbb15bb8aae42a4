/** The part of a car that a plan needs to be computed again. */
import type {Pair} from '../drivetrain/car.ts';
import {pairName, parsePair, toothSum} from '../drivetrain/gear-pair.ts';

type Json = Record<string, unknown>;
type Teeth = Json & Pair;
type Rules = Json & {gearboxes?: string[]; pairs?: string[]};
/** What a checked car document holds, as far as it is looked at here. */
type CarJson = Json & {
	engines: (Json & {name: string})[];
	gearboxes: (Json & {name: string})[];
	rack: Json & {toothSums?: number[]; eitherShaft?: boolean; pairs: Teeth[]};
	installed?: {pair: string; gearbox: string};
	rules?: Record<string, Rules>;
};
type TrackJson = Json & {
	type: string;
	rules?: Rules;
	straights: {measured?: {pair?: string; gearbox?: string}}[];
};

export type Chosen = {pair: string; gearbox: string; engine: string};

/**
 * The car document with the engine, sets and pairs that the plan speaks of: chosen, installed, and named at the track, which
 * planning looks up. Both arguments are documents that their readers have accepted.
 */
export function reduceCar(carDocument: Json, trackDocument: Json, chosen: Chosen): Json {
	const car = carDocument as CarJson;
	const track = trackDocument as TrackJson;
	const measured = track.straights.map(straight => straight.measured);
	const pairs = new Set([chosen.pair, car.installed?.pair, ...measured.map(seen => seen?.pair)]);
	const sets = new Set([chosen.gearbox, car.installed?.gearbox, ...measured.map(seen => seen?.gearbox)]);
	const rules = car.rules?.[track.type];
	const reduced = rules && reduceRules(rules, sets, pairs);
	for (const name of [...(track.rules?.gearboxes ?? []), ...(reduced?.gearboxes ?? [])]) sets.add(name);
	const {$schema: _editor, rules: _rules, gearInventory: _inventory, ...rest} = car;
	return {
		...rest,
		engines: car.engines.filter(({name}) => name === chosen.engine),
		gearboxes: car.gearboxes.filter(({name}) => sets.has(name)),
		rack: reduceRack(car.rack, pairs),
		...(reduced && {rules: {[track.type]: reduced}}),
	};
}

function reduceRack({toothSums, ...rack}: CarJson['rack'], named: ReadonlySet<string | undefined>): Json {
	const teeth = [...named].flatMap(name => (name === undefined ? [] : (parsePair(name) ?? [])));
	const isNamed = ({driving, driven}: Pair) =>
		named.has(pairName({driving, driven})) ||
		(rack.eitherShaft === true && named.has(pairName({driving: driven, driven: driving})));
	const sums = new Set(teeth.map(toothSum));
	return {
		...(toothSums && {toothSums: those(toothSums, sum => sums.has(sum))}),
		...rack,
		pairs: rack.pairs.filter(isNamed),
	};
}

function reduceRules(rules: Rules, sets: ReadonlySet<unknown>, pairs: ReadonlySet<unknown>): Rules {
	return {
		...rules,
		...(rules.gearboxes && {gearboxes: those(rules.gearboxes, name => sets.has(name))}),
		...(rules.pairs && {pairs: those(rules.pairs, name => pairs.has(name))}),
	};
}

/** The entries that matter; all of them where none does, since an empty list would allow everything. */
function those<T>(entries: T[], matters: (entry: T) => boolean): T[] {
	const kept = entries.filter(matters);
	return kept.length > 0 ? kept : entries;
}
