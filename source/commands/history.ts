/** `droprack history`: what was run at a track and what was seen, and an entry more. */
import {visible} from '../documents/visible.ts';
import {addToHistory} from '../store/history.ts';
import {homeDirectory} from '../store/home.ts';
import type {HistoryEntry, Written} from '../store/kept-documents.ts';
import {keptNamed, listKept} from '../store/list-kept.ts';
import {isSeenRpm, seenRpmWords} from '../store/seen-rpm.ts';
import {localDay} from '../text/heading-view.ts';
import {historyView} from '../text/history-view.ts';
import type {CommandRun} from './command.ts';
import {findDocument, isFileName} from './find-document.ts';
import {printJson, printText} from './print.ts';
import {readAny} from './read-any.ts';
import {badInput, type Found, found, type Reply, replyDone, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import {shelf} from './shelf.ts';
import {replyProblem, replyWritten} from './store-reply.ts';
import type {Surroundings} from './surroundings.ts';

export const history: CommandRun = async (request, around) => {
	const fields = (['date', 'session', 'rpm', 'at', 'remark', 'pair', 'gearbox', 'situation'] as const).filter(
		field => request[field] !== undefined,
	);
	const first = fields[0];
	if (!request.add && first) return replyRefused(badInput(`droprack history: --${first} goes with --add.`));
	if (request.add && !first)
		return replyRefused(badInput('droprack history: --add needs what was seen, such as --rpm 8840 --session race.'));
	if (request.rpm !== undefined && !isSeenRpm(request.rpm))
		return replyRefused(badInput(`droprack history: --rpm is ${seenRpmWords}, found ${request.rpm}.`));
	const track = await trackOf(request.argument ?? '', around);
	if (!track.ok) return replyRefused(track);
	return request.add ? add(track.value, request, around) : list(track.value.name, request, around);
};

type TrackOfHistory = {name: string; air?: Written};

/** The track by file or name. Of one that was forgotten the history can still be had. */
const trackOf = async (asked: string, around: Surroundings): Promise<Found<TrackOfHistory>> => {
	const home = homeDirectory(around.environment);
	const tracks = shelf('track', around).entries;
	const others = listKept(home, 'history')
		.kept.filter(({name}) => !tracks.some(track => track.name === name))
		.map(({name}) => ({name, stem: name, kind: 'history', from: 'saved'}));
	if (asked !== '-' && !isFileName(asked)) {
		const entry = findDocument(asked, [...tracks, ...others], 'track');
		if (!entry.ok) return entry;
		if (entry.value.kind === 'history') return found({name: entry.value.name});
	}
	const read = await readAny(asked, ['track'], around);
	if (!read.ok) return read;
	const {name, air} = read.value.document as {name: string; air?: Written};
	return found({name, ...(air && {air})});
};

/** A season or two; `--top` and `--json` give more. */
const mostShown = 50;

const list = (name: string, request: Request, around: Surroundings): Reply => {
	const home = homeDirectory(around.environment);
	const entries = keptNamed(home, 'history', name)?.document.entries ?? [];
	if (request.json) return replyDone(printJson({track: name, entries}, request));
	return replyDone(printText(historyView(name, entries, request.top ?? mostShown), request, around));
};

/** The day's air and the chosen pair and set are those of the track as saved, unless given. */
const add = ({name, air}: TrackOfHistory, request: Request, around: Surroundings): Reply => {
	const home = homeDirectory(around.environment);
	const preset = keptNamed(home, 'preset', name)?.document;
	const {session, gearbox = preset?.gearbox, rpm, at, situation, remark} = request;
	const pair = request.pair ? `${request.pair.driving}/${request.pair.driven}` : preset?.pair;
	const date = request.date ?? localDay(around.now);
	const entry: HistoryEntry = {date, session, pair, gearbox, air, highestRpm: rpm, at, situation, remark};
	const answer = addToHistory(home, name, [entry]);
	if (!answer.ok) return replyProblem(answer);
	const {file} = answer.value;
	return replyWritten({name, file, entry}, [`added to the history of ${visible(name)}.`], request);
};
