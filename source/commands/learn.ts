/** `droprack learn`: what a logged run, or RPM that was seen, says of the car; accepted field by field, and taken back. */
import {askedColumns} from '../logs/column-option.ts';
import type {LogRead, RememberedColumns} from '../logs/read-log.ts';
import {planFor, settingOf} from '../planning/plan.ts';
import {acceptEdits} from '../practice/learn/accept.ts';
import {
	candidateFor,
	type Learning,
	learnFromFindings,
	learnFromMeasured,
	learnFromSeen,
	type Subject,
} from '../practice/learn/learn.ts';
import {asWritten, effectOn, findingsFor, type Lesson, lessonFrom} from '../practice/learn/lesson.ts';
import {lapPicture, ratioPicture} from '../practice/learn/pictures.ts';
import type {DocumentsAsWritten, Proposal} from '../practice/learn/proposals.ts';
import {readSeen, seenExample} from '../practice/learn/seen-text.ts';
import {isUnclear} from '../practice/learn/unclear.ts';
import {homeDirectory} from '../store/home.ts';
import type {Written} from '../store/kept-documents.ts';
import {readPreferences, rememberColumns} from '../store/preferences.ts';
import {headingOf, localDay} from '../text/heading-view.ts';
import {learnView} from '../text/learn-view.ts';
import {learnedEntry} from '../text/learned-entry.ts';
import {unitsOf} from '../text/units.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {keepLearned, unwritable} from './keep-learned.ts';
import {learnJson} from './learn-json.ts';
import {takeBack} from './learn-take-back.ts';
import {type Loaded, loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {readLogFile} from './read-log-file.ts';
import {badInput, type Found, found, type Refusal, replyDone, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

export const learn: CommandRun = async (request, around) => {
	const asked = askedOf(request);
	if ('ok' in asked) return replyRefused(asked);
	const loaded = await loadDocuments({...request, argument: asked.track}, around);
	if (!loaded.ok) return replyRefused(loaded);
	if (request.takeBack) return takeBack(loaded.value, request.takeBack, request, around);
	const writes = request.accept === undefined ? undefined : unwritable(loaded.value);
	if (writes) return replyRefused(writes);
	const lesson = await lessonOf(asked.log, loaded.value, request, around);
	return lesson.ok ? answer(loaded.value, lesson.value, request, around) : replyRefused(lesson);
};

type Asked = {readonly log: string | undefined; readonly track: string};

/** With one word it is the track, and what was seen comes by hand. */
function askedOf({argument, second, seen, takeBack: back, accept, hold, column, grip}: Request): Asked | Refusal {
	const [log, track] = second === undefined ? [undefined, argument] : [argument, second];
	const wrong =
		track === undefined
			? `which TRACK? By hand: droprack learn TRACK --seen "${seenExample}"; from a log: droprack learn LOG.csv TRACK.`
			: log !== undefined && seen !== undefined
				? 'a log or --seen, one at a time.'
				: log === undefined && column !== undefined
					? '--column goes with a log.'
					: log === undefined && grip
						? '--grip goes with a log.'
						: back !== undefined && (log ?? seen ?? accept) !== undefined
							? '--take-back stands alone with the track.'
							: hold !== undefined && seen === undefined
								? '--hold goes with --seen.'
								: undefined;
	return wrong === undefined ? {log, track: track!} : badInput(`droprack learn: ${wrong}`);
}

type Taught = Lesson & {readonly logged: LogRead | undefined; readonly notes: readonly string[]};

async function lessonOf(
	log: string | undefined,
	loaded: Loaded,
	request: Request,
	around: Surroundings,
): Promise<Found<Taught>> {
	return log === undefined ? byHand(loaded, request) : fromLog(log, loaded, request, around);
}

const subjectOf = ({car, track, uncertainties}: Loaded): Subject => ({car, track, uncertainties});
const documentsOf = ({documents}: Loaded): DocumentsAsWritten => ({
	track: asWritten(documents.track),
	car: asWritten(documents.car),
});

function byHand(loaded: Loaded, request: Request): Found<Taught> {
	const {car, track, labels} = loaded;
	const subject = subjectOf(loaded);
	const plan = planFor(car, track);
	if (!plan.ok) return refuseFaults(plan.faults, labels);
	const installed = {
		pair: request.pair ?? car.installed?.pair,
		gearbox: request.gearbox ?? car.installed?.gearbox,
	};
	const readings = (request.seen ?? []).map(text => ({text, reading: readSeen(text, car, track, installed)}));
	const wrong = readings.flatMap(({text, reading}) =>
		reading.ok
			? []
			: [
					`--seen "${text}": found ${reading.found}; allowed ${reading.allowed}.${reading.hint ? ` ${reading.hint}` : ''}`,
				],
	);
	if (wrong.length > 0) return badInput(wrong.map(one => `droprack learn: ${one}`).join('\n'));
	const seen = readings.flatMap(({reading}) => (reading.ok ? [reading.seen] : []));
	const learning =
		seen.length > 0 ? learnFromSeen(subject, seen, request.hold ?? 'circumference') : learnFromMeasured(subject);
	if (!learning.ok) return refuseFaults(learning.faults, labels);
	if (learning.value.readings.length === 0)
		return badInput(
			`droprack learn: there is nothing to learn from: the track has no measured speed. Give --seen "${seenExample}", or a log before the track.`,
		);
	return found({...lesson(loaded, learning.value, undefined, request), logged: undefined, notes: []});
}

const lesson = (loaded: Loaded, learning: Learning, findings: Lesson['findings'], {units}: Request): Lesson =>
	lessonFrom(subjectOf(loaded), documentsOf(loaded), learning, findings, units);

async function fromLog(log: string, loaded: Loaded, request: Request, around: Surroundings): Promise<Found<Taught>> {
	const {car, track, labels} = loaded;
	const columns = askedColumns(request.column ?? []);
	if (typeof columns === 'string') return badInput(`droprack learn: ${columns}`);
	const home = homeDirectory(around.environment);
	const preferences = readPreferences(home);
	const remembered = preferences.ok
		? (preferences.value.logColumns?.[car.name] as RememberedColumns | undefined)
		: undefined;
	const file = await readLogFile(log, around, {columns, remembered});
	if (!file.ok) return file;
	const {reading} = file.value;
	const said = saidMounted(loaded, request);
	if (!said.ok) return said;
	const findings = findingsFor(car, track, reading.run, said.value);
	if (!findings.ok) return refuseFaults(findings.faults, labels);
	const learning = learnFromFindings(subjectOf(loaded), findings.value, request.grip ? reading.run : undefined);
	if (!learning.ok) return refuseFaults(learning.faults, labels);
	const {mounted} = findings.value;
	if (request.accept && said.value === undefined && isUnclear(findings.value))
		return badInput(
			`droprack learn: nothing is accepted before it is clear what was in the car. ${mounted.why} Say it with --pair and --gearbox.`,
		);
	const kept = await rememberColumns(home, car.name, reading.remember as Parameters<typeof rememberColumns>[2]);
	return found({
		...lesson(loaded, learning.value, findings.value, request),
		logged: reading,
		notes: kept.ok ? [] : [`The columns are not remembered: ${kept.message}`],
	});
}

/** Only what was said: what is installed by the document may have been changed since. */
function saidMounted(
	{car, labels}: Loaded,
	{pair, gearbox}: Request,
): Found<{pair: NonNullable<typeof pair>; gearbox: string} | undefined> {
	if (pair === undefined && gearbox === undefined) return found(undefined);
	const both = {pair: pair ?? car.installed?.pair, gearbox: gearbox ?? car.installed?.gearbox};
	if (both.pair === undefined || both.gearbox === undefined)
		return badInput('droprack learn: --pair and --gearbox go together where the car has nothing installed.');
	const candidate = candidateFor(car, both.pair, both.gearbox);
	return candidate.ok ? found({pair: both.pair, gearbox: both.gearbox}) : refuseFaults(candidate.faults, labels);
}

function answer(loaded: Loaded, taught: Taught, request: Request, around: Surroundings) {
	const {car, track, labels} = loaded;
	const subject = subjectOf(loaded);
	const documents = documentsOf(loaded);
	const plan = planFor(car, track);
	if (!plan.ok) return replyRefused(refuseFaults(plan.faults, labels));
	const chosen = chosenFrom(taught.proposals, request.accept ?? []);
	if (!chosen.ok) return replyRefused(chosen);
	const effect = effectOn(subject, documents, chosen.value.length > 0 ? chosen.value : taught.proposals);
	if (!effect.ok) return replyRefused(refuseFaults(effect.faults, labels));
	const notes = [...loaded.notes, ...taught.notes];
	if (chosen.value.length > 0) {
		const origin = {from: taught.learning.from, date: around.now.toISOString()};
		const edits = acceptEdits(chosen.value, documents, origin);
		const air = loaded.documents.track.air as Written | undefined;
		const entry = learnedEntry(taught.learning, chosen.value, air, localDay(around.now));
		const kept = keepLearned(loaded, edits, entry, request, around);
		if (!kept.ok) return replyRefused(kept);
		notes.push(...kept.value);
	}
	const accepted = chosen.value.map(({name}) => name);
	if (request.json)
		return replyDone(printJson(learnJson({car, track, taught, effect: effect.value, accepted}), request), notes);
	const {findings, learning, logged} = taught;
	const view = learnView(
		{
			heading: headingOf(car, track, around.now),
			setting: settingOf(plan.value, false),
			learning,
			findings,
			proposals: taught.proposals,
			accepted,
			effect: effect.value,
			remarks: logged?.remarks.map(({text}) => text) ?? [],
			pictures:
				findings && logged
					? {ratio: ratioPicture(findings), lap: lapPicture(subject, logged.run, findings, learning)}
					: undefined,
		},
		unitsOf(request.units),
	);
	return replyDone(printText(view, request, around), notes);
}

/** The proposals that were named; a name that is none is refused with those that are. */
function chosenFrom(proposals: readonly Proposal[], names: readonly string[]): Found<readonly Proposal[]> {
	if (names.includes('all')) return found(proposals);
	const known = proposals.map(({name}) => name);
	const unknown = names.find(name => !known.some(one => sameName(one, name)));
	if (unknown !== undefined)
		return badInput(
			`droprack learn: --accept knows no ${unknown}. There is: all${known.map(one => `, ${one}`).join('')}.`,
		);
	return found(proposals.filter(({name}) => names.some(one => sameName(one, name))));
}

const sameName = (one: string, other: string): boolean => one.toLowerCase() === other.toLowerCase();
