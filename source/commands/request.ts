/** What a command is asked: the options with their values read. */
import type {OptionName} from './options.ts';
import type {UnitSystem} from './text/units.ts';

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
	short?: boolean;
	qr?: boolean;
	copy?: boolean;
	notes?: string;
	json: boolean;
	units: UnitSystem;
	strict: boolean;
	ascii: boolean;
};

/** Options as they were written; a switch is true. */
export type Given = Partial<Record<OptionName, string | true>>;

const pairPattern = /^\s*(\d{1,4})\s*\/\s*(\d{1,4})\s*$/;

/** The request that the options make, or what is wrong with a value. */
export const toRequest = (argument: string | undefined, given: Given, second?: string): Request | string => {
	const text = (name: OptionName) => (typeof given[name] === 'string' ? {[name]: given[name]} : {});
	const request: Request = {
		argument,
		json: given.json === true,
		units: 'us',
		strict: given.strict === true,
		ascii: given.ascii === true,
		...text('car'),
		...text('situation'),
		...text('gearbox'),
		...text('prefer'),
		...text('notes'),
		...(second !== undefined && {second}),
		...(given.short && {short: true}),
		...(given.qr && {qr: true}),
		...(given.copy && {copy: true}),
	};
	if (given.units === 'metric') request.units = 'metric';
	else if (given.units !== undefined && given.units !== 'us') return `--units is us or metric, found ${given.units}.`;
	if (typeof given.top === 'string') {
		if (!/^[1-9]\d{0,5}$/.test(given.top)) return `--top is a whole number from 1, found ${given.top}.`;
		request.top = Number(given.top);
	}
	if (typeof given.pair === 'string') {
		const [, driving, driven] = pairPattern.exec(given.pair) ?? [];
		if (!Number(driving) || !Number(driven)) return `--pair is driving/driven, such as 33/38, found ${given.pair}.`;
		request.pair = {driving: Number(driving), driven: Number(driven)};
	}
	if ([argument, second, request.car].filter(word => word === '-').length > 1)
		return second === undefined
			? 'only one of TRACK and --car can be standard input.'
			: 'only one document can be standard input.';
	return request;
};
