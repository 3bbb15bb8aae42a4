/** What a log may say of a run. `speed`, `rpm` and one of `time` and `distance` are required. */
export const channelNames = [
	'time',
	'distance',
	'speed',
	'rpm',
	'throttle',
	'gear',
	'lap',
	'brake',
	'steering',
] as const;
export type ChannelName = (typeof channelNames)[number];

export const isChannelName = (name: string): name is ChannelName => (channelNames as readonly string[]).includes(name);

/** Which column a channel is to be taken from: a header, or `#3`, with or without a unit as in `Speed [mph]`, or `none`. */
export type AskedColumns = Partial<Record<ChannelName, string>>;

/** What was asked for with a log, to read the next one likewise. Plain data: it may be kept as JSON. */
export type RememberedColumns = Partial<Record<ChannelName, RememberedColumn>>;
export type RememberedColumn = {
	/** As it stands in the log, without its unit where that tells it from the others; null where the channel is to be left out. */
	readonly header: string | null;
	/** The unit, where the log does not state it itself. */
	readonly unit?: string;
};
