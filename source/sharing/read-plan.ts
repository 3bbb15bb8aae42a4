/** Reading of a plan from a message, or of the JSON of one. */
import {type Problem, pathText} from '../documents/problem.ts';
import {checkPlan, type PlanReading} from './check-plan.ts';
import {type Entry, findEntries} from './find-entries.ts';
import {buildPlan, type Origin} from './plan-from-entries.ts';

/** The plan in a message, or every problem with its line. */
export async function readPlan(message: string): Promise<PlanReading> {
	const found = findEntries(message);
	return found.ok ? planFromEntries(found.entries) : found;
}

/** The plan of entries whose checks agree. */
export async function planFromEntries(entries: readonly Entry[]): Promise<PlanReading> {
	const {document, origins, problems} = buildPlan(entries);
	if (problems.length > 0) return {ok: false, problems};
	const reading = await checkPlan(document);
	if (reading.ok) return reading;
	return {ok: false, problems: reading.problems.map(problem => withLine(problem, origins))};
}

function withLine(problem: Problem, origins: readonly Origin[]): Problem {
	const holding = origins
		.map(({path, line}) => ({text: pathText(path), line}))
		.filter(
			({text}) =>
				text === '' ||
				problem.path === text ||
				(/^[.[]/.test(problem.path.slice(text.length)) && problem.path.startsWith(text)),
		)
		.sort((one, other) => other.text.length - one.text.length)[0];
	return holding === undefined ? problem : {...problem, line: holding.line};
}
