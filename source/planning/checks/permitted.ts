/** The rule book, the track's own rules and the track's gears: what may be mounted here at all. */
import type {Rules} from '../../drivetrain/car.ts';
import {samePair} from '../../drivetrain/gear-pair.ts';
import type {Candidate} from '../candidates.ts';
import type {RowRun} from '../run-row.ts';
import {checkOf, type RowCheck} from './check.ts';

export const permitted: RowCheck = (row, {plan}) => {
	const books = [plan.car.rules[plan.track.type], plan.track.rules];
	const gears = missingGears(row);
	const lists = books.some(book => book?.gearboxes !== undefined || book?.pairs !== undefined);
	if (!lists && gears === undefined) return undefined;
	const remark = gears ?? books.map(book => against(book, row.candidate)).find(found => found !== undefined);
	const verdict = remark === undefined ? 'pass' : 'fail';
	return checkOf('permitted', {verdict, value: null, bound: null, margin: null, remark});
};

function against(book: Rules | undefined, {pair, pairName, gearbox}: Candidate): string | undefined {
	if (book?.gearboxes !== undefined && !book.gearboxes.includes(gearbox.name)) {
		return `gearbox ${gearbox.name} is not among the rules' ${book.gearboxes.join(', ') || 'none'}`;
	}
	if (book?.pairs !== undefined && !book.pairs.some(other => samePair(other, pair))) {
		return `${pairName} is not among the pairs of the rules`;
	}
	return undefined;
}

function missingGears({situations, candidate}: RowRun): string | undefined {
	const run = situations[0]?.places.find(({state}) => state === 'noGear');
	return run && `gearbox ${candidate.gearbox.name} has none of the gears allowed on ${run.place.name}`;
}
