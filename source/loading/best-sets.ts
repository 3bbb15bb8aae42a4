/** The best sets at one track, every check applied. */
import type {Row} from '../planning/results.ts';
import type {Choice, TrackSets} from './track-sets.ts';

export type Built = Choice & {readonly row: Row};

/**
 * The first `count` choices in the order of a ranking: least lap first among those that fail no check. Choices of the same lap
 * differ in gears that nothing is gained or lost with; they are told once, by the one that passes before one that is near,
 * then the one with the fewest gears to change, then the first of the inventory. Where every choice fails a check, the fastest.
 *
 * No choice is left out that could come before: the laps are exact, and what is passed over as failing fails for certain.
 */
export function bestSets(track: TrackSets, changesOf: (set: number) => number, count: number): Built[] {
	const found: Built[] = [];
	for (const equals of track.byLap(true)) {
		const best = preferred(track, equals, changesOf);
		if (best !== undefined) found.push(best);
		if (found.length === count) break;
	}
	if (found.length > 0) return found;
	for (const equals of track.byLap(false)) {
		const choice = byChanges(equals, changesOf)[0]!;
		return [{...choice, row: track.row(choice)}];
	}
	return [];
}

/** The one to be told of choices of the same lap; undefined where all of them fail. */
function preferred(track: TrackSets, equals: readonly Choice[], changesOf: (set: number) => number): Built | undefined {
	let near: Built | undefined;
	for (const choice of byChanges(equals, changesOf)) {
		const row = track.row(choice);
		if (row.verdict === 'pass') return {...choice, row};
		if (row.verdict === 'near') near ??= {...choice, row};
	}
	return near;
}

const byChanges = (choices: readonly Choice[], changesOf: (set: number) => number): Choice[] =>
	choices.toSorted((one, other) => changesOf(one.set) - changesOf(other.set));
