/** Time by RPM, of one pair or two side by side, with a bar whose characters are the gears. */
import type {Dwell, EngineLife} from '../life/results.ts';
import {type Block, cell, type Making, tableOf, text} from './blocks.ts';
import {pairWords} from './comparison-view.ts';
import {absent, fixed, signed} from './units.ts';

const minuteS = 60;
/** Characters of the longest bar. */
const longestBar = 22;
/** A gear as one character, also above 9. */
const digits = 36;

/** One step of RPM, of each pair. */
type Step = {fromRpm: number; toRpm: number; dwell: Dwell[][]};

const stepsOf = (pairs: readonly EngineLife[]): Step[] => {
	const all = pairs.flatMap(({dwell}) => dwell);
	const froms = [...new Set(all.map(({fromRpm}) => fromRpm))].sort((a, b) => b - a);
	return froms.map(fromRpm => ({
		fromRpm,
		toRpm: all.find(each => each.fromRpm === fromRpm)!.toRpm,
		dwell: pairs.map(({dwell}) => dwell.filter(each => each.fromRpm === fromRpm)),
	}));
};

const raceS = (dwell: readonly Dwell[]): number => dwell.reduce((sum, each) => sum + (each.raceS ?? 0), 0);
const lapS = (dwell: readonly Dwell[]): number => dwell.reduce((sum, each) => sum + each.lapS, 0);

/** A bar as long as the time, in characters of `characterS`: each is the gear that the time is spent in. */
export const gearBar = (dwell: readonly Dwell[], characterS: number): string => {
	let spentS = 0;
	let bar = '';
	for (const {gear, lapS: timeS} of dwell) {
		spentS += timeS;
		bar += gear.toString(digits).repeat(Math.max(0, Math.round(spentS / characterS) - bar.length));
	}
	return bar === '' && spentS > 0 ? '.' : bar;
};

/** The highest RPM first: that is what wears an engine. Differences are the first pair's time less the second's. */
export const dwellView = (pairs: readonly EngineLife[]): Block[] => {
	const steps = stepsOf(pairs);
	const characterS = Math.max(...steps.flatMap(({dwell}) => dwell.map(lapS))) / longestBar;
	const columns: Making<Step>[] = [
		{head: 'rpm', align: 'left', keep: 0, cell: ({fromRpm, toRpm}) => cell(`${fromRpm}-${toRpm}`)},
		...pairs.flatMap((pair, i) => columnsOf(pair, i, characterS)),
	];
	const difference: Making<Step> = {
		head: 'difference',
		align: 'right',
		keep: 1,
		cell: ({dwell: [one, other]}) => cell(signed(lapS(one!) - lapS(other!), 2)),
	};
	if (pairs.length > 1) columns.push(difference);
	const note = `Seconds in each step of RPM. In a bar each character is ${fixed(characterS, 2)} s, in the gear that it names.`;
	return [tableOf(columns, steps), text(note, 'muted')];
};

const columnsOf = (pair: EngineLife, i: number, characterS: number): Making<Step>[] => {
	const first = i === 0;
	const number: Making<Step> = {
		head: pairWords(pair),
		align: 'right',
		keep: first ? 0 : 3,
		cell: ({dwell}) => cell(dwell[i]!.length === 0 ? absent : fixed(lapS(dwell[i]!), 2), first ? 'strong' : 'plain'),
	};
	const bar: Making<Step> = {
		head: 'in gears',
		align: 'left',
		keep: first ? 2 : 5,
		cell: ({dwell}) => cell(gearBar(dwell[i]!, characterS)),
	};
	const race: Making<Step> = {
		head: 'min/race',
		align: 'right',
		keep: 4,
		cell: ({dwell}) => cell(dwell[i]!.length === 0 ? absent : fixed(raceS(dwell[i]!) / minuteS, 1)),
	};
	return first && pair.raceS !== null ? [number, race, bar] : [number, bar];
};
