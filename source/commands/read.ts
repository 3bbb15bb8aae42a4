/** `droprack read`: a plan that was sent, computed again and held beside what the reader has; taken over only when asked. */
import {describeProblems, maxDocumentBytes} from '../documents/read.ts';
import {parsePair} from '../drivetrain/gear-pair.ts';
import {computeAgain, differencesFrom, type Own, type ReadPlan} from '../sharing/hold-against.ts';
import {readShared} from '../sharing/read-shared.ts';
import {planView, shortView} from '../text/plan-view.ts';
import type {CommandRun} from './command.ts';
import {refuseFaults} from './faults.ts';
import {printJson, printText} from './print.ts';
import type {AnyDocument} from './read-any.ts';
import {readFileText, readStandardInput} from './read-input.ts';
import {badInput, type Reply, replyDone, replyRefused, status} from './reply.ts';
import type {Request} from './request.ts';
import {keepDocument} from './save.ts';
import {type Kind, shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

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
	const computed = computeAgain(reading);
	if (!computed.ok)
		return replyRefused(refuseFaults(computed.faults, {track: `${label}, track`, car: `${label}, car`}));
	const {compared, failure} = computed.value;
	const own = ownDifferences(reading, around);
	const taken = request.take ? takeOver(reading, request, around) : undefined;
	if (taken && taken.status !== status.done) return taken;
	const out = request.json
		? printJson({plan: reading.plan, numbers: compared, differences: own}, request)
		: printText(
				planView(reading.plan, {compared, failure}, own, taken === undefined ? 'Nothing was taken over.' : takenWords),
				request,
				around,
			);
	const done = replyDone(out, [], request.strict && failure !== undefined);
	return {...done, err: taken?.err ?? ''};
};

const takenWords = 'The track is kept with this pair and set.';
const shortCannotBeTaken =
	'droprack read: the short form holds no track to take over. The whole plan comes with droprack share.';

/** The plan's track with its pair, set and notes, and with the car where there is one of that name. */
const takeOver = ({plan}: ReadPlan, request: Request, around: Surroundings): Reply => {
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

/** Against the documents of the same name. */
const ownDifferences = (reading: ReadPlan, around: Surroundings): Own => {
	const named = (kind: Kind, name: unknown) => shelf(kind, around).entries.find(entry => entry.name === name)?.document;
	const {track, car} = reading.plan;
	return differencesFrom(reading, named('track', track.name), named('car', car.name));
};
