/** Chances, spreads and their sentences, the same in text and on the screen. */
import type {Estimate, Matters, Odds, OddsInput, Share} from '../odds/results.ts';
import type {RiskRow} from '../odds/risk-order.ts';
import {rowName} from '../planning/rank-rack.ts';
import type {Row} from '../planning/results.ts';
import {absent, fixed, type UnitSystem, unitsOf} from './units.ts';

/** "3.1 %": enough digits for what is known. */
export const percent = (share: number, digits = 1): string => `${fixed(100 * share, digits)} %`;

/** "3.1 ± 0.5 %" */
export const chanceText = (chance: Estimate | null): string =>
	chance === null ? absent : `${fixed(100 * chance.value, 1)} ± ${fixed(100 * chance.error, 1)} %`;

export const rowText = ({pair, gearbox}: {readonly pair: string; readonly gearbox: string}): string =>
	`${pair} ${gearbox}`;

/** What to do to know a number better. */
const advice: Record<Share['kind'], (name: string) => string> = {
	rollout: () => 'Roll the tires out again',
	growth: () => 'Measure how the tires grow: RPM and speed of a log at two steady speeds',
	slip: () => 'Compare RPM with speed in a log at full throttle',
	exit: name => `Measure the ${name}`,
	tow: name => `Log a run in the tow (${name})`,
	'situation exit': name => `Measure the ${name}`,
	drag: () => 'Measure the drag: a coast-down, or the speed at the end of a straight',
	power: () => 'Have the power measured, or the speed at the end of a straight',
	grip: () => 'Find out how much grip there is: the speeds at which the wheels spin',
	temperature: () => 'Read the thermometer at the track',
	pressure: () => 'Read the station pressure at the track',
	'wind speed': () => 'Measure the wind at car height',
	'wind direction': () => 'Look where the wind blows from',
	other: name => `Measure the ${name}`,
};

/** A share counts from this many of its standard errors on. */
const sureErrors = 2;
const leastShare = 0.05;

const large = (shares: readonly Share[]): Share[] =>
	shares.filter(({share}) => share.value > Math.max(leastShare, sureErrors * share.error));

/** "Roll the tires out again: it decides between 33/38 A and 32/39 A (62 % of the difference in time)." */
export const mattersSentences = ({rows, margin, difference}: Matters): string[] => {
	const [first, second] = rows;
	const [between] = large(difference);
	const [limit] = large(margin);
	const sentences: string[] = [];
	if (between !== undefined && second !== undefined)
		sentences.push(
			`${advice[between.kind](between.name)}: it decides between ${first} and ${second} (${percent(between.share.value, 0)} of what moves their difference in time).`,
		);
	if (limit !== undefined)
		sentences.push(
			`${advice[limit.kind](limit.name)}: it decides how far ${first} stays below the limit (${percent(limit.share.value, 0)} of what moves its margin).`,
		);
	return sentences.length > 0 ? sentences : ['No number by itself moves the margin or the choice much.'];
};

/** What is not decided, as a sentence; nothing where all is. */
export const doubtsOf = ({decision: {isDecided, open}, isComplete}: Odds): string[] => {
	if (isDecided) return [];
	const advice = isComplete ? ' More draws would not be worth it; better numbers would.' : '';
	return [`${isComplete ? 'Not decided' : 'Not decided yet'}: ${open.join('; ')}.${advice}`];
};

/** What the answer comes to, and what is open. */
export const decisionSentences = (odds: Odds): string[] => {
	const {decision, risk, rows} = odds;
	const {row, next} = decision;
	if (rows.every(({timeS}) => timeS === null))
		return ['No straight has a length: there are chances of passing the limit, and no times to choose by.'];
	if (row === null)
		return [
			risk === null
				? 'No row is allowed in any draw.'
				: `No row has a chance of passing the limit within ${percent(risk)}.`,
		];
	const first = rows.find(one => rowText(one) === row)!;
	const other = rows.find(one => rowText(one) === next);
	const chance = `its chance of passing the limit is ${chanceText(first.over)}`;
	const head =
		risk === null
			? `${row} is most often the fastest that is allowed (${chanceText(first.first)}); ${chance}.`
			: `${row} is the fastest on the mean within a risk of ${percent(risk)}: ${chance}.`;
	const after =
		other === undefined
			? []
			: [`Next is ${next}: fastest in ${chanceText(other.first)}, over the limit in ${chanceText(other.over)}.`];
	return [head, ...after, ...doubtsOf(odds)];
};

const poundKg = 0.45359237;
const inchM = 0.0254;
const fahrenheitK = 5 / 9;

/** One standard deviation in the units that are read. */
export const sdText = ({sd, unit}: Pick<OddsInput, 'sd' | 'unit'>, system: UnitSystem): string => {
	const units = unitsOf(system);
	const us = system === 'us';
	switch (unit) {
		case 'share':
			return `${Number((100 * sd).toPrecision(2))} % of it`;
		case 'points':
			return `${Number((100 * sd).toPrecision(2))} points`;
		case 'speed':
			return units.text('speed', sd);
		case 'temperature':
			return us ? `${fixed(sd / fahrenheitK, 1)}°F` : `${fixed(sd, 1)}°C`;
		case 'pressure':
			return units.text('pressure', sd);
		case 'angle':
			return `${fixed((180 * sd) / Math.PI, 0)} degrees`;
		case 'mass':
			return us ? `${fixed(sd / poundKg, 0)} lb` : `${fixed(sd, 1)} kg`;
		case 'length':
			return us ? `${fixed(sd / inchM, 2)} in` : `${fixed(1000 * sd, 1)} mm`;
		case 'area':
			return `${Number(sd.toPrecision(2))} m²`;
		case 'power':
			return units.text('power', sd);
		case 'number':
			return String(Number(sd.toPrecision(2)));
	}
};

/** "exit of Front, Back: 1.0 mph (drivers and laps …)": inputs that are as well known for the same reason share a line. */
export const inputLines = (inputs: readonly OddsInput[], system: UnitSystem): string[] => {
	const groups = new Map<string, string[]>();
	for (const input of inputs) {
		const told = `± ${sdText(input, system)}: ${input.why}`;
		groups.set(told, [...(groups.get(told) ?? []), input.name]);
	}
	return [...groups].map(([told, names]) => `${namesText(names)} ${told}`);
};

const mostNames = 4;
const namesText = (names: readonly string[]): string =>
	names.length <= mostNames
		? names.join(', ')
		: `${names.slice(0, mostNames - 1).join(', ')} and ${names.length - mostNames + 1} more`;

/** The ranking by risk: its rows with the reason for their place, and the chance of each. */
export const riskView = (rows: readonly RiskRow[], {risk}: Odds) => {
	const chances = new Map(rows.map(({row, odds}) => [rowName(row), chanceText(odds?.over ?? null)]));
	return {rows: rows.map(one => ({...one.row, reason: riskReason(one, risk ?? 0)})), chances};
};

function riskReason({row, odds, isWithin}: RiskRow, risk: number): Row['reason'] {
	if (odds === null) return row.reason;
	const chance = `Chance of passing the limit ${chanceText(odds.over)}`;
	const mean = odds.timeS === null ? '' : `, ${fixed(odds.timeS.mean, 3)} s on the mean`;
	if (isWithin)
		return `${chance}, within the risk of ${percent(risk)}${mean}; the fastest allowed in ${chanceText(odds.first)}.`;
	return (odds.over?.value ?? 0) > risk ? `${chance}, above the risk of ${percent(risk)}. ${row.reason}` : row.reason;
}
