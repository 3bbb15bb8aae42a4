/** What a command is asked: the options with their values read. */

import type {Held} from '../practice/learn/seen.ts';
import type {UnitSystem} from '../text/units.ts';
import type {OptionName} from './options.ts';

export type Request = {
	/** The one argument as it was written; undefined where none was given. */
	argument: string | undefined;
	/** The argument after it. */
	second?: string;
	/** The arguments after it, where a command takes any number. */
	more?: string[];
	car?: string;
	situation?: string;
	top?: number;
	pair?: {driving: number; driven: number};
	gearbox?: string;
	/** A share of 1. */
	risk?: number;
	seed?: number;
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
	seen?: readonly string[];
	hold?: Held;
	column?: readonly string[];
	accept?: readonly string[];
	takeBack?: readonly string[];
	grip?: boolean;
	shorter?: number;
	taller?: number;
	withinS?: number;
	/** A fraction of 1. */
	stepRatio?: number;
	eachSet?: boolean;
	together?: boolean;
	against?: {driving: number; driven: number};
	above?: number;
	laps?: number;
	json: boolean;
	units: UnitSystem;
	strict: boolean;
	ascii: boolean;
};

/** Options as they were written; a switch is true, one that may be repeated a list. */
export type Given = Partial<Record<OptionName, string | true | readonly string[]>>;

const pairPattern = /^\s*(\d{1,4})\s*\/\s*(\d{1,4})\s*$/;

const riskPattern = /^\s*(\d+(?:\.\d+)?)\s*(%)\s*$/;

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
	...(given['each-set'] && {eachSet: true}),
	...(given.together && {together: true}),
	...(given.grip && {grip: true}),
});

const listsOf = ({seen, column, accept, hold, 'take-back': takeBack}: Given): Partial<Request> => ({
	...(Array.isArray(seen) && {seen}),
	...(Array.isArray(column) && {column}),
	...(Array.isArray(accept) && {accept}),
	...(Array.isArray(takeBack) && {takeBack}),
	...((hold === 'speed' || hold === 'circumference') && {hold}),
});

/** The request that the options make, or what is wrong with a value. */
export const toRequest = (
	argument: string | undefined,
	given: Given,
	second?: string,
	more: readonly string[] = [],
): Request | string => {
	const request: Request = {
		argument,
		units: 'us',
		...switchesOf(given),
		...Object.fromEntries(texts.flatMap(name => (typeof given[name] === 'string' ? [[name, given[name]]] : []))),
		...(second !== undefined && {second}),
		...(more.length > 0 && {more: [...more]}),
	};
	if (given.units === 'metric') request.units = 'metric';
	else if (given.units !== undefined && given.units !== 'us') return `--units is us or metric, found ${given.units}.`;
	if (given.hold !== undefined && given.hold !== 'speed' && given.hold !== 'circumference')
		return `--hold is speed or circumference, found ${given.hold}.`;
	Object.assign(request, listsOf(given));
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
	if (typeof given.risk === 'string') {
		const [, number, sign] = riskPattern.exec(given.risk) ?? [];
		const share = Number(number) / 100;
		if (sign === undefined || !(share >= 0 && share < 1))
			return `--risk is a percentage from 0% to below 100%, such as 5%, found ${given.risk}.`;
		request.risk = share;
	}
	if (typeof given.seed === 'string') {
		if (!/^\d{1,9}$/.test(given.seed)) return `--seed is a whole number from 0 to 999999999, found ${given.seed}.`;
		request.seed = Number(given.seed);
	}
	const steps = readSteps(given);
	if (typeof steps === 'string') return steps;
	Object.assign(request, steps);
	if (request.date !== undefined && !isDay(request.date))
		return `--date is a day such as 2026-05-31, found ${request.date}.`;
	if ([argument, second, ...more, request.car].filter(word => word === '-').length > 1)
		return second === undefined && more.length === 0
			? 'only one of TRACK and --car can be standard input.'
			: 'only one document can be standard input.';
	return request;
};

/** A day of the calendar, written as in ISO 8601. */
const isDay = (text: string): boolean =>
	/^\d{4}-\d\d-\d\d$/.test(text) && new Date(`${text}T00:00:00Z`).toJSON()?.startsWith(text) === true;

/** More steps than that are the whole rack. */
const mostSteps = 5;
const mostWithinS = 10;
const mostStepPercent = 20;

/** What a step is, how many of them, and what stands for the best. */
const readSteps = (given: Given): Partial<Request> | string => {
	const read: Partial<Request> = {};
	for (const name of ['shorter', 'taller'] as const) {
		const value = given[name];
		if (typeof value !== 'string') continue;
		if (!/^\d$/.test(value) || Number(value) > mostSteps)
			return `--${name} is a whole number from 0 to ${mostSteps}, found ${value}.`;
		read[name] = Number(value);
	}
	if (typeof given.within === 'string') {
		const withinS = decimal(given.within.replace(/\s*s$/, ''), mostWithinS);
		if (withinS === undefined) return `--within is seconds from 0 to ${mostWithinS}, found ${given.within}.`;
		read.withinS = withinS;
	}
	if (typeof given.step === 'string') {
		const percent = decimal(given.step.replace(/\s*%$/, ''), mostStepPercent);
		if (percent === undefined) return `--step is per cent from 0 to ${mostStepPercent}, found ${given.step}.`;
		read.stepRatio = percent / 100;
	}
	return read;
};

const decimal = (text: string, most: number): number | undefined =>
	/^(\d{1,3}(\.\d{0,9})?|\.\d{1,9})$/.test(text) && Number(text) <= most ? Number(text) : undefined;
