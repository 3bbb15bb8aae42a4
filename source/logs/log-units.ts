/** Units of the channels of a log: those of the documents, and what only loggers write. */
import {type Dimension, findUnit, unitName, unitNames} from '../documents/units.ts';
import {footM} from '../drivetrain/constants.ts';
import type {ChannelName} from './channels.ts';

export type LogUnit = {
	readonly name: string;
	/** SI (rev/min for engine speed) is the number times this. */
	readonly factor: number;
};

type Rule = {
	readonly dimensions: readonly Dimension[];
	/** Spellings in lower case that the documents do not know, with the unit they mean. */
	readonly more?: Readonly<Record<string, LogUnit>>;
	/** Whether a number without a unit says too little. */
	readonly needed?: boolean;
};

const [minuteS, hourS] = [60, 3600];
const microsecond = {name: 'µs', factor: 1e-6};
const millisecond = {name: 'ms', factor: 1e-3};
const second = {name: 's', factor: 1};
const perMinute = {name: 'rpm', factor: 1};
const thousandPerMinute = {name: '1000 rpm', factor: 1000};
const kilometerPerHour = {name: 'km/h', factor: 1000 / hourS};

const rules: Record<ChannelName, Rule> = {
	time: {
		dimensions: ['time'],
		needed: true,
		more: {
			msec: millisecond,
			millisecond,
			milliseconds: millisecond,
			µs: microsecond,
			μs: microsecond,
			us: microsecond,
			usec: microsecond,
			microseconds: microsecond,
			secs: second,
		},
	},
	distance: {dimensions: ['length'], needed: true},
	speed: {
		dimensions: ['speed'],
		needed: true,
		more: {
			'km/hr': kilometerPerHour,
			'km/hour': kilometerPerHour,
			kmph: kilometerPerHour,
			kmhr: kilometerPerHour,
			'm/sec': {name: 'm/s', factor: 1},
			mps: {name: 'm/s', factor: 1},
			'ft/sec': {name: 'ft/s', factor: footM},
		},
	},
	rpm: {
		dimensions: [],
		more: {
			rpm: perMinute,
			'1/min': perMinute,
			'/min': perMinute,
			'min^-1': perMinute,
			'min-1': perMinute,
			'rev/min': perMinute,
			'revs/min': perMinute,
			'r/min': perMinute,
			'u/min': perMinute,
			krpm: thousandPerMinute,
			'1000 rpm': thousandPerMinute,
			'rpm x 1000': thousandPerMinute,
			'rpm x1000': thousandPerMinute,
			'x1000 rpm': thousandPerMinute,
			'rev/s': {name: 'rev/s', factor: minuteS},
			hz: {name: 'Hz', factor: minuteS},
			'rad/s': {name: 'rad/s', factor: minuteS / (2 * Math.PI)},
		},
	},
	throttle: {dimensions: ['share'], more: {pct: {name: '%', factor: 0.01}}},
	gear: {dimensions: []},
	lap: {dimensions: []},
	brake: {dimensions: ['share', 'pressure', 'force', 'length', 'angle'], more: {pct: {name: '%', factor: 0.01}}},
	steering: {dimensions: ['angle', 'length', 'share']},
};

/** What stands in a units row where there is no unit. */
const noUnit = /^(?:|-+|#|no|none|n\/a|1|\[\s*\]|\(\s*\))$/i;

export const isNoUnit = (written: string): boolean => noUnit.test(written.trim());

/** The unit of a channel that the text means, with or without brackets around it. */
export function logUnit(written: string, channel: ChannelName): LogUnit | undefined {
	const inner = written
		.trim()
		.replace(/^[[({<]\s*(.*?)\s*[\])}>]$/, '$1')
		.trim();
	const {dimensions, more = {}} = rules[channel];
	const low = inner.toLowerCase();
	if (Object.hasOwn(more, low)) return more[low];
	for (const spelling of [inner, low]) {
		const name = unitName(spelling);
		const unit = dimensions.map(dimension => findUnit(name, dimension)).find(found => found !== undefined);
		if (unit) return {name: unit.name, factor: unit.factor};
	}
	return undefined;
}

/** Whether a number of this channel says nothing without its unit. */
export const needsUnit = (channel: ChannelName): boolean => rules[channel].needed === true;

/** Units to choose from, as people write them. */
export function unitChoices(channel: ChannelName): readonly string[] {
	if (channel === 'time') return ['s', 'ms', 'µs', 'min'];
	if (channel === 'rpm') return ['rpm', '1/min', 'krpm', 'Hz', 'rad/s'];
	return rules[channel].dimensions.flatMap(unitNames);
}
