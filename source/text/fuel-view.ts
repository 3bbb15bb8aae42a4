/** How far the fuel goes: mileage, laps to a tank, fuel for the race and stops. */
import {mileM} from '../drivetrain/constants.ts';
import type {FuelAnswer, PairFuel} from '../life/results.ts';
import {type Block, gap, text} from './blocks.ts';
import {comparisonView, type Figure, installedView} from './comparison-view.ts';
import {closingView, type Heading, headingView} from './heading-view.ts';
import {aboutWords, againstWords} from './life-view.ts';
import {fixed, gallonM3, horsepowerW, poundKg, type Quantity, type Units} from './units.ts';

const literM3 = 1e-3;
const hundredKmM = 100_000;

/** Of SI volume for each meter; absent where that is. */
const economy = (figure: (m3PerM: number) => number) => (each: PairFuel) =>
	each.fuelM3PerM === null ? null : figure(each.fuelM3PerM);
const milesPerGallon = economy(m3PerM => gallonM3 / (m3PerM * mileM));
const litersPer100Km = economy(m3PerM => (m3PerM * hundredKmM) / literM3);

const figuresOf = (units: Units): Figure<PairFuel>[] => {
	const written = (quantity: Quantity) => (value: number) => units.number(quantity, value);
	const digits = (count: number) => (value: number) => fixed(value, count);
	return [
		{name: 'miles a gallon', value: milesPerGallon, write: digits(2)},
		{name: 'L/100 km', value: litersPer100Km, write: digits(1)},
		{name: 'laps a tank', value: each => each.lapsPerTank, write: digits(1)},
		{name: `${units.label('fuel')} a race`, value: each => each.fuelPerRaceM3, write: written('fuel')},
		{name: `${units.label('mass')} a race`, value: each => each.fuelPerRaceKg, write: written('mass')},
		{name: 'tanks a race', value: each => each.tanksPerRace, write: digits(2)},
		{name: 'fuel stops, begun full', value: each => each.fuelStops, write: digits(0)},
		{name: `${units.label('lapFuel')} a lap`, value: each => each.fuelPerLapM3, write: written('lapFuel')},
		{name: `mean power, ${units.label('power')}`, value: each => each.meanPowerW, write: written('power')},
	];
};

const hourS = 3600;

/** The consumption, the density and the tank that an answer stands on. */
export const assumedWords = ({fuelConsumptionKgPerJ, fuelDensityKgM3, tankM3}: FuelAnswer, units: Units): string => {
	const metric = fixed(fuelConsumptionKgPerJ * 1000 * hourS, 3);
	const us = fixed((fuelConsumptionKgPerJ * horsepowerW * hourS) / poundKg, 3);
	const density = `${fixed(fuelDensityKgM3 * literM3, 3)} kg/L (${fixed((fuelDensityKgM3 * gallonM3) / poundKg, 2)} lb/gal)`;
	const tank = tankM3 === null ? [] : [`a tank of ${units.text('fuel', tankM3)}`];
	return [`Assumed: ${metric} kg/kWh (${us} lb/(hp h)) at every load`, `fuel of ${density}`, ...tank]
		.join(', ')
		.concat('.');
};

export const fuelFigures = (answer: FuelAnswer, units: Units): Block => comparisonView(answer.pairs, figuresOf(units));

export const fuelView = (heading: Heading, answer: FuelAnswer, units: Units): Block[] => [
	...headingView(heading, `fuel, ${againstWords(answer.pairs)} · ${aboutWords(answer)}`, answer.setting, units),
	gap,
	fuelFigures(answer, units),
	gap,
	...installedView(answer.pairs),
	text(`- ${assumedWords(answer, units)}`, 'plain', 2),
	...answer.assumptions.map(each => text(`- ${each}`, 'plain', 2)),
	...closingView(answer.remarks),
];
