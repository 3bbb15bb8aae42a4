/** A header taken apart: its name, and its unit where it has one. */
import {type ChannelName, channelNames} from './channels.ts';
import {meaningOf} from './header-names.ts';
import {type LogUnit, logUnit} from './log-units.ts';

export type Header = {
	/** From 1. */
	readonly column: number;
	/** As it stands in the log. */
	readonly written: string;
	/** Without the unit. */
	readonly name: string;
	/** What stands in brackets after a name we know, or after the last blank where that is a unit. */
	readonly unitText: string | undefined;
	/** What the name means; undefined where we do not know. */
	readonly channel: ChannelName | undefined;
	/** How surely: 0 is the first choice. */
	readonly rank: number;
};

/** Longer is no header that a person reads. */
const longestHeader = 200;

export function headerOf(text: string, column: number): Header {
	const written = text.trim();
	const whole = {column, written, name: written, unitText: undefined, channel: undefined, rank: 0};
	if (written.length > longestHeader) return whole;
	const bracketed = splitBrackets(written);
	if (bracketed && isUnit(bracketed.unitText)) return {...whole, ...bracketed, ...meaningOf(bracketed.name)};
	const meaning = meaningOf(written);
	if (meaning) return {...whole, ...meaning};
	for (const parts of [splitLastWord(written), splitLastHump(written)]) {
		const meant = parts && meaningOf(parts.name);
		if (meant && logUnit(parts.unitText, meant.channel)) return {...whole, ...parts, ...meant};
	}
	const inside = bracketed && meaningOf(bracketed.name);
	return inside ? {...whole, ...bracketed, ...inside} : whole;
}

type Parts = {readonly name: string; readonly unitText: string};

const openingFor: Readonly<Record<string, string>> = {']': '[', ')': '(', '}': '{', '>': '<'};

/** `Speed [km/h]` and the like. */
function splitBrackets(text: string): Parts | undefined {
	const opening = openingFor[text.at(-1) ?? ''];
	const at = opening === undefined ? -1 : text.lastIndexOf(opening);
	return at < 1 ? undefined : {name: text.slice(0, at).trim(), unitText: text.slice(at + 1, -1).trim()};
}

/** `Speed, km/h`, `speed_kmh`, `Time ms`. */
function splitLastWord(text: string): Parts | undefined {
	const at = Math.max(text.lastIndexOf(' '), text.lastIndexOf('_'), text.lastIndexOf(','));
	return at < 1 ? undefined : {name: text.slice(0, at).trim(), unitText: text.slice(at + 1)};
}

/** `speedKmh`, `timeMs`: the unit begins with the last capital letter. */
function splitLastHump(text: string): Parts | undefined {
	const at = text.search(/(?<=[a-z])[A-Z][a-z]*$/);
	return at < 1 ? undefined : {name: text.slice(0, at), unitText: text.slice(at)};
}

export const isUnit = (text: string): boolean => channelNames.some(channel => logUnit(text, channel) !== undefined);

export const unitOf = ({unitText}: Header, channel: ChannelName): LogUnit | undefined =>
	unitText === undefined ? undefined : logUnit(unitText, channel);
