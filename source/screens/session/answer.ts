/** What follows from the inputs: the ranking, or what stands in its way. */
import type {Problem} from '../../documents/read.ts';
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {Ranked} from '../../planning/rank-rack.ts';
import type {Fault, SingleRun} from '../../planning/results.ts';
import type {Progress} from '../../planning/run-rack.ts';
import {current, type Documents} from './documents.ts';
import {readCarOf, readTrackOf} from './forms.ts';

/** Something that keeps the rack from being ranked. */
export type Wrong = {readonly where: string; readonly path: string; readonly words: string};

export type Answer =
	| {readonly is: 'faulty'; readonly wrong: readonly Wrong[]}
	/** The pair in the car comes first, by itself; `before` is the last ranking of the same documents' earlier content. */
	| {
			readonly is: 'working';
			readonly progress: Progress;
			readonly first: SingleRun | undefined;
			readonly before: Ranked | undefined;
	  }
	| {readonly is: 'stopped'; readonly progress: Progress; readonly before: Ranked | undefined}
	| {readonly is: 'ready'; readonly ranked: Ranked};

/** The ranking that is shown, be it the one of a moment ago. */
export function rankedIn(answer: Answer): Ranked | undefined {
	if (answer.is === 'ready') return answer.ranked;
	return answer.is === 'faulty' ? undefined : answer.before;
}

export type Inputs = {readonly documents: Documents; readonly situation: string | undefined};
export type Read =
	| {readonly ok: true; readonly track: Track; readonly car: Car}
	| {readonly ok: false; readonly wrong: Wrong[]};

/** Track and car of a session as the arithmetic takes them, or all that is wrong with them. */
export function readBoth(documents: Documents): Read {
	const track = readTrackOf(current(documents, 'track').json);
	const car = readCarOf(current(documents, 'car').json);
	if (track.ok && car.ok) return {ok: true, track: track.value, car: car.value};
	const of = (where: string, problems: readonly Problem[]) => problems.map(problem => wrongFrom(where, problem));
	return {ok: false, wrong: [...of('track', track.ok ? [] : track.problems), ...of('car', car.ok ? [] : car.problems)]};
}

const wrongFrom = (where: string, {path, found, allowed, hint}: Problem): Wrong => ({
	where,
	path,
	words: `found ${found}; allowed ${allowed}${hint === undefined ? '' : `. ${hint}`}`,
});

export const wrongFromFault = ({document, path, found, allowed}: Fault): Wrong => ({
	where: document,
	path,
	words: `found ${found}; allowed ${allowed}`,
});
