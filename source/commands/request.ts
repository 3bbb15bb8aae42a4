/** What a command is asked: the options with their values read. */

import type {UnitSystem} from '../text/units.ts';
import type {OptionName} from './options.ts';

export type Request = {
	/** The one argument as it was written; undefined where none was given. */
	argument: string | undefined;
	/** The argument after it. */
	second?: string;
	car?: string;
	situation?: string;
	top?: number;
	pair?: {driving: number; driven: number};
	gearbox?: string;
	prefer?: string;
	name?: string;
	from?: string;
	notes?: string;
	replace?: boolean;
	shipped?: boolean;
	add?: boolean;
	take?: boolean;
	date?: string;
	session?: string;
	rpm?: number;
	at?: string;
	remark?: string;
	short?: boolean;
	qr?: boolean;
	copy?: boolean;
	against?: {driving: number; driven: number};
	above?: number;
	laps?: number;
	json: boolean;
	units: UnitSystem;
	strict: boolean;
	ascii: boolean;
};

/** Options as they were written; a switch is true. */
export type Given = Partial<Record<OptionName, string | true>>;

const pairPattern = /^\s*(\d{1,4})\s*\/\s*(\d{1,4})\s*$/;

/** Options that are taken as they were written. */
const texts = [
	'car',
	'situation',
	'gearbox',
	'prefer',
	'name',
	'from',
	'notes',
	'date',
	'session',
	'at',
	'remark',
] as const satisfies OptionName[];

const switchesOf = (given: Given) => ({
	json: given.json === true,
	strict: given.strict === true,
	ascii: given.ascii === true,
	...(given.replace && {replace: true}),
	...(given.shipped && {shipped: true}),
	...(given.add && {add: true}),
	...(given.take && {take: true}),
	...(given.short && {short: true}),
	...(given.qr && {qr: true}),
	...(given.copy && {copy: true}),
});

/** The request that the options make, or what is wrong with a value. */
export const toRequest = (argument: string | undefined, given: Given, second?: string): Request | string => {
	const request: Request = {
		argument,
		units: 'us',
		...switchesOf(given),
		...Object.fromEntries(texts.flatMap(name => (typeof given[name] === 'string' ? [[name, given[name]]] : []))),
		...(second !== undefined && {second}),
	};
	if (given.units === 'metric') request.units = 'metric';
	else if (given.units !== undefined && given.units !== 'us') return `--units is us or metric, found ${given.units}.`;
	if (typeof given.top === 'string') {
		if (!/^[1-9]\d{0,5}$/.test(given.top)) return `--top is a whole number from 1, found ${given.top}.`;
		request.top = Number(given.top);
	}
	for (const name of ['pair', 'against'] as const) {
		const text = given[name];
		if (typeof text !== 'string') continue;
		const [, driving, driven] = pairPattern.exec(text) ?? [];
		if (!Number(driving) || !Number(driven)) return `--${name} is driving/driven, such as 33/38, found ${text}.`;
		request[name] = {driving: Number(driving), driven: Number(driven)};
	}
	for (const name of ['rpm', 'above'] as const) {
		const text = given[name];
		if (typeof text !== 'string') continue;
		if (!/^[1-9]\d{2,4}$/.test(text)) return `--${name} is a whole number from 100 to 99999, found ${text}.`;
		request[name] = Number(text);
	}
	if (typeof given.laps === 'string') {
		if (!/^([1-9]\d{0,3}|10000)$/.test(given.laps))
			return `--laps is a whole number from 1 to 10000, found ${given.laps}.`;
		request.laps = Number(given.laps);
	}
	if (request.date !== undefined && !isDay(request.date))
		return `--date is a day such as 2026-05-31, found ${request.date}.`;
	if ([argument, second, request.car].filter(word => word === '-').length > 1)
		return second === undefined
			? 'only one of TRACK and --car can be standard input.'
			: 'only one document can be standard input.';
	return request;
};

/** A day of the calendar, written as in ISO 8601. */
const isDay = (text: string): boolean =>
	/^\d{4}-\d\d-\d\d$/.test(text) && new Date(`${text}T00:00:00Z`).toJSON()?.startsWith(text) === true;
