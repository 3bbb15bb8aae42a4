/** What practice teaches about what is looked at. Loaded when the place is first looked at: a start does not need it. */

import {withEdits} from '../../documents/edits.ts';
import type {JsonObject} from '../../documents/json.ts';
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Steps} from '../../practice/find/steps.ts';
import {acceptEdits, takeablesIn, takeBackEdits} from '../../practice/learn/accept.ts';
import {findingsSteps, type Subject, seenSteps} from '../../practice/learn/learn.ts';
import {findingsForSteps, lessonFrom} from '../../practice/learn/lesson.ts';
import {lapPicture, ratioSteps} from '../../practice/learn/pictures.ts';
import type {Seen} from '../../practice/learn/seen.ts';
import {readSeen, type SeenReading} from '../../practice/learn/seen-text.ts';
import {isUnclear} from '../../practice/learn/unclear.ts';
import {current, type Documents, withJson} from './documents.ts';
import {readCarOf, readTrackOf} from './forms.ts';
import type {Practice, PracticeLog} from './practice.ts';
import {practiceOf} from './practice-of.ts';
import type {Session} from './session.ts';
import type {Taught} from './taught.ts';

function subjectIn({history: {present}}: Session): Subject | undefined {
	const track = readTrackOf(current(present, 'track').json);
	const car = readCarOf(current(present, 'car').json);
	if (!track.ok || !car.ok) return undefined;
	return {
		track: track.value,
		car: car.value,
		uncertainties: {track: track.uncertainties, car: car.uncertainties},
	};
}

/** Undefined where the documents cannot be read. Step by step: a straight, a round of a fit, a picture. */
export function* teachSteps(session: Session): Generator<undefined, Taught | undefined, void> {
	const practice = practiceOf(session);
	const subject = subjectIn(session);
	if (subject === undefined) return undefined;
	const {present} = session.history;
	const documents = {track: current(present, 'track').json, car: current(present, 'car').json};
	const {installed} = subject.car;
	const inCar = installed && `${installed.pair.driving}/${installed.pair.driven} ${installed.gearbox}`;
	const nothing: Taught = {
		lesson: undefined,
		takeables: takeablesIn(documents),
		after: undefined,
		pictures: undefined,
		inCar,
		wrong: undefined,
	};
	const {log} = practice;
	const seen = log === undefined ? seenIn(practice, subject) : [];
	if (log === undefined && seen.length === 0) return nothing;
	const learning = yield* log === undefined
		? seenSteps(subject, seen, practice.held)
		: findingsSteps(subject, log.findings, practice.grip ? log.run : undefined);
	if (!learning.ok)
		return {
			...nothing,
			wrong: learning.faults.map(({path, found, allowed}) => `${path}: found ${found}; allowed ${allowed}`).join('. '),
		};
	const lesson = lessonFrom(subject, documents, learning.value, log?.findings, session.units);
	const edits = acceptEdits(lesson.proposals, documents, {from: 'practice', date: '2000-01-01'});
	const after = lesson.proposals.length === 0 ? undefined : withBoth(present, documents, edits);
	yield;
	const pictures = log && {
		ratio: log.ratio,
		lap: lapPicture(subject, log.run, log.findings, learning.value),
	};
	return {...nothing, lesson, after, pictures};
}

function withBoth(
	documents: Documents,
	{track, car}: {track: JsonObject; car: JsonObject},
	edits: ReturnType<typeof acceptEdits>,
): Documents {
	return withJson(withJson(documents, 'track', withEdits(track, edits.track)), 'car', withEdits(car, edits.car));
}

/** What no longer fits the documents, such as a straight that was renamed, is passed over. */
function seenIn({seen}: Practice, subject: Subject): Seen[] {
	return seen.flatMap(({straight, text}) => {
		const reading = readIn(subject, straight, text);
		return reading.ok ? [reading.seen] : [];
	});
}

function readIn({car, track}: {car: Car; track: Track}, straight: string, text: string): SeenReading {
	return readSeen(`${straight} ${text}`, car, track, {pair: car.installed?.pair, gearbox: car.installed?.gearbox});
}

/** What is wrong with a number as typed; undefined where it can be taken. */
export function wrongWith(session: Session, straight: string, text: string): string | undefined {
	const subject = subjectIn(session);
	if (subject === undefined) return 'track and car cannot be read yet';
	const reading = readIn(subject, straight, text);
	if (reading.ok) return undefined;
	return `found ${reading.found}; allowed ${reading.allowed}${reading.hint === undefined ? '' : `. ${reading.hint}`}`;
}

/** The log with what it shows; words where no plan can be made of the documents. Each step looks at a bounded number of samples. */
export function* logSteps(
	session: Session,
	label: string,
	run: LoggedRun,
	remarks: readonly string[],
): Steps<PracticeLog | string> {
	const subject = subjectIn(session);
	if (subject === undefined) return 'track and car cannot be read yet';
	const findings = yield* findingsForSteps(subject.car, subject.track, run, undefined);
	if (!findings.ok) return findings.faults.map(({path, found}) => `${path}: found ${found}`).join('. ');
	return {label, run, findings: findings.value, ratio: yield* ratioSteps(findings.value), remarks};
}

export {acceptEdits, isUnclear, takeBackEdits};
