/** The demo car at a demo track, logged: what the tests of findings start from. */
import type {LoggedRun} from '../../source/logs/logged-run.ts';
import {type Candidate, candidateOf, gearboxNamed} from '../../source/planning/candidates.ts';
import {type Plan, planFor} from '../../source/planning/plan.ts';
import {findInLog} from '../../source/practice/find/find-in-log.ts';
import type {Findings} from '../../source/practice/find/findings.ts';
import {shippedCar, shippedTrack} from '../tracks/demo.ts';
import {type GeneratedLog, generateLog, type LogWish} from './log-generator.ts';

export async function samplePlan(track: string): Promise<Plan> {
	const planned = planFor(await shippedCar('demo.json'), await shippedTrack(`${track}.json`));
	if (!planned.ok) throw new Error(JSON.stringify(planned));
	return planned.value;
}

/** "33/35 A" as the demo car would have it on. */
export function mount({car}: Plan, name: string): Candidate {
	const {pair, gearbox} = named(name);
	return candidateOf(car, {...pair, sets: 1, milesM: 0, maxMilesM: undefined}, gearboxNamed(car, gearbox)!);
}

export function named(name: string): {pair: {driving: number; driven: number}; gearbox: string} {
	const [, driving, driven, gearbox] = /^(\d+)\/(\d+) (\w+)$/.exec(name)!;
	return {pair: {driving: Number(driving), driven: Number(driven)}, gearbox: gearbox!};
}

export type Sample = {
	readonly track: string;
	/** What is on the car, and what the documents say is. */
	readonly mounted: string;
	readonly installed?: string;
	readonly change?: (run: LoggedRun) => LoggedRun;
} & Omit<LogWish, 'plan' | 'mounted' | 'seed'> & {readonly seed?: number};

/** A log of the sample and what is found in it. */
export async function found(sample: Sample): Promise<{plan: Plan; log: GeneratedLog; findings: Findings}> {
	const {track, mounted, installed = mounted, change = run => run, seed = 1, ...wish} = sample;
	const plan = await samplePlan(track);
	const log = generateLog({...wish, seed, plan, mounted: mount(plan, mounted)});
	return {plan, log, findings: findInLog(change(log.run), plan, named(installed))};
}

export const quillmere = {track: 'quillmere', mounted: '33/35 A'} as const;
export const tarrowdale = {track: 'tarrowdale', mounted: '34/34 C'} as const;
export const hesperRidge = {track: 'hesper-ridge', mounted: '33/35 A'} as const;
