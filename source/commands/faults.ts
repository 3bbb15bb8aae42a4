/** What only the whole of track and car shows to be wrong, told like a document's own problems. */
import {describeProblems} from '../documents/read.ts';
import type {Fault} from '../planning/results.ts';
import {badInput, type Refusal} from './reply.ts';

const sources = ['track', 'car', 'command'] as const;

/** One line a fault, under the name of the file or of the command line. */
export const refuseFaults = (faults: readonly Fault[], labels: {track: string; car: string}): Refusal => {
	const label = {...labels, command: 'command line'};
	const paragraphs = sources.flatMap(source => {
		const own = faults.filter(fault => fault.document === source);
		const problems = own.map(({path, found, allowed}) => ({path, found, allowed}));
		return problems.length > 0 ? [describeProblems(label[source], problems)] : [];
	});
	return badInput(paragraphs.join('\n'));
};
