/** One pair and set run at a track, with the RPM table: what plans and cards are made of. */

import {rowName} from '../planning/rank-rack.ts';
import type {RpmTable, SingleRun} from '../planning/results.ts';
import {rpmTable} from '../planning/rpm-table.ts';
import {runPair} from '../planning/run-pair.ts';
import {homeDirectory} from '../store/home.ts';
import {keptNamed} from '../store/list-kept.ts';
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
	const notes = [...loaded.value.notes, ...otherPlan(loaded.value, rowName(run.value.row), request, around)];
	return found({...loaded.value, ...run.value, table: table.value, notes});
};

/** Nobody hands over what is in the car in place of what was planned without being told. */
const otherPlan = (
	{track, origins}: Loaded,
	taken: string,
	{pair, gearbox}: Request,
	around: Surroundings,
): string[] => {
	if (pair !== undefined || gearbox !== undefined || origins.track.from !== 'saved') return [];
	const saved = keptNamed(homeDirectory(around.environment), 'preset', track.name)?.document;
	if (saved?.pair === undefined || saved.gearbox === undefined) return [];
	if (`${saved.pair} ${saved.gearbox}` === taken) return [];
	const plan = `--pair ${saved.pair} --gearbox ${saved.gearbox}`;
	return [`This is ${taken}, as installed; ${plan}, as saved for ${track.name}, is another.`];
};
