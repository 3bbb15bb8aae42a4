/** The lines that every answer starts with: whose numbers these are, and for which day. */
import {referenceDay} from '../drivetrain/air.ts';
import type {Air, Track} from '../drivetrain/track.ts';
import type {Setting} from '../planning/results.ts';
import {type Block, cell, line, text} from './blocks.ts';
import {fixed, rpm, type Units} from './units.ts';

/** Whose numbers an answer holds. */
export type Heading = {
	car: string;
	track: string;
	trackType: string;
	/** The day of the answer, YYYY-MM-DD. */
	day: string;
	air: Air | undefined;
};

export const headingOf = (car: {name: string}, track: Track, now: Date): Heading => ({
	car: car.name,
	track: track.name,
	trackType: track.type,
	day: localDay(now),
	air: track.air,
});

const two = (value: number) => String(value).padStart(2, '0');
/** The calendar's day where the person is, as in ISO 8601. */
export const localDay = (now: Date): string => `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;

export const airWords = (air: Air | undefined, units: Units): string => {
	const temperature = units.text('temperature', air?.temperatureC ?? referenceDay.temperatureC);
	const pressure = units.text('pressure', air?.pressurePa ?? referenceDay.pressurePa);
	const dampness =
		air?.dewPointC === undefined
			? `${fixed((air?.humidity ?? referenceDay.humidity) * 100, 0)} % humidity`
			: `dew point ${units.text('temperature', air.dewPointC)}`;
	return `${temperature}, ${pressure}, ${dampness}`;
};

/** First line: car, engine build, day, air. Then the track with what is asked of it, and what bounds the answer. */
export const headingView = (heading: Heading, what: string, setting: Setting, units: Units): Block[] => [
	text([heading.car, `engine ${setting.engine}`, heading.day, airWords(heading.air, units)].join(' · '), 'strong', 2),
	text([heading.track, trackWords(heading.trackType), what].join(' · '), 'plain', 2),
	text(settingWords(setting, units), 'muted', 2),
];

const trackWords = (type: string): string =>
	type === 'road' ? 'road course' : type === 'superspeedway' ? type : `${type} track`;

const settingWords = (setting: Setting, units: Units): string =>
	[
		`limit ${rpm(setting.rpmLimit)} rpm (${setting.limitFrom})`,
		`band ${rpm(setting.bandLowRpm)}-${rpm(setting.bandHighRpm)}`,
		`${units.text('power', setting.peakPowerW)} at ${rpm(setting.peakPowerRpm)} today (correction ${fixed(setting.correction, 3)})`,
		`air ${units.text('density', setting.airDensityKgM3)}`,
		...(setting.anchored ? ['anchored to measured speeds'] : []),
	].join(' · ');

/** What the reader must know before acting on an answer. */
export const caution = "An estimate: the engine builder's limit, the rule book and officials decide.";

/** Remarks, each once, and the caution. */
export const closingView = (remarks: readonly string[]): Block[] => [
	...[...new Set(remarks)].map(remark => text(`- ${remark}`, 'plain', 2)),
	...(remarks.length > 0 ? [line()] : []),
	text(caution, 'muted'),
];

export const verdictCell = (verdict: 'pass' | 'near' | 'fail') => cell(verdict === 'fail' ? 'FAIL' : verdict, verdict);
