/** The demo at Tarrowdale, as documents and as what they describe. */
import {readFileSync} from 'node:fs';
import type {JsonObject} from '../../../source/documents/json.ts';
import {checkCar, checkTrack, describeProblems} from '../../../source/documents/read.ts';
import type {Subject} from '../../../source/practice/learn/learn.ts';
import type {DocumentsAsWritten} from '../../../source/practice/learn/proposals.ts';

const read = (file: string) =>
	JSON.parse(readFileSync(new URL(`../../../tracks/${file}`, import.meta.url), 'utf8')) as JsonObject;

export const demoDocuments = (): DocumentsAsWritten => ({track: read('tarrowdale.json'), car: read('cars/demo.json')});

/** What the documents describe; they must be right. */
export function subjectOf({track, car}: DocumentsAsWritten): Subject {
	const [readTrack, readCar] = [checkTrack({...track}), checkCar({...car})];
	if (!readTrack.ok) throw new Error(describeProblems('track', readTrack.problems));
	if (!readCar.ok) throw new Error(describeProblems('car', readCar.problems));
	return {
		track: readTrack.value,
		car: readCar.value,
		uncertainties: {track: readTrack.uncertainties, car: readCar.uncertainties},
	};
}
