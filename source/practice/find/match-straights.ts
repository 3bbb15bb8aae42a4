/** The places of the log laid on the track's straights: in order around the lap, from whichever fits best. */
import type {Straight, Track} from '../../drivetrain/track.ts';
import {counted, lengthText, listed} from '../../planning/words.ts';
import {median} from '../fit/robust.ts';
import type {Measured} from './passes.ts';
import type {Places} from './places.ts';

export type Match = {
	/** Of each place, the index among the track's straights; undefined: none. */
	readonly straightAt: readonly (number | undefined)[];
	readonly matched: boolean;
	readonly why: string;
};

/** What a place is like: medians over the faster half of its runs. */
type Place = {readonly exitMps: number; readonly endMps: number; readonly lengthM: number};

/** An exit speed that is off by this share, or a length by this, counts 1. */
const exitScale = 0.06;
const lengthScale = 0.2;
/** A place, or a straight, that stays alone costs this; a pair that costs more is no match. */
const alone = 2;
const mostCost = 4;
/** Two ways round that differ by less than this look alike. */
const lookAlike = 0.8;

/** `rateHz`: of the samples; a run from its first to its last sample is one step shorter than it was, on average. */
export function matchStraights(track: Track, places: Places, passes: readonly Measured[], rateHz: number): Match {
	const seen = places.at.map((_, place) =>
		typical(
			passes.filter((__, i) => places.of[i] === place),
			1 / rateHz,
		),
	);
	const {straights} = track;
	const ways = seen.map((_, turn) => layFrom(turn, seen, straights));
	const best = ways.reduce((least, way) => (way.cost < least.cost ? way : least));
	const close = different(ways.filter(way => way.cost - best.cost < lookAlike));
	const chosen = close.length > 1 && places.fromLine ? fromTheLine(close, places, seen) : best;
	const names = straights.filter((_, i) => !chosen.straightAt.includes(i)).map(({name}) => name);
	const spare = chosen.straightAt.filter(straight => straight === undefined).length;
	return {
		straightAt: chosen.straightAt,
		matched: names.length === 0,
		why: words(close.length > 1, places, names, spare, track),
	};
}

function words(alike: boolean, places: Places, missing: readonly string[], spare: number, track: Track): string {
	if (missing.length === track.straights.length) return noneFound(places, track);
	const told: string[] = [];
	if (alike && places.at.length > 1) {
		told.push(
			places.fromLine
				? "The track's straights look alike in the log: the one in which the lap is counted is taken for the first."
				: "The track's straights look alike in the log, and no lap column tells them apart: their names may be exchanged.",
		);
	}
	if (missing.length > 0) told.push(`Not found in the log: ${listed(missing)}.`);
	if (spare > 0) told.push(`Full-throttle runs a lap that match no straight of the track: ${spare}.`);
	return told.join(' ');
}

function noneFound({at, lapM}: Places, track: Track): string {
	const known = track.lapM === undefined ? '' : `, by the document ${lengthText(track.lapM)}`;
	return `None of the straights of ${track.name} is in the log: a lap of it is ${lengthText(lapM)}${known}, with ${counted(at.length, 'full-throttle run')}. Is it of another track?`;
}

function typical(passes: readonly Measured[], stepS: number): Place {
	const fast = median(passes.map(({highestMps}) => highestMps));
	const half = passes.filter(({highestMps}) => highestMps >= fast);
	const middle = (of: (pass: Measured) => number) => median(half.map(of));
	return {
		exitMps: middle(pass => pass.exitMps),
		endMps: middle(pass => pass.endMps),
		lengthM: middle(pass => pass.lengthM + stepS * (pass.lengthM / pass.timeS)),
	};
}

type Way = {readonly straightAt: (number | undefined)[]; readonly cost: number};

function different(ways: readonly Way[]): Way[] {
	const same = (one: Way, other: Way) => one.straightAt.every((straight, i) => straight === other.straightAt[i]);
	return ways.filter((way, i) => ways.findIndex(other => same(way, other)) === i);
}

/** The cheapest way to lay the places, from `turn` on in order, on the straights in order, leaving out what must be. */
function layFrom(turn: number, seen: readonly Place[], straights: readonly Straight[]): Way {
	const order = seen.map((_, i) => (turn + i) % seen.length);
	const [m, n] = [order.length, straights.length];
	// least[i][j]: cost of the first i places and j straights.
	const least = Array.from({length: m + 1}, (_, i) => Array.from({length: n + 1}, (__, j) => alone * (i + j)));
	for (let i = 1; i <= m; i++) {
		for (let j = 1; j <= n; j++) {
			const pair = least[i - 1]![j - 1]! + costOf(seen[order[i - 1]!]!, straights[j - 1]!);
			least[i]![j] = Math.min(pair, least[i - 1]![j]! + alone, least[i]![j - 1]! + alone);
		}
	}
	const straightAt = new Array<number | undefined>(m).fill(undefined);
	for (let [i, j] = [m, n]; i > 0 && j > 0; ) {
		const pair = least[i - 1]![j - 1]! + costOf(seen[order[i - 1]!]!, straights[j - 1]!);
		if (least[i]![j] === pair) {
			straightAt[order[i - 1]!] = j - 1;
			[i, j] = [i - 1, j - 1];
		} else if (least[i]![j] === least[i - 1]![j]! + alone) i--;
		else j--;
	}
	return {straightAt, cost: least[m]![n]!};
}

function costOf(place: Place, straight: Straight): number {
	const exit = Math.abs(place.exitMps / straight.exitMps - 1) / exitScale;
	const fullM = fullThrottleM(place, straight);
	const length = fullM === undefined ? 0 : Math.abs(Math.log(place.lengthM / fullM)) / lengthScale;
	const cost = exit + length;
	return cost > mostCost ? Number.POSITIVE_INFINITY : cost;
}

/** The straight less the braking from the speed that was reached. */
function fullThrottleM({endMps}: Place, {lengthM, entryMps, brakingMps2}: Straight): number | undefined {
	if (lengthM === undefined) return undefined;
	if (entryMps === undefined || brakingMps2 === undefined) return lengthM;
	return Math.max(0.3 * lengthM, lengthM - Math.max(0, endMps ** 2 - entryMps ** 2) / (2 * brakingMps2));
}

/** Among ways that look alike: the first straight is the run that the finish line lies in, else the first after the line. */
function fromTheLine(ways: readonly Way[], places: Places, seen: readonly Place[]): Way {
	const after = places.at.map((share, i) => {
		const start = share - Math.floor(share);
		return start + seen[i]!.lengthM / places.lapM >= 1 ? start - 1 : start;
	});
	const firstOf = (way: Way) => {
		const place = way.straightAt.indexOf(Math.min(...way.straightAt.filter(straight => straight !== undefined)));
		return after[place] ?? Number.POSITIVE_INFINITY;
	};
	return ways.reduce((best, way) => (firstOf(way) < firstOf(best) ? way : best));
}
