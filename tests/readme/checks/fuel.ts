/** Fuel from work at the crankshaft. */
import {fuelOf} from '../../../source/life/fuel.ts';
import {emptyTally} from '../../../source/life/tally.ts';
import type {Row} from '../../../source/planning/results.ts';
import type {OutsideCheck} from '../outside-check.ts';

const horsepowerW = 745.6998715822702;
const hourS = 3600;
const poundKg = 0.45359237;
const gallonM3 = 3.785411784e-3;

const row = {pair: '33/38', gearbox: 'A', installed: true, verdict: 'pass'} as Row;
const use = {
	consumptionKgPerJ: (0.5 * poundKg) / (horsepowerW * hourS),
	densityKgM3: (6.2173 * poundKg) / gallonM3,
	tankM3: null,
};
const tenMinutes = {...emptyTally(), timeS: 600, energyJ: 500 * horsepowerW * 600};
const {fuelPerLapKg, fuelPerLapM3} = fuelOf(row, tenMinutes, use, 1, 1);

export const fuel: readonly OutsideCheck[] = [
	{
		what: 'Fuel of 500 hp for 10 minutes at 0.50 lb/(hp h): mass, and volume at 6.2173 lb/gal',
		source: 'the definitions of the units',
		mark: 'recomputed',
		cases: [
			{outside: '41.667', ours: fuelPerLapKg! / poundKg, unit: 'lb'},
			{outside: '6.7017', ours: fuelPerLapM3! / gallonM3, unit: 'gal'},
		],
		tolerance: 1e-5,
	},
];
