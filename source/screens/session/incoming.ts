/** A plan that was sent, read and held against the session's documents. Loaded only when one is read. */
import {describeProblems} from '../../documents/read.ts';
import {computeAgain, differencesFrom} from '../../sharing/hold-against.ts';
import {readShared} from '../../sharing/read-shared.ts';
import {readCarOf, readTrackOf} from './forms.ts';
import type {Incoming, OwnDocuments} from './take-in.ts';

export type IncomingReading =
	| {readonly ok: true; readonly incoming: Incoming}
	| {readonly ok: false; readonly words: string};

/** `own` gives the documents of the names that the plan has. */
export async function readIncoming(
	label: string,
	text: string,
	own: (track: unknown, car: unknown) => OwnDocuments,
): Promise<IncomingReading> {
	const reading = await readShared(text);
	if (!reading.ok) return {ok: false, words: describeProblems(label, reading.problems)};
	if (reading.form === 'short') return {ok: true, incoming: {form: 'short', fields: reading.fields}};
	const computed = computeAgain(reading);
	if (!computed.ok) {
		const words = computed.faults.map(
			({document, path, found, allowed}) => `${label}, ${document}: ${path}: found ${found}; allowed ${allowed}`,
		);
		return {ok: false, words: words.join('\n')};
	}
	const {plan} = reading;
	const mine = own(plan.track.name, plan.car.name);
	// What is not sound cannot be compared field by field.
	const track = mine.track && readTrackOf(mine.track.json).ok ? mine.track.json : undefined;
	const car = mine.car && readCarOf(mine.car.json).ok ? mine.car.json : undefined;
	const {compared, failure} = computed.value;
	return {
		ok: true,
		incoming: {form: 'plan', plan, compared, failure, own: mine, differences: differencesFrom(reading, track, car)},
	};
}
