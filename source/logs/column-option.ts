/** `--column` of the command line: `speed=GPS Speed`, `speed=#3 [mph]`, `brake=none`; any number of them. */
import {didYouMean} from '../documents/nearest.ts';
import {visible} from '../documents/visible.ts';
import {type AskedColumns, type ChannelName, channelNames, isChannelName} from './channels.ts';

/** What the values ask for, or a sentence that says what is wrong with one. */
export function askedColumns(values: readonly string[]): AskedColumns | string {
	const asked: AskedColumns = {};
	for (const value of values) {
		const equals = value.indexOf('=');
		const name = value.slice(0, Math.max(0, equals)).trim().toLowerCase();
		const column = value.slice(equals + 1).trim();
		if (equals < 1 || column === '')
			return `--column is CHANNEL=HEADER, such as speed="GPS Speed", found ${visible(value)}.`;
		if (!isChannelName(name)) return unknownChannel(name);
		asked[name] = column;
	}
	return asked;
}

function unknownChannel(name: string): string {
	const meant = didYouMean(name, channelNames);
	return [`--column knows no channel ${visible(name)}.`, meant, `Channels: ${channelNames.join(', ')}.`]
		.filter(Boolean)
		.join(' ');
}

/** The option that takes a channel from a column, as one types it in a shell. */
export function columnOption(channel: ChannelName, column: string): string {
	const isPlain = /^[\w.-]+$/.test(column);
	if (isPlain) return `--column ${channel}=${column}`;
	return `--column ${channel}=${/["$`\\!]/.test(column) ? `'${column.replaceAll("'", "'\\''")}'` : `"${column}"`}`;
}
