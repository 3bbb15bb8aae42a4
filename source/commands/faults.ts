/** What only the whole of track and car shows to be wrong, in words. */
import {visible} from '../documents/visible.ts';
import type {Fault} from '../planning/results.ts';
import {badInput, type Refusal} from './reply.ts';

/** One line a fault: document, path, found, allowed. */
export const refuseFaults = (faults: readonly Fault[], labels: {track: string; car: string}): Refusal => {
	const label = (fault: Fault) => (fault.document === 'command' ? 'command line' : labels[fault.document]);
	const lines = faults.map(fault => {
		const where = fault.path === '' ? '' : ` ${visible(fault.path)}:`;
		return `${label(fault)}:${where} found ${visible(fault.found)}; expected ${visible(fault.allowed)}.`;
	});
	return badInput(lines.join('\n'));
};
