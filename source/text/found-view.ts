/** What a logged run shows, in lines. */
import {lengthText, longLengthText, rpmText, secondsText} from '../planning/words.ts';
import type {Findings, Lap, LapKind, RevEvent} from '../practice/find/findings.ts';
import {type Block, cell, type Making, tableOf, text} from './blocks.ts';
import {fixed, rpm, rpmUp, type Units} from './units.ts';

const kindWords: Record<LapKind, string> = {
	good: 'good',
	out: 'out',
	in: 'in',
	pace: 'at pace speed',
	slow: 'slow',
	part: 'cut off',
};

/** "20 good laps; not used: 1 out, 2 slow". */
export function lapWords(laps: readonly Lap[]): string {
	const counts = new Map<LapKind, number>();
	for (const {kind} of laps) counts.set(kind, (counts.get(kind) ?? 0) + 1);
	const good = counts.get('good') ?? 0;
	const others = [...counts].filter(([kind]) => kind !== 'good').map(([kind, count]) => `${count} ${kindWords[kind]}`);
	return `${good} good ${good === 1 ? 'lap' : 'laps'}${others.length > 0 ? `; not used: ${others.join(', ')}` : ''}`;
}

/** As many events as one reads. */
const mostEvents = 8;

export function foundView(findings: Findings, units: Units): Block[] {
	const {log, laps, mounted, shifts, events, wheelspin, limiter, highestRpm, highestMps} = findings;
	const peaks = [
		...(highestRpm ? [`highest ${rpmText(highestRpm.value)} at ${fixed(highestRpm.timeS, 1)} s`] : []),
		...(highestMps ? [`${units.text('speed', highestMps.value)} at ${fixed(highestMps.timeS, 1)} s`] : []),
	];
	return [
		text('What the log shows', 'strong'),
		text(
			[
				lapWords(laps),
				longLengthText(log.distanceM),
				`${fixed(log.rateHz, log.rateHz < 10 ? 1 : 0)} samples a second`,
				...peaks,
			].join(' · '),
			'plain',
			2,
		),
		text(mounted.why, mounted.verdict === 'asInstalled' ? 'plain' : 'near', 2),
		...shifts.map(({from, rpm: at, timeS}) =>
			text(
				`Shift ${from}-${from + 1} at ${rpmText(at.median)}${at.sd === undefined ? '' : ` (one in three more than ${rpm(at.sd)} off)`}, in ${secondsText(timeS.median)}, ${at.count} times.`,
				'plain',
				2,
			),
		),
		...(limiter.distanceM > 0
			? [
					text(
						`On the limiter at ${rpmText(limiter.rpm)} for ${lengthText(limiter.distanceM)}, ${limiter.passes} times.`,
						'near',
						2,
					),
				]
			: []),
		...(wheelspin.spinning > 0
			? [text(`Wheelspin at ${wheelspin.spinning} of ${wheelspin.exits} exits; left out of the fit.`, 'plain', 2)]
			: []),
		...eventsView(events, laps),
	];
}

const eventWords: Record<RevEvent['kind'], string> = {
	missedShift: 'missed shift',
	overRev: 'over the limit',
	downshift: 'downshift over the limit',
};

function eventsView(events: readonly RevEvent[], laps: readonly Lap[]): Block[] {
	if (events.length === 0) return [];
	const columns: Making<RevEvent>[] = [
		{
			head: 'event',
			align: 'left',
			keep: 0,
			cell: ({kind}) => cell(eventWords[kind], kind === 'missedShift' ? 'near' : 'fail'),
		},
		{head: 'rpm', align: 'right', keep: 0, cell: event => cell(rpmUp(event.rpm))},
		{head: 'at s', align: 'right', keep: 0, cell: event => cell(fixed(event.timeS, 1))},
		{head: 'lap', align: 'right', keep: 1, cell: event => cell(String(laps[event.lap]?.number ?? ''))},
		{head: 'for s', align: 'right', keep: 2, cell: event => cell(fixed(event.forS, 2))},
		{head: 'gears', align: 'left', keep: 3, cell: ({from, into}) => cell([from, into].filter(Boolean).join('-'))},
	];
	// The worst are the ones to look at.
	const shown = events.toSorted((a, b) => b.rpm - a.rpm).slice(0, mostEvents);
	const left = events.length - shown.length;
	return [tableOf(columns, shown, 2), ...(left > 0 ? [text(`${left} more, with lower RPM.`, 'muted', 2)] : [])];
}
