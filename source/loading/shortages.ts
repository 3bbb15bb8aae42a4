/** What is short for the tracks of a list: on the rack, on hand, in miles. */
import type {Car, RackPair} from '../drivetrain/car.ts';
import {pairName} from '../drivetrain/gear-pair.ts';
import {mountable} from '../planning/candidates.ts';
import type {Row} from '../planning/results.ts';
import {counted, listed, longLengthText, secondsText} from '../planning/words.ts';
import type {RankedTrack, ServedNeed} from './load-needs.ts';
import type {LoadOptions} from './load-results.ts';
import {raceM, tracksOf} from './race-miles.ts';
import {stepsFrom} from './steps.ts';
import {isUsable, lacksSupply, wouldPass} from './usable.ts';

export function shortages(
	car: Car,
	tracks: readonly RankedTrack[],
	needs: readonly ServedNeed[],
	options: LoadOptions,
): string[] {
	return [
		...new Set([
			...tracks.flatMap(track => unservedTrack(track, needs)),
			...needs.flatMap(need => failingBest(need)),
			...needs.flatMap(need => fasterWithSupply(need)),
			...missingSteps(needs, options),
			...shortPairs(car, needs),
		]),
	];
}

function unservedTrack({name}: RankedTrack, needs: readonly ServedNeed[]): string[] {
	const isServed = needs.some(({track}) => track.name === name);
	return isServed ? [] : [`${name}: no pair and set that fits the housing, is permitted, on hand and has miles left.`];
}

function failingBest({track, best}: ServedNeed): string[] {
	if (best.verdict !== 'fail') return [];
	return [`${track.name}: every pair fails a check there; ${best.pair} ${best.gearbox} comes nearest. ${best.reason}`];
}

const supplyOf = (row: Row): string =>
	row.checks.find(({check}) => check === 'stock')?.verdict === 'fail' ? 'no set is on hand' : 'its miles are used up';

/** What is below it rounds to 0.000 s. */
const shownFromS = 0.0005;

/** A row that would be the best with a new set. */
function fasterWithSupply({track, best, usable}: ServedNeed): string[] {
	const sets = new Set(usable.map(({gearbox}) => gearbox));
	const row = track.ranking.rows
		.filter(one => sets.has(one.gearbox) && lacksSupply(one) && wouldPass(one) && one.fastestS !== null)
		.reduce<Row | undefined>(
			(first, one) => (first === undefined || one.fastestS! < first.fastestS! ? one : first),
			undefined,
		);
	if (row === undefined || best.fastestS === null || best.verdict === 'fail') return [];
	const gainS = best.fastestS - row.fastestS!;
	if (gainS < shownFromS) return [];
	return [
		`${track.name}: ${row.pair} ${row.gearbox} would be ${secondsText(gainS)} a lap faster than ${best.pair} ${best.gearbox}, but ${supplyOf(row)}.`,
	];
}

/** Steps that the rack does not have, and steps that a pair out of supply would be nearer for; tracks that miss the same together. */
function missingSteps(needs: readonly ServedNeed[], options: LoadOptions): string[] {
	const tracks = new Map<string, string[]>();
	for (const need of needs) {
		for (const words of missingAt(need, options)) tracks.set(words, [...(tracks.get(words) ?? []), need.track.name]);
	}
	return [...tracks].map(([words, names]) => `${listed([...new Set(names)])}: ${words}`);
}

function missingAt({track, way}: ServedNeed, options: LoadOptions): string[] {
	const {row} = way;
	return (['shorter', 'taller'] as const).flatMap(name => {
		const found = way[name].length;
		const count = found === 0 ? 'no step' : `only ${counted(found, 'step')}`;
		const ended = found < options[name] ? [`${count} ${name} than ${row.pair} ${row.gearbox} on the rack.`] : [];
		const withSupply = track.ranking.rows.filter(
			one => one.gearbox === row.gearbox && (isUsable(one) || lacksSupply(one)),
		);
		const [nearest] = stepsFrom(withSupply, row.pairRatio, name, options.stepRatio, Math.min(1, options[name]));
		const lacking = nearest?.every(lacksSupply) ? nearest[0] : undefined;
		if (lacking === undefined) return ended;
		return [...ended, `${lacking.pair} would be the nearest step ${name} than ${row.pair}, but ${supplyOf(lacking)}.`];
	});
}

/** From this share of its allowed miles on a pair is worth a word. */
const worn = 0.9;

/** Pairs whose miles do not last for their races, or are nearly used up, or that stand for the best at several tracks with one set. */
function shortPairs(car: Car, needs: readonly ServedNeed[]): string[] {
	return mountable(car).flatMap(pair => {
		const name = pairName(pair);
		const tracks = tracksOf(needs, name).map(track => track.name);
		if (tracks.length === 0) return [];
		return [
			...milesShort(pair, raceM(needs, name), tracks).map(words => `${name}: ${words}`),
			...(pair.sets === 1 && tracks.length > 1 ? [`${name}: one set for ${listed(tracks)}, no spare.`] : []),
		];
	});
}

/** A further set is taken to be new. */
function milesShort(
	{sets, milesM, maxMilesM}: RackPair,
	racesM: number | undefined,
	tracks: readonly string[],
): string[] {
	if (maxMilesM === undefined) return [];
	const leftM = maxMilesM * sets - milesM;
	if (racesM !== undefined && racesM > leftM)
		return [`${longLengthText(racesM)} of racing at ${listed(tracks)}, and ${longLengthText(leftM)} are left.`];
	const isWorn = sets === 1 && milesM > worn * maxMilesM;
	return isWorn ? [`${longLengthText(leftM)} left, and it is the best at ${listed(tracks)}.`] : [];
}
