/** Fuel from the work at the crankshaft. */
import type {Row} from '../planning/results.ts';
import type {PairFuel} from './results.ts';
import type {Tally} from './tally.ts';

export type FuelUse = {
	/** Brake specific fuel consumption, the same at every load. */
	readonly consumptionKgPerJ: number;
	readonly densityKgM3: number;
	readonly tankM3: number | null;
};

/** Mass = work · consumption, volume = mass ÷ density. `lapM` is null where parts of the lap are left out: then so is its fuel. */
export function fuelOf(row: Row, tally: Tally, use: FuelUse, lapM: number | null, laps: number | null): PairFuel {
	const lapKg = lapM === null ? null : tally.energyJ * use.consumptionKgPerJ;
	const lapM3 = lapKg === null ? null : lapKg / use.densityKgM3;
	const raceM3 = lapM3 === null || laps === null ? null : laps * lapM3;
	const tanks = raceM3 === null || use.tankM3 === null ? null : raceM3 / use.tankM3;
	return {
		pair: row.pair,
		gearbox: row.gearbox,
		installed: row.installed,
		verdict: row.verdict,
		lapS: tally.timeS,
		energyPerLapJ: tally.energyJ,
		meanPowerW: tally.energyJ / tally.timeS,
		fuelPerLapKg: lapKg,
		fuelPerLapM3: lapM3,
		fuelM3PerM: lapM3 === null ? null : lapM3 / lapM!,
		fuelPerRaceM3: raceM3,
		fuelPerRaceKg: raceM3 === null ? null : raceM3 * use.densityKgM3,
		lapsPerTank: lapM3 === null || use.tankM3 === null ? null : use.tankM3 / lapM3,
		tanksPerRace: tanks,
		fuelStops: tanks === null ? null : Math.max(0, Math.ceil(tanks) - 1),
	};
}
