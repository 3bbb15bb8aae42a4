/** A learning with what would come of it: the fields that would change, and the ranking before and after. */

import {withEdits} from '../../documents/edits.ts';
import type {JsonObject} from '../../documents/json.ts';
import {checkCar, checkTrack} from '../../documents/read.ts';
import type {Car, Pair} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {LoggedRun} from '../../logs/logged-run.ts';
import {gearboxNamed, onRack} from '../../planning/candidates.ts';
import {done} from '../../planning/faults.ts';
import {planFor} from '../../planning/plan.ts';
import {rankRack} from '../../planning/rank-rack.ts';
import type {Outcome} from '../../planning/results.ts';
import {finish} from '../../planning/run-rack.ts';
import {findSteps} from '../find/find-in-log.ts';
import type {Findings} from '../find/findings.ts';
import type {Steps} from '../find/steps.ts';
import {acceptEdits} from './accept.ts';
import {type Effect, effectOf} from './effect.ts';
import type {Learning, Subject} from './learn.ts';
import {type DocumentsAsWritten, type Proposal, proposalsOf} from './proposals.ts';
import type {Readers} from './written.ts';

export type Lesson = {
	readonly learning: Learning;
	/** Where it was learned from a log. */
	readonly findings: Findings | undefined;
	readonly proposals: readonly Proposal[];
};

export function lessonFrom(
	subject: Subject,
	documents: DocumentsAsWritten,
	learning: Learning,
	findings: Findings | undefined,
	readers: Readers,
): Lesson {
	return {learning, findings, proposals: proposalsOf(subject, documents, learning, findings, readers)};
}

/** Car and track with the proposals in them; the documents are such that their readers take them. */
export function withProposals(
	documents: DocumentsAsWritten,
	proposals: readonly Proposal[],
): {readonly car: Car; readonly track: Track} {
	const edits = acceptEdits(proposals, documents, {from: 'practice', date: '2000-01-01'});
	const [track, car] = [
		checkTrack({...withEdits(documents.track, edits.track)}),
		checkCar({...withEdits(documents.car, edits.car)}),
	];
	if (!track.ok || !car.ok) throw new Error('a proposal that the readers refuse');
	return {track: track.value, car: car.value};
}

/** What accepting these does to the ranking; undefined where nothing would change. */
export function effectOn(
	subject: Subject,
	documents: DocumentsAsWritten,
	proposals: readonly Proposal[],
): Outcome<Effect | undefined> {
	if (proposals.length === 0) return done(undefined);
	const before = rankRack(subject.car, subject.track);
	if (!before.ok) return before;
	const {car, track} = withProposals(documents, proposals);
	const after = rankRack(car, track);
	return after.ok ? done(effectOf(before.value, after.value)) : after;
}

/** What somebody says was in the car. */
export type SaidMounted = {readonly pair: Pair; readonly gearbox: string};

/**
 * What the log shows. Where another pair fits better than the one that was said to be mounted, `said` is taken at its word, and the
 * findings are those with it; unless said, the log is.
 */
export function findingsFor(car: Car, track: Track, run: LoggedRun, said: SaidMounted | undefined): Outcome<Findings> {
	return finish(findingsForSteps(car, track, run, said));
}

/** The same step by step. */
export function* findingsForSteps(
	car: Car,
	track: Track,
	run: LoggedRun,
	said: SaidMounted | undefined,
): Steps<Outcome<Findings>> {
	const plan = planFor(car, track);
	if (!plan.ok) return plan;
	const findings = yield* findSteps(run, plan.value, said ?? car.installed);
	const {verdict} = findings.mounted;
	if (said === undefined || (verdict !== 'otherFits' && verdict !== 'flippedFits')) return done(findings);
	const alone = planFor(onlyWith(car, said), {
		...track,
		straights: track.straights.map(one => ({...one, measured: undefined})),
	});
	if (!alone.ok) return alone;
	const again = yield* findSteps(run, alone.value, said);
	return done({...again, mounted: {...again.mounted, why: `${findings.mounted.why} ${againWords(said)}`}});
}

const againWords = ({pair, gearbox}: SaidMounted) =>
	`You say that ${pair.driving}/${pair.driven} ${gearbox} was in the car: it is taken at that.`;

function onlyWith(car: Car, {pair, gearbox}: SaidMounted): Car {
	const mounted = onRack(car, pair);
	const set = gearboxNamed(car, gearbox);
	return {
		...car,
		rack: {...car.rack, eitherShaft: false, pairs: mounted ? [mounted] : car.rack.pairs},
		gearboxes: set ? [set] : car.gearboxes,
		installed: {pair, gearbox},
		rules: {},
	};
}

/** JSON that is an object, as the readers give it. */
export const asWritten = (document: Record<string, unknown>): JsonObject => document as JsonObject;
