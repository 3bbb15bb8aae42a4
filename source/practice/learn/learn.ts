/** What practice teaches: circumference, growth, drag and power with their uncertainty, and the model held against practice. */
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {Uncertainties} from '../../drivetrain/uncertainties.ts';
import type {LoggedRun} from '../../logs/logged-run.ts';
import {type Candidate, candidateOf, gearboxNamed, onRack} from '../../planning/candidates.ts';
import {done, failed, fault} from '../../planning/faults.ts';
import {measuredPoints} from '../../planning/measured.ts';
import {type Plan, planFor} from '../../planning/plan.ts';
import type {Outcome} from '../../planning/results.ts';
import {finish} from '../../planning/run-rack.ts';
import {counted} from '../../planning/words.ts';
import type {Findings} from '../find/findings.ts';
import {type Anchor, anchorSteps} from './anchor.ts';
import {type CircumferenceLearned, circumferenceFromFindings, circumferenceFromReadings} from './circumference.ts';
import {type Compared, comparedRuns} from './compared.ts';
import {readingsFrom} from './from-findings.ts';
import {type GripLearned, gripSteps} from './grip.ts';
import {modelOf, motionsOf} from './model.ts';
import {type Known, known, type Reading} from './reading.ts';
import {
	type CircumferenceReading,
	circumferenceSeen,
	givenSpeedSe,
	type Held,
	heldCircumferenceShare,
	readingOf,
	type Seen,
} from './seen.ts';
import {type Trim, untrimmed} from './trim.ts';

export type Subject = {
	readonly car: Car;
	readonly track: Track;
	/** What both documents state of their own numbers. */
	readonly uncertainties: {readonly car: Uncertainties; readonly track: Uncertainties};
};

export type Learning = {
	readonly source: 'hand' | 'log' | 'measured';
	/** "practice, 41 laps", "2 numbers seen by hand". */
	readonly from: string;
	/** What the car ran with. */
	readonly candidate: Candidate | undefined;
	readonly circumference: CircumferenceLearned | undefined;
	/** Without a speed one number cannot tell circumference and speed apart: what was taken for right. */
	readonly held: Held | undefined;
	readonly anchor: Anchor | undefined;
	/** Undefined where it was not asked for. */
	readonly grip: GripLearned | undefined;
	readonly readings: readonly Reading[];
	/** All of it, to compute with. */
	readonly trim: Trim;
	readonly compared: readonly Compared[];
};

/** Learning for a caller that has other things to do in between: a step is a straight, or a round of a fit. */
export type LearnSteps = Generator<undefined, Outcome<Learning>, void>;

/** From numbers that were seen by hand; each may be at another straight, with another pair. */
export function learnFromSeen(subject: Subject, seen: readonly Seen[], held: Held): Outcome<Learning> {
	return finish(seenSteps(subject, seen, held));
}

export function seenSteps(subject: Subject, seen: readonly Seen[], held: Held): LearnSteps {
	return withPlan(subject, function* (plan) {
		const ask = modelOf(subject.car, subject.track);
		const words: CircumferenceReading[] = [];
		for (const one of seen) {
			yield;
			const word = circumferenceSeen(plan, ask, one, held);
			if (word !== undefined) words.push(word);
		}
		const circumference = circumferenceFromReadings(plan, words);
		const rolloutM = circumference?.rolloutM ?? statedRollout(subject, plan);
		const readings = seen.map(one => readingOf(plan, ask, one, held, rolloutM));
		const needsHolding = seen.some(one => one.speedMps === undefined);
		const from = `${counted(seen.length, 'number')} seen by hand`;
		return yield* learned(subject, {
			source: 'hand',
			from,
			candidate: seen[0]?.candidate,
			circumference,
			held: needsHolding ? held : undefined,
			readings,
		});
	});
}

/** From a logged run; with the run itself grip is learned too. */
export function learnFromFindings(subject: Subject, findings: Findings, gripFrom?: LoggedRun): Outcome<Learning> {
	return finish(findingsSteps(subject, findings, gripFrom));
}

export function findingsSteps(subject: Subject, findings: Findings, gripFrom?: LoggedRun): LearnSteps {
	return withPlan(subject, function* (plan) {
		const candidate = findings.mounted.best?.candidate;
		const circumference = circumferenceFromFindings(plan, findings);
		const readings =
			candidate === undefined ? [] : yield* readingsFrom(findings, candidate, modelOf(subject.car, subject.track));
		const laps = findings.laps.filter(({kind}) => kind === 'good').length;
		const found = {source: 'log', candidate, circumference, held: undefined, readings} as const;
		const seen = gripFrom && {findings, run: gripFrom};
		return yield* learned(subject, {...found, from: `practice, ${counted(laps, 'lap')}`}, seen);
	});
}

/** From the speeds and RPM that the track holds as measured. */
export function learnFromMeasured(subject: Subject): Outcome<Learning> {
	const steps = withPlan(subject, function* (plan) {
		const readings = measuredReadings(subject, plan);
		const from = `${counted(readings.length, 'measured straight')} of the track`;
		return yield* learned(subject, {
			source: 'measured',
			from,
			candidate: readings[0]?.candidate,
			circumference: undefined,
			held: readings.some(({speedSeen}) => !speedSeen) ? 'circumference' : undefined,
			readings,
		});
	});
	return finish(steps);
}

type Learn = (plan: Plan) => Generator<undefined, Learning, void>;

function* withPlan(subject: Subject, learn: Learn): LearnSteps {
	const plan = planFor(subject.car, subject.track);
	return plan.ok ? done(yield* learn(plan.value)) : plan;
}

function* learned(
	subject: Subject,
	found: Omit<Learning, 'anchor' | 'grip' | 'trim' | 'compared'>,
	seen?: {readonly findings: Findings; readonly run: LoggedRun},
): Generator<undefined, Learning, void> {
	const ask = modelOf(subject.car, subject.track);
	const {circumference} = found;
	const rolled: Trim = {...untrimmed, rollout: circumference?.factor ?? 1, growth: circumference?.growth?.value};
	const {readings} = found;
	let anchored = yield* anchorSteps(ask, readings, rolled);
	let grip: GripLearned | undefined;
	for (let round = 0; seen !== undefined && round < gripRounds; round++) {
		const before = startOfGrip(rolled, anchored);
		const dragSe = anchored?.drag?.se ?? heldDragSe;
		grip = yield* gripSteps(motionsOf(subject.car, subject.track), readings, seen, before, dragSe);
		if (grip.factor === undefined) break;
		// What the exits lost to grip is not the engine's or the air's.
		anchored = yield* anchorSteps(ask, readings, {...rolled, grip: grip.factor.value});
	}
	const trim = anchoredTrim({...rolled, grip: grip?.factor?.value ?? 1}, anchored);
	return {...found, anchor: anchored, grip, trim, compared: yield* comparedRuns(ask, found.readings, trim)};
}

/** Grip and power are fitted in turn: each needs what the other one is. */
const gripRounds = 2;
/** A drag area that no straight tells is right to about this. */
const heldDragSe = 0.05;
/** A power that is further off is not likely: what the exits lost is first laid to grip. */
const likelyPower = 0.1;

function startOfGrip(rolled: Trim, anchored: Anchor | undefined): Trim {
	const power = anchored?.power?.value ?? 1;
	return Math.abs(power - 1) > likelyPower ? rolled : anchoredTrim(rolled, anchored);
}

const anchoredTrim = (trim: Trim, anchored: Anchor | undefined): Trim => ({
	...trim,
	drag: anchored?.drag?.value ?? 1,
	power: anchored?.power?.value ?? 1,
});

/** The circumference of the documents, with what they state of it. */
function statedRollout({uncertainties}: Subject, plan: Plan): Known {
	const {rolloutM} = plan.base.vehicle;
	const sides = (['left', 'right'] as const).map(
		side => uncertainties.track.get(`car.tires.${side}`) ?? uncertainties.car.get(`tires.${side}`),
	);
	const [left, right] = sides;
	// One tape for both sides: their errors go together.
	const stated = left === undefined || right === undefined ? undefined : (left + right) / 2;
	return known(rolloutM, stated ?? rolloutM * heldCircumferenceShare);
}

function measuredReadings({track, uncertainties}: Subject, plan: Plan): Reading[] {
	return measuredPoints(plan).flatMap(({index, straight, speedMps, rpm, candidate, gear}): Reading[] => {
		if (candidate === undefined || speedMps === undefined) return [];
		const stated = (field: string) => uncertainties.track.get(`straights[${index}].measured.${field}`);
		const given = track.straights[index]!.measured;
		const lowest = (track.straights[index]!.gears ?? track.gears)?.lowest ?? 1;
		return [
			{
				index,
				name: straight,
				candidate,
				gear,
				endMps: known(speedMps, stated('end') ?? givenSpeedSe),
				endRpm: rpm === undefined ? undefined : known(rpm, stated('rpm') ?? 0),
				speedSeen: given?.endMps !== undefined,
				exitMps: undefined,
				lengthM: undefined,
				timeS: undefined,
				gears: given?.gear === undefined ? undefined : {lowest: Math.min(lowest, given.gear), highest: given.gear},
				limited: false,
			},
		];
	});
}

/** The pair and set of the car that were named, else the installed ones. */
export function candidateFor(
	car: Car,
	pair: {driving: number; driven: number} | undefined,
	gearbox: string | undefined,
): Outcome<Candidate> {
	const asked = pair ?? car.installed?.pair;
	const name = gearbox ?? car.installed?.gearbox;
	if (asked === undefined || name === undefined)
		return failed([fault('command', asked === undefined ? 'pair' : 'gearbox', 'nothing', 'what the car ran with')]);
	const mounted = onRack(car, asked);
	const set = gearboxNamed(car, name);
	if (mounted === undefined)
		return failed([fault('command', 'pair', `${asked.driving}/${asked.driven}`, 'a pair of this rack')]);
	if (set === undefined)
		return failed([
			fault('command', 'gearbox', `"${name}"`, `one of ${car.gearboxes.map(one => one.name).join(', ')}`),
		]);
	return done(candidateOf(car, mounted, set));
}
