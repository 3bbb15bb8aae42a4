/** The logged runs in `tracks/logs`: the demo car, which is not quite what its document says (`usualTruth`). */
import {type GeneratedLog, generateLog, type Sensors} from './log-generator.ts';
import {mount, samplePlan} from './sample.ts';

export const exampleLogs = [
	{track: 'quillmere', mounted: '33/35 A', seed: 33, driving: {laps: 14, paceLaps: 1}},
	{track: 'tarrowdale', mounted: '34/34 C', seed: 34, driving: {laps: 9}},
] as const;

const sensors: Partial<Sensors> = {rateHz: 10, rpmStep: 5, speedStepMps: 0, speedNoiseMps: 0.06, lost: 0.001};

export async function exampleLog({track, mounted, ...wish}: (typeof exampleLogs)[number]): Promise<GeneratedLog> {
	const plan = await samplePlan(track);
	return generateLog({...wish, plan, mounted: mount(plan, mounted), sensors});
}
