/** What is needed to act on a plan, in one line. */
import {checkCode} from './check-code.ts';
import type {PlanDocument} from './plan-document.ts';

export type ShortPlan = {
	track: string;
	type: string;
	pair: string;
	gearbox: string;
	/** By the gear shifted from. */
	shifts: {from: number; rpm: number}[];
	pitRoad?: {gear: number; rpm: number};
	limitRpm: number;
	highestRpm: number;
	restartGear?: number;
};

/** A line that a version 6-L QR code holds: so many bytes, or so many of the alphanumeric set (ISO/IEC 18004). */
export const mostBytes = 134;
export const mostAlphanumeric = 195;

/** Where a name was cut, or something in it left out. */
export const cutMark = '+';
const types: Readonly<Record<string, string>> = {
	short: 'short',
	intermediate: 'inter',
	superspeedway: 'super',
	road: 'road',
};

/** The fields as they can be read back: whole RPM, names cut to what the line holds. */
export type ShortForm = {line: string; fields: ShortPlan};

/** `DR1 Pine Hollow short: 33/38 A: …: CHECK`, in bytes, or in capitals where only the alphanumeric set holds it. */
export function shortForm(plan: PlanDocument): ShortForm {
	const fields = fieldsOf(plan);
	for (const [capitals, room, spare] of [
		[false, mostBytes, shortestRoom],
		[true, mostAlphanumeric, 1],
	] as const) {
		const track = plainName(String(plan.track.name), capitals);
		const gearbox = plainName(plan.gearbox, capitals);
		const without = lengthOf(lineOf({...fields, track: '', gearbox: ''}, capitals));
		const gearboxRoom = Math.min(lengthOf(gearbox), Math.max(spare, Math.floor((room - without) / 3)));
		const trackRoom = room - without - gearboxRoom;
		if (trackRoom < Math.min(spare, lengthOf(track))) continue;
		const cut = {...fields, track: cutName(track, trackRoom), gearbox: cutName(gearbox, gearboxRoom)};
		return {line: lineOf(cut, capitals), fields: cut};
	}
	throw new Error('a plan with more gears than there are');
}

/** Names shorter than this say little: then capitals give more room. */
const shortestRoom = 8;

function fieldsOf({pair, gearbox, results, track}: PlanDocument): ShortPlan {
	const {limit, highest, shifts, pitRoad, restart} = results;
	const byGear = new Map(shifts.map(({from, rpm}) => [from, rpm]));
	return {
		track: String(track.name),
		type: String(track.type),
		pair,
		gearbox,
		shifts: [...byGear].map(([from, rpm]) => ({from, rpm})).sort((a, b) => a.from - b.from),
		...(pitRoad && {pitRoad: {gear: pitRoad.gear, rpm: pitRoad.rpm}}),
		limitRpm: Math.floor(limit.rpm),
		highestRpm: Math.max(...highest.map(({rpm}) => rpm)),
		...(restart && {restartGear: restart.gear}),
	};
}

function lineOf(plan: ShortPlan, capitals: boolean): string {
	const {track, type, pair, gearbox, shifts, pitRoad, limitRpm, highestRpm, restartGear} = plan;
	const word = (text: string) => (capitals ? text[0]! : text);
	const parts = [
		`DR1 ${track} ${types[type]}`,
		`${pair} ${gearbox}`,
		...(shifts.length > 0 ? [`${word('shift')} ${shiftsText(shifts)}`] : []),
		...(pitRoad ? [`${word('pit')} ${pitRoad.gear}-${pitRoad.rpm}`] : []),
		`${word('limit')} ${limitRpm}`,
		`${word('top')} ${highestRpm}`,
		...(restartGear === undefined ? [] : [`${word('restart')} ${restartGear}`]),
	];
	const body = capitals ? parts.join(': ').toUpperCase() : parts.join(': ');
	const code = checkCode(body);
	return `${body}: ${capitals ? code.toUpperCase() : code}`;
}

/** `2-9100 9100 5-9050`: the gear stands where it is not the next one. */
function shiftsText(shifts: ShortPlan['shifts']): string {
	return shifts
		.map(({from, rpm}, i) => (i > 0 && shifts[i - 1]!.from === from - 1 ? String(rpm) : `${from}-${rpm}`))
		.join(' ');
}

/** Letters, digits, single blanks and a few marks; the cut mark at the end where something else was left out. */
function plainName(name: string, capitals: boolean): string {
	const compatible = name.normalize('NFKC');
	const text = capitals ? compatible.normalize('NFKD').replace(/\p{M}/gu, '').toUpperCase() : compatible;
	const foreign = capitals ? /[^A-Z0-9 .-]/g : /[^\p{L}\p{M}\p{N} .-]/gu;
	const kept = text.replace(foreign, ' ').replace(/ +/g, ' ').trim().normalize('NFKC');
	return kept === text && !/[.-]$/.test(kept) ? kept : `${kept.replace(/[ .-]+$/, '')}${cutMark}`;
}

/** Cut to so many bytes, the mark included. */
function cutName(name: string, room: number): string {
	if (lengthOf(name) <= room) return name;
	let kept = '';
	for (const character of name) {
		if (lengthOf(kept + character) > room - 1) break;
		kept += character;
	}
	return `${kept.replace(/[ .-]+$/, '')}${cutMark}`;
}

const encoder = new TextEncoder();
function lengthOf(text: string): number {
	return encoder.encode(text).length;
}

export type ShortReading = {ok: true; fields: ShortPlan} | {ok: false; found: string; allowed: string};

const pattern =
	/DR1 (.*?) (short|inter|super|road): (\d{1,3}\/\d{1,3}) (.*?)(?:: (?:shift|s) ([\d -]+))?(?:: (?:pit|p) (\d{1,2})-(\d{1,8}))?: (?:limit|l) (\d{1,5}): (?:top|t) (\d{1,8})(?:: (?:restart|r) (\d{1,2}))?: ([0-9a-f]{8})(?![0-9a-z])/i;
/** More is no line; what stands around the line may be a message. */
const longestMessage = 100_000;

/** The fields in a message that holds a short form. */
export function readShortForm(message: string): ShortReading {
	const text = message
		.slice(0, longestMessage)
		.normalize('NFKC')
		.replace(/[\u00ad\u200b-\u200f\u2060-\u206f\ufeff]/g, '')
		.replace(/[\u2010-\u2015\u2212]/g, '-')
		.replaceAll('\u2044', '/')
		.replace(/[\s>]+/g, ' ');
	const match = pattern.exec(text.slice(Math.max(0, text.search(/\bDR1 /i))).slice(0, longestLine));
	if (match === null)
		return {ok: false, found: 'no short form', allowed: 'a line that starts "DR1 " and ends in its check'};
	const line = match[0];
	const code = match[11]!;
	if (checkCode(line.slice(0, -code.length - 2)) !== code.toLowerCase())
		return {ok: false, found: 'a line that does not match its check', allowed: 'the line as it was sent'};
	return {ok: true, fields: fieldsFrom(match)};
}

const longestLine = 600;

function fieldsFrom(match: RegExpExecArray): ShortPlan {
	const [, track, type, pair, gearbox, shifts, pitGear, pitRpm, limit, top, restart] = match;
	const named = Object.entries(types).find(([, short]) => short === type!.toLowerCase())!;
	return {
		track: track!,
		type: named[0],
		pair: pair!,
		gearbox: gearbox!,
		shifts: shiftsFrom(shifts ?? ''),
		...(pitGear !== undefined && {pitRoad: {gear: Number(pitGear), rpm: Number(pitRpm)}}),
		limitRpm: Number(limit),
		highestRpm: Number(top),
		...(restart !== undefined && {restartGear: Number(restart)}),
	};
}

function shiftsFrom(text: string): ShortPlan['shifts'] {
	let gear = 0;
	return text
		.trim()
		.split(' ')
		.filter(part => part !== '')
		.map(part => {
			const [first, rpm] = part.split('-');
			gear = rpm === undefined ? gear + 1 : Number(first);
			return {from: gear, rpm: Number(rpm ?? first)};
		});
}
