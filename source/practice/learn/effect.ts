/** What a learning does to the ranking, in a sentence or two. */
import type {Ranking, Row, StraightResult} from '../../planning/results.ts';
import {grouped, highestText, placeText} from '../../planning/words.ts';

export type Effect = {
	readonly before: Row | undefined;
	readonly after: Row | undefined;
	readonly changed: boolean;
	/** "First was 33/38 A, now 32/39 A: 85 rpm less at the end of Back." */
	readonly words: string;
};

const nameOf = ({pair, gearbox}: Row) => `${pair} ${gearbox}`;

/** `before` and `after` rank the same rack. */
export function effectOf(before: Ranking, after: Ranking): Effect {
	const [was, is] = [before.rows[0], after.rows[0]];
	if (was === undefined || is === undefined) return {before: was, after: is, changed: false, words: 'No row is first.'};
	const changed = nameOf(was) !== nameOf(is);
	return {before: was, after: is, changed, words: changed ? changedWords(was, is, after) : stayedWords(was, is)};
}

/** Both by what practice taught: what the old first would turn, and what the new one does. */
function changedWords(was: Row, is: Row, after: Ranking): string {
	const oldNow = after.rows.find(row => nameOf(row) === nameOf(was));
	const start = `First was ${nameOf(was)}, now ${nameOf(is)}`;
	// In another gear the RPM is another for that reason alone.
	const place = oldNow && endsOf(oldNow).find(end => endIn(is, end)?.gear === end.gear);
	const turns = place && endIn(is, place)?.rpm;
	if (oldNow === undefined || place === undefined || turns === undefined) return `${start}.`;
	const difference = Math.round(turns - place.rpm);
	const less = `${grouped(Math.abs(difference))} rpm ${difference < 0 ? 'less' : 'more'}`;
	const words = `${start}: ${less} at the end of ${placeText(place.straight, place.situation)}.`;
	return oldNow.verdict === 'fail' && was.verdict !== 'fail'
		? `${words} ${nameOf(was)} now fails, ${lowered(oldNow.reason)}`
		: words;
}

function stayedWords(was: Row, is: Row): string {
	const [before, after] = [highestEnd(was), highestEnd(is)];
	const start = `${nameOf(is)} stays first`;
	if (before === undefined || after === undefined) return `${start}.`;
	const difference = Math.round(after.rpm - before.rpm);
	const change =
		difference === 0 ? 'as before' : `${grouped(Math.abs(difference))} ${difference < 0 ? 'less' : 'more'} than before`;
	return `${start}: ${highestText(after.rpm)} rpm at the end of ${placeText(after.straight, after.situation)}, ${change}.`;
}

type End = {readonly straight: string; readonly situation: string; readonly rpm: number; readonly gear: number};

/** What a row turns at the ends of the straights in all situations, as it would without a limiter; the highest first. */
function endsOf({situations}: Row): End[] {
	const ends = situations.flatMap(({name, straights}) => straights.map(straight => endOf(straight, name)));
	return ends.sort((a, b) => b.rpm - a.rpm);
}

const highestEnd = (row: Row): End | undefined => endsOf(row)[0];

const endOf = ({name, endRpm, reachRpm, endGear}: StraightResult, situation: string): End => ({
	straight: name,
	situation,
	rpm: Math.max(endRpm, reachRpm ?? 0),
	gear: endGear,
});

function endIn(row: Row, {straight, situation}: End): End | undefined {
	const found = row.situations.find(({name}) => name === situation)?.straights.find(({name}) => name === straight);
	return found && endOf(found, situation);
}

const lowered = (sentence: string) => sentence.charAt(0).toLowerCase() + sentence.slice(1);
