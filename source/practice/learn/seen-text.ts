/** What somebody saw, in one line: "Back 8420 rpm gear 4 185 mph". */
import {didYouMean} from '../../documents/nearest.ts';
import {type Quantity, quantityOf} from '../../documents/quantity.ts';
import type {Car, Pair} from '../../drivetrain/car.ts';
import {parsePair} from '../../drivetrain/gear-pair.ts';
import type {Track} from '../../drivetrain/track.ts';
import {candidateFor} from './learn.ts';
import type {Seen} from './seen.ts';

export type SeenReading = {ok: true; seen: Seen} | {ok: false; found: string; allowed: string; hint?: string};

export const seenExample = 'Back 8420 rpm gear 4 185 mph';
const allowed = `the straight, the highest RPM, and as far as known gear, speed, pair and set: "${seenExample}"`;
const rpmRange = {from: 500, to: 30_000} as const;

/** What the car had where the line does not say it. */
type Installed = {readonly pair: Pair | undefined; readonly gearbox: string | undefined};

/**
 * The straight by its name, then the RPM, then in any order `gear 4`, a speed with its unit, `pair 33/38`, `set A`. Arithmetic
 * and "±" as everywhere. Text and car are such that a plan can be made of them.
 */
export function readSeen(text: string, car: Car, track: Track, installed: Installed): SeenReading {
	const named = straightIn(text, track);
	if ('found' in named) return {ok: false, ...named};
	const parts = partsOf(named.rest);
	const rpm = numberIn(parts.rpm);
	if (rpm === undefined) return refused(`"${text}" (no RPM after ${track.straights[named.index]!.name})`);
	if (!(rpm.value >= rpmRange.from && rpm.value <= rpmRange.to))
		return refused(`${parts.rpm} rpm`, `from ${rpmRange.from} to ${rpmRange.to} rpm`);
	const speed = parts.speed === '' ? undefined : quantityOf(parts.speed, 'speed');
	if (speed?.ok === false) return {ok: false, found: speed.found, allowed: speed.allowed, ...hintOf(speed)};
	if (speed !== undefined && !(speed.value > 0)) return refused(parts.speed, 'a speed above 0');
	const pair = parts.pair === undefined ? installed.pair : parsePair(parts.pair);
	if (pair === undefined && parts.pair !== undefined)
		return refused(`pair ${parts.pair}`, 'driving/driven, like 33/38');
	const candidate = candidateFor(car, pair, parts.set ?? installed.gearbox);
	if (!candidate.ok) {
		const [first] = candidate.faults;
		return refused(`${first!.path} ${first!.found}`, first!.allowed);
	}
	const gears = candidate.value.gearbox.ratios.length;
	const {gear} = parts;
	if (gear !== undefined && !(gear >= 1 && gear <= gears)) return refused(`gear ${gear}`, `from 1 to ${gears}`);
	return {
		ok: true,
		seen: {
			index: named.index,
			rpm: rpm.value,
			rpmSe: rpm.uncertainty,
			speedMps: speed?.value,
			speedSe: speed?.uncertainty,
			gear,
			candidate: candidate.value,
		},
	};
}

const refused = (found: string, what = allowed): SeenReading => ({ok: false, found, allowed: what});
const hintOf = ({hint}: {hint?: string}) => (hint === undefined ? {} : {hint});

function numberIn(text: string): Quantity | undefined {
	const reading = quantityOf(text, 'number');
	return reading.ok ? reading : undefined;
}

type Named = {index: number; rest: string} | {found: string; allowed: string; hint?: string};

/** The straight whose name the text begins with, the longest where several do; with one straight it may be left out. */
function straightIn(text: string, track: Track): Named {
	const typed = text.trim();
	const names = track.straights.map(({name}) => name);
	const begins = names
		.map((name, index) => ({name, index}))
		.filter(({name}) => startsWithWord(typed, name))
		.sort((a, b) => b.name.length - a.name.length);
	const [longest] = begins;
	if (longest) return {index: longest.index, rest: typed.slice(longest.name.length)};
	if (names.length === 1 && /^\d/.test(typed)) return {index: 0, rest: typed};
	const word = /^\D*/.exec(typed)![0].trim();
	const hint = didYouMean(word, names);
	return {
		found: word === '' ? `"${typed}" (no straight)` : `"${word}"`,
		allowed: `a straight of this track: ${names.join(', ')}; like "${seenExample}"`,
		...(hint && {hint}),
	};
}

function startsWithWord(text: string, name: string): boolean {
	const same = text.slice(0, name.length).toLowerCase() === name.toLowerCase();
	return same && !/^[\p{L}\p{N}]/u.test(text.slice(name.length));
}

type Parts = {rpm: string; speed: string; gear?: number; pair?: string; set?: string};

/** A number, "±" and a number: what stands before the word `rpm`, or the first of them where that is left out. */
const firstNumber = /^\s*[\d.]+(?:\s*(?:±|\+\/-)\s*[\d.]+)?(?![\d.]*\s*[\p{L}/%])/u;

function partsOf(text: string): Parts {
	let rest = text.replace(/^[\s:,]+/, '');
	const parts: Parts = {rpm: '', speed: ''};
	const take = (pattern: RegExp): string | undefined => {
		const match = pattern.exec(rest);
		if (match === null) return undefined;
		rest = `${rest.slice(0, match.index)} ${rest.slice(match.index + match[0].length)}`;
		return match[1] ?? match[2];
	};
	const gear = take(/,?\s*\bgear\s+(\d+)\b,?/i);
	if (gear !== undefined) parts.gear = Number(gear);
	const pair = take(/,?\s*\bpair\s+(\S+?)(?=,|\s|$),?/i);
	if (pair !== undefined) parts.pair = pair;
	const set = take(/,?\s*\b(?:set|gearbox)\s+(?:"([^"]+)"|([^\s,]+)),?/i);
	if (set !== undefined) parts.set = set;
	const before = /^(.*?)\brpm\b/i.exec(rest);
	const taken = before?.[1] ?? firstNumber.exec(rest)?.[0] ?? rest;
	const after = rest.slice(before ? before[0].length : taken.length);
	return {...parts, rpm: taken.trim(), speed: after.replace(/^[\s,]+|[\s,]+$/g, '')};
}
