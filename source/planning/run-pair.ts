/** One pair and set: its row of the ranking, with its reason and gain against the others. */
import type {Car} from '../drivetrain/car.ts';
import {pairName} from '../drivetrain/gear-pair.ts';
import type {Track} from '../drivetrain/track.ts';
import {chosenFrom} from './choice.ts';
import {done} from './faults.ts';
import {rankRack} from './rank-rack.ts';
import type {Choice, Outcome, SingleRun} from './results.ts';

/** The row of the pair and set chosen, as `rankRack` has it: the reason and the faults need the whole rack. */
export function runPair(car: Car, track: Track, choice: Choice = {}): Outcome<SingleRun> {
	const chosen = chosenFrom(car, choice);
	if (!chosen.ok) return chosen;
	const ranking = rankRack(car, track);
	if (!ranking.ok) return ranking;
	const {setting, rows, remarks} = ranking.value;
	const name = pairName(chosen.value.pair);
	const row = rows.find(({pair, gearbox}) => pair === name && gearbox === chosen.value.gearbox);
	if (row === undefined) throw new Error(`no row for ${name} ${chosen.value.gearbox}`);
	return done({setting, row, remarks});
}
