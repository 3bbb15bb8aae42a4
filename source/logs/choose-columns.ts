/** Which column is which channel: asked for, else as remembered, else by its name. */
import {
	type AskedColumns,
	type ChannelName,
	channelNames,
	type RememberedColumn,
	type RememberedColumns,
} from './channels.ts';
import {ambiguous, type ColumnProblem, missing, takenTwice, wrongAsked} from './column-problems.ts';
import {findAsked} from './find-asked.ts';
import type {Header} from './headers.ts';
import type {ColumnUse} from './reading.ts';

export type ChosenColumn = {
	readonly channel: ChannelName;
	readonly header: Header;
	readonly by: ColumnUse['by'];
	/** The unit asked for or remembered, as text. */
	readonly unitText: string | undefined;
};

export type Choice = {
	readonly columns: readonly ChosenColumn[];
	/** Channels that are not to be used. */
	readonly none: readonly ChannelName[];
	/** Channels that several columns may be, and that can be done without. */
	readonly leftOut: readonly {channel: ChannelName; headers: readonly Header[]}[];
	readonly problems: readonly ColumnProblem[];
	/** Headers that were remembered and are not there; nothing that was remembered is used then. */
	readonly notThere: readonly string[];
};

/** Channels that a run can be read without, so that no choice needs to be asked for. */
const dispensable: ReadonlySet<ChannelName> = new Set(['brake', 'steering']);

export function chooseColumns(
	headers: readonly Header[],
	asked: AskedColumns,
	remembered: RememberedColumns | undefined,
): Choice {
	const memory = mappingFor(headers, remembered ?? {});
	const columns: ChosenColumn[] = [];
	const [none, leftOut, problems]: [ChannelName[], Choice['leftOut'][number][], ColumnProblem[]] = [[], [], []];
	for (const channel of channelNames) {
		const wish = asked[channel];
		const kept = memory.fits ? memory.columns.get(channel) : undefined;
		if (wish !== undefined) {
			const found = findAsked(wish, headers);
			if (found.kind === 'none') none.push(channel);
			else if (found.kind === 'one') columns.push({channel, by: 'asked', ...found});
			else problems.push(wrongAsked(channel, wish, found, headers));
		} else if (kept !== undefined) {
			if (kept.header === null) none.push(channel);
			else columns.push({channel, by: 'remembered', header: kept.header, unitText: kept.unit});
		} else {
			const candidates = candidatesFor(channel, headers);
			if (candidates.length === 1) columns.push({channel, by: 'name', header: candidates[0]!, unitText: undefined});
			else if (candidates.length > 1 && dispensable.has(channel)) leftOut.push({channel, headers: candidates});
			else if (candidates.length > 1) problems.push(ambiguous(channel, candidates, headers));
		}
	}
	problems.push(...usedTwice(columns, headers));
	const isChosen = (channel: ChannelName) =>
		columns.some(column => column.channel === channel) || problems.some(problem => problem.channel === channel);
	for (const channel of ['speed', 'rpm'] as const) if (!isChosen(channel)) problems.push(missing(channel, headers));
	if (!isChosen('time') && !isChosen('distance')) problems.push(missing('time', headers));
	return {columns, none, leftOut, problems, notThere: memory.fits ? [] : memory.notThere};
}

function usedTwice(columns: readonly ChosenColumn[], headers: readonly Header[]): ColumnProblem[] {
	const first = new Map<number, ChannelName>();
	return columns.flatMap(({channel, header}) => {
		const other = first.get(header.column);
		first.set(header.column, other ?? channel);
		return other === undefined ? [] : [takenTwice(channel, other, header, headers)];
	});
}

/** The columns whose names mean the channel, of the first rank that has any. */
function candidatesFor(channel: ChannelName, headers: readonly Header[]): readonly Header[] {
	const meant = headers.filter(header => header.channel === channel);
	const first = Math.min(...meant.map(({rank}) => rank));
	return meant.filter(({rank}) => rank === first);
}

type Kept = {readonly header: Header | null; readonly unit: string | undefined};
type Memory =
	| {readonly fits: true; readonly columns: ReadonlyMap<ChannelName, Kept>}
	| {readonly fits: false; readonly notThere: readonly string[]};

/** What was remembered, in the headers of this log: all of it, or none where a header is no longer there exactly once. */
export function mappingFor(headers: readonly Header[], remembered: RememberedColumns): Memory {
	const columns = new Map<ChannelName, Kept>();
	const notThere: string[] = [];
	for (const channel of channelNames) {
		const kept: RememberedColumn | undefined = remembered[channel];
		if (kept === undefined) continue;
		if (kept.header === null) columns.set(channel, {header: null, unit: undefined});
		else {
			const found = findAsked(kept.header, headers);
			if (found.kind === 'one') columns.set(channel, {header: found.header, unit: kept.unit});
			else notThere.push(kept.header);
		}
	}
	return notThere.length > 0 ? {fits: false, notThere} : {fits: true, columns};
}
