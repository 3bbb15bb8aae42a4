/** `droprack read`: a plan that was sent, computed again and held beside what the reader has; taken over only when asked. */
import {describeProblems, maxDocumentBytes} from '../documents/read.ts';
import {parsePair} from '../drivetrain/gear-pair.ts';
import {rpmTable} from '../planning/rpm-table.ts';
import {runPair} from '../planning/run-pair.ts';
import {type Agreement, agreements} from '../sharing/agreement.ts';
import {compare, type Difference} from '../sharing/compare.ts';
import {restartOf} from '../sharing/make-plan.ts';
import {readShared, type SharedReading} from '../sharing/read-shared.ts';
import {reduceCar} from '../sharing/reduce-car.ts';
import {statedResults} from '../sharing/stated-results.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {printJson, printText} from './print.ts';
import type {AnyDocument} from './read-any.ts';
import {readFileText, readStandardInput} from './read-input.ts';
import {badInput, type Found, found, type Reply, replyDone, replyRefused, status} from './reply.ts';
import type {Request} from './request.ts';
import {keepDocument} from './save.ts';
import {type Kind, shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';
import {planView, shortView} from './text/plan-view.ts';

type Plan = Extract<SharedReading, {form: 'plan'}>;
/** What the reader has under the same name, and how it differs; undefined where there is none. */
export type Own = {track: Difference[] | undefined; car: Difference[] | undefined};

export const read: CommandRun = async (request, around) => {
	const {argument} = request;
	if (argument === undefined) return replyRefused(badInput('droprack read: which FILE? Or - for standard input.'));
	const input =
		argument === '-'
			? await readStandardInput(around.standardInput(), maxDocumentBytes)
			: await readFileText(argument, maxDocumentBytes);
	if (!input.ok) return replyRefused(input);
	const {label, text} = input.value;
	const reading = await readShared(text);
	if (!reading.ok) return replyRefused(badInput(describeProblems(label, reading.problems)));
	if (reading.form === 'short') {
		if (request.take) return replyRefused(badInput(shortCannotBeTaken));
		if (request.json) return replyDone(printJson({short: reading.fields}, request));
		return replyDone(printText(shortView(reading.fields), request, around));
	}
	const computed = computeAgain(reading, label);
	if (!computed.ok) return replyRefused(computed);
	const {compared, failed} = computed.value;
	const own = ownDifferences(reading, around);
	const taken = request.take ? takeOver(reading, request, around) : undefined;
	if (taken && taken.status !== status.done) return taken;
	const out = request.json
		? printJson({plan: reading.plan, numbers: compared, differences: own}, request)
		: printText(planView(reading.plan, compared, own, taken !== undefined), request, around);
	const done = replyDone(out, [], request.strict && failed);
	return {...done, err: taken?.err ?? ''};
};

const shortCannotBeTaken =
	'droprack read: the short form holds no track to take over. The whole plan comes with droprack share.';

/** The plan's track with its pair, set and notes, and with the car where there is one of that name. */
const takeOver = ({plan}: Plan, request: Request, around: Surroundings): Reply => {
	const named = shelf('car', around).entries.some(({name}) => name === plan.car.name);
	const {car: _, ...asked} = request;
	const choice: Request = {
		...asked,
		json: false,
		pair: parsePair(plan.pair)!,
		gearbox: plan.gearbox,
		...(named && {car: String(plan.car.name)}),
		...(plan.notes !== undefined && {notes: plan.notes}),
	};
	const document = plan.track as AnyDocument['document'];
	return keepDocument({kind: 'track', document, from: undefined, car: undefined, notes: []}, choice, around);
};

const computeAgain = ({plan, car, track}: Plan, label: string): Found<{compared: Agreement[]; failed: boolean}> => {
	const choice = {pair: parsePair(plan.pair), gearbox: plan.gearbox};
	const labels = {track: `${label}, track`, car: `${label}, car`};
	const run = runPair(car, track, choice);
	if (!run.ok) return refuseFaults(run.faults, labels);
	const table = rpmTable(car, track, choice);
	if (!table.ok) return refuseFaults(table.faults, labels);
	const {row, setting} = run.value;
	const computed = statedResults(row, setting, restartOf(table.value));
	return found({compared: agreements(plan.results, computed), failed: row.verdict === 'fail'});
};

/** Against the documents of the same name; of the car, what the plan would hold of it. */
const ownDifferences = ({plan}: Plan, around: Surroundings): Own => {
	const named = (kind: Kind, name: unknown) => shelf(kind, around).entries.find(entry => entry.name === name)?.document;
	const [track, car] = [named('track', plan.track.name), named('car', plan.car.name)];
	return {
		track: track && compare(track, plan.track),
		car: car && compare(reduceCar(car, plan.track, plan), plan.car),
	};
};
