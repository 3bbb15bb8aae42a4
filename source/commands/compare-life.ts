/** What `life` and `fuel` have in common: one pair beside another at a track. */
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import type {LifeOptions} from '../life/options.ts';
import type {About} from '../life/results.ts';
import type {Outcome, Verdict} from '../planning/results.ts';
import type {Block} from '../text/blocks.ts';
import {type Heading, headingOf} from '../text/heading-view.ts';
import {type Units, unitsOf} from '../text/units.ts';
import {refuseFaults} from './faults.ts';
import {loadDocuments} from './load-documents.ts';
import {printJson, printText} from './print.ts';
import {type Reply, replyDone, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

/** With `--strict` it fails where the pair that is asked about fails a check. */
export async function compareLife<T extends About & {pairs: readonly {verdict: Verdict}[]}>(
	request: Request,
	around: Surroundings,
	answer: (car: Car, track: Track, options: LifeOptions) => Outcome<T>,
	view: (heading: Heading, answer: T, units: Units) => Block[],
): Promise<Reply> {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return replyRefused(loaded);
	const {track, car, labels, notes} = loaded.value;
	const {pair, gearbox, against, situation, laps, above} = request;
	const outcome = answer(car, track, {pair, gearbox, against, situation, laps, aboveRpm: above});
	if (!outcome.ok) return replyRefused(refuseFaults(outcome.faults, labels));
	const told = outcome.value;
	const failed = request.strict && told.pairs[0]?.verdict === 'fail';
	if (request.json) return replyDone(printJson({track: track.name, car: car.name, ...told}, request), notes, failed);
	const blocks = view(headingOf(car, track, around.now), told, unitsOf(request.units));
	return replyDone(printText(blocks, request, around), notes, failed);
}
