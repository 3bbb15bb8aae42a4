/** `droprack check`: what is wrong in the store, each with what to do. */
import {describeProblems, readCar, readTrack} from '../documents/read.ts';
import {visible} from '../documents/visible.ts';
import {checkStore, type Finding} from '../store/check-store.ts';
import {homeDirectory} from '../store/home.ts';
import {textOf} from '../store/kept-documents.ts';
import {listKept} from '../store/list-kept.ts';
import {text} from '../text/blocks.ts';
import type {CommandRun} from './command.ts';
import {printJson, printText} from './print.ts';
import {replyDone} from './reply.ts';
import {shelf} from './shelf.ts';
import type {Surroundings} from './surroundings.ts';

export const check: CommandRun = async (request, around) => {
	const home = homeDirectory(around.environment);
	const findings = [...checkStore(home), ...(await unsoundDocuments(home)), ...missingCars(home, around)];
	const failed = request.strict && findings.length > 0;
	if (request.json) return replyDone(printJson({home, findings}, request), [], failed);
	const sound = `Nothing is wrong in ${visible(home)}.`;
	const lines = findings.length > 0 ? findings.flatMap(({message}) => message.split('\n')) : [sound];
	const hang = 2;
	return replyDone(
		printText(
			lines.map(each => text(each, 'plain', hang)),
			request,
			around,
		),
		[],
		failed,
	);
};

/** Tracks and cars that the readers do not take; made by hand, or by a version that took more. */
const unsoundDocuments = async (home: string): Promise<Finding[]> => {
	const documents = [
		...listKept(home, 'preset').kept.map(({file, document}) => ({file, inner: document.track, read: readTrack})),
		...listKept(home, 'saved-car').kept.map(({file, document}) => ({file, inner: document.car, read: readCar})),
	];
	const findings: Finding[] = [];
	for (const {file, inner, read} of documents) {
		const reading = await read(textOf(inner));
		if (reading.ok) continue;
		const problems = reading.problems.map(({line: _, column: __, excerpt: ___, ...problem}) => problem);
		findings.push({file, message: describeProblems(file, problems)});
	}
	return findings;
};

const missingCars = (home: string, around: Surroundings): Finding[] => {
	const names = shelf('car', around).entries.map(({name}) => name);
	return listKept(home, 'preset').kept.flatMap(({file, document: {car}}) => {
		if (car === undefined || names.includes(car)) return [];
		const message = visible(`${file}: there is no car called ${car}. Save one, or save the track with another --car.`);
		return [{file, message}];
	});
};
