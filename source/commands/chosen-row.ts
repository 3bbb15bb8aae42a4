/** One pair and set run at a track, with the RPM table: what plans and cards are made of. */
import type {RpmTable, SingleRun} from '../planning/results.ts';
import {rpmTable} from '../planning/rpm-table.ts';
import {runPair} from '../planning/run-pair.ts';
import {refuseFaults} from './faults.ts';
import {type Loaded, loadDocuments} from './load-documents.ts';
import {type Found, found} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

export type ChosenRow = Loaded & SingleRun & {table: RpmTable};

export const chosenRow = async (request: Request, around: Surroundings): Promise<Found<ChosenRow>> => {
	const loaded = await loadDocuments(request, around);
	if (!loaded.ok) return loaded;
	const {track, car, labels} = loaded.value;
	const choice = {pair: request.pair, gearbox: request.gearbox};
	const run = runPair(car, track, choice);
	if (!run.ok) return refuseFaults(run.faults, labels);
	const table = rpmTable(car, track, choice);
	if (!table.ok) return refuseFaults(table.faults, labels);
	return found({...loaded.value, ...run.value, table: table.value});
};
