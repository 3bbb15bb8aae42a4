/** The demo car at a demo track, and the pair that a log is generated with. */
import {type Candidate, candidateOf, gearboxNamed} from '../../source/planning/candidates.ts';
import {type Plan, planFor} from '../../source/planning/plan.ts';
import {shippedCar, shippedTrack} from '../tracks/demo.ts';

export async function samplePlan(track: string): Promise<Plan> {
	const planned = planFor(await shippedCar('demo.json'), await shippedTrack(`${track}.json`));
	if (!planned.ok) throw new Error(JSON.stringify(planned));
	return planned.value;
}

export function mount({car}: Plan, driving: number, driven: number, set: string): Candidate {
	const pair = {driving, driven, sets: 1, milesM: 0, maxMilesM: undefined};
	return candidateOf(car, pair, gearboxNamed(car, set)!);
}
