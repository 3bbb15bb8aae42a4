/** A plan's JSON held against its shape. */
import * as z from 'zod/mini';
import {carFrom} from '../documents/car-from-document.ts';
import {type Problem, shown} from '../documents/problem.ts';
import {problemsFrom, unknownUnitsIn} from '../documents/problems-from-issues.ts';
import {readJson} from '../documents/read-json.ts';
import {trackFrom} from '../documents/track-from-document.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {type PlanDocument, planFields} from './plan-document.ts';

export type PlanReading =
	| {
			ok: true;
			plan: PlanDocument /** What the plan was made from, ready to compute it again. */;
			car: Car;
			track: Track;
	  }
	| {ok: false; problems: Problem[]};

/** The plan that a JSON value is, or all that is wrong with it. */
export async function checkPlan(document: Record<string, unknown>): Promise<PlanReading> {
	const {kind, version} = document;
	if (kind !== 'plan') return refused('kind', shown(kind), '"plan"');
	if (version !== 1) return refused('version', shown(version), '1');
	const checked = await checkFields(document);
	if (!checked.success) {
		return {ok: false, problems: problemsFrom(checked.error.issues, document).map(({problem}) => problem)};
	}
	const plan = document as PlanDocument;
	return {ok: true, plan, car: carFrom(checked.data.car), track: trackFrom(checked.data.track)};
}

/** Units that the table lacks are looked up once, which loads a library. */
async function checkFields(document: unknown) {
	const first = z.safeParse(planFields(), document);
	const unknown = first.success ? [] : unknownUnitsIn(first.error.issues);
	if (unknown.length === 0) return first;
	const {learnUnits} = await import('../documents/learn-units.ts');
	return (await learnUnits(unknown)) ? z.safeParse(planFields(), document) : first;
}

/** The plan in the text of a JSON file. */
export async function readPlanJson(text: string): Promise<PlanReading> {
	const json = await readJson(text);
	if (!json.ok) return json;
	return json.problems.length > 0 ? {ok: false, problems: json.problems} : checkPlan(json.document);
}

function refused(path: string, found: string, allowed: string): PlanReading {
	return {ok: false, problems: [{path, found, allowed}]};
}
