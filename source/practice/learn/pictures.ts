/** The numbers behind the pictures of a log: how often each ratio of engine to road speed was held, and a lap beside the model. */
import type {LoggedRun} from '../../logs/logged-run.ts';
import {finish} from '../../planning/run-rack.ts';
import {type Findings, type Pass, sampleState} from '../find/findings.ts';
import {roughQuantile} from '../find/smooth.ts';
import {Pace, type Steps} from '../find/steps.ts';
import type {Learning, Subject} from './learn.ts';
import {tracesOf} from './model.ts';
import {untrimmed} from './trim.ts';

/** One hump a gear: the ratio n·C/(60·V·(1 + slip)) by the circumference that explains the log, and how many samples were there. */
export type RatioPicture = {
	readonly points: readonly (readonly [ratio: number, samples: number])[];
	/** Overall ratios of the pair and set that explain the log. */
	readonly gears: readonly {readonly gear: number; readonly ratio: number}[];
};

const bins = 240;
/** Around the ratios that were seen. */
const roomAround = 1.12;

export const ratioPicture = (findings: Findings): RatioPicture => finish(ratioSteps(findings));

/** The same step by step, each of a bounded number of samples. */
export function* ratioSteps({samples, mounted}: Findings): Steps<RatioPicture> {
	const factor = mounted.best?.circumferenceFactor ?? 1;
	const pace = new Pace();
	const held: number[] = [];
	for (let i = 0; i < samples.overall.length; i++) {
		if (pace.isDue()) yield;
		if (Number.isFinite(samples.overall[i]!) && isUnderPower(samples.state[i]!))
			held.push(samples.overall[i]! * factor);
	}
	const gears = (mounted.best?.candidate.train.overall ?? []).map((ratio, i) => ({gear: i + 1, ratio}));
	if (held.length === 0) return {points: [], gears};
	// A few wild ratios would press all the rest together.
	const low = roughQuantile(held, 0.005) / roomAround;
	const high = roughQuantile(held, 0.995) * roomAround;
	const counts = new Array<number>(bins).fill(0);
	for (const ratio of held) {
		if (pace.isDue()) yield;
		const bin = Math.floor(((ratio - low) / (high - low)) * bins);
		if (bin >= 0 && bin < bins) counts[bin]!++;
	}
	return {
		points: counts.map((count, i) => [low + ((i + 0.5) / bins) * (high - low), count] as const),
		gears: gears.filter(({ratio}) => ratio >= low && ratio <= high),
	};
}

const isUnderPower = (state: number): boolean => state === sampleState.steady || state === sampleState.spin;

/** Speed along one lap: `[distance in m from the start of the lap, speed in m/s]`. */
export type LapPicture = {
	readonly lap: number;
	readonly logged: readonly (readonly [number, number])[];
	/** A straight each, by the documents as they are and with what was learned; where its full throttle began in that lap. */
	readonly before: readonly (readonly (readonly [number, number])[])[];
	readonly after: readonly (readonly (readonly [number, number])[])[];
};

/** The good lap in the middle by its time; undefined without one. */
export function lapPicture(
	subject: Subject,
	run: LoggedRun,
	findings: Findings,
	learning: Learning,
): LapPicture | undefined {
	const good = findings.laps
		.map((lap, index) => ({lap, index}))
		.filter(({lap}) => lap.kind === 'good')
		.sort((a, b) => a.lap.timeS - b.lap.timeS);
	const middle = good[Math.floor(good.length / 2)];
	if (middle === undefined) return undefined;
	const {from, to, number} = middle.lap;
	const startM = run.distanceM[from]!;
	const logged: [number, number][] = [];
	const step = Math.max(1, Math.floor((to - from) / pointsOfLap));
	for (let i = from; i < to; i += step) logged.push([run.distanceM[i]! - startM, middleOf(run.speedMps, i)]);
	const endM = run.distanceM[to - 1]!;
	// A straight that the start of the lap lies on belongs to two laps.
	const passes = findings.passes.filter(
		({good, startM: from, lengthM}) => good && from < endM && from + lengthM > startM,
	);
	const trace = (learned: boolean) =>
		passes
			.flatMap(pass => modelAlong(subject, learning, pass, startM, learned))
			.map(piece => piece.filter(([distanceM]) => distanceM >= 0 && distanceM <= endM - startM));
	return {lap: number, logged, before: trace(false), after: trace(true)};
}
const pointsOfLap = 600;

/** The middle of five samples: one that is far off would take the whole height of the picture. */
function middleOf(values: Float32Array, at: number): number {
	const around = [...values.slice(Math.max(0, at - 2), at + 3)].filter(Number.isFinite).sort((a, b) => a - b);
	return around[Math.floor(around.length / 2)] ?? Number.NaN;
}

function modelAlong(
	{car, track}: Subject,
	{readings, trim}: Learning,
	pass: Pass,
	startM: number,
	learned: boolean,
): (readonly (readonly [number, number])[])[] {
	const reading = readings.find(({index}) => index === pass.straight);
	const exitMps = learned ? pass.exitMps : track.straights[pass.straight ?? -1]?.exitMps;
	if (reading === undefined || exitMps === undefined) return [];
	const trace = tracesOf(car, track)(reading, learned ? trim : untrimmed, {exitMps, lengthM: pass.lengthM});
	return trace === undefined
		? []
		: [trace.map(({distanceM, speedMps}) => [pass.startM - startM + distanceM, speedMps] as const)];
}
