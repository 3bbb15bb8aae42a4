/** What is answered about engine life and fuel: the shape that `--json` prints and the views lay out. SI; rpm is rev/min. */
import type {Setting, Verdict} from '../planning/results.ts';

/** Time in one gear above `fromRpm` and up to `toRpm`. */
export type Dwell = {gear: number; fromRpm: number; toRpm: number; lapS: number; raceS: number | null};

/** One pair and set; what counts for a race is null without its laps, or where parts of the lap are left out. */
export type EngineLife = {
	pair: string;
	gearbox: string;
	installed: boolean;
	verdict: Verdict;
	/** The time that the rest is told of: the lap's, or that of its known parts. */
	lapS: number;
	raceS: number | null;
	/** Of the crankshaft. */
	turnsPerLap: number;
	turnsPerRace: number | null;
	/** Time above `aboveRpm`. */
	aboveLapS: number;
	aboveRaceS: number | null;
	meanRpm: number;
	highestRpm: number;
	/** The lap's time by throttle; the rest is shifting and braking. */
	fullThrottleS: number;
	partThrottleS: number;
	/** By rising RPM, then gear. */
	dwell: Dwell[];
};

export type PairFuel = {
	pair: string;
	gearbox: string;
	installed: boolean;
	verdict: Verdict;
	lapS: number;
	/** Work at the crankshaft. */
	energyPerLapJ: number;
	meanPowerW: number;
	/** The rest is null where parts of the lap are left out. */
	fuelPerLapKg: number | null;
	fuelPerLapM3: number | null;
	/** Volume for each meter of road. */
	fuelM3PerM: number | null;
	fuelPerRaceM3: number | null;
	fuelPerRaceKg: number | null;
	/** Null without a tank. */
	lapsPerTank: number | null;
	/** The race's fuel as so many tanks, and the fuel stops of a race begun with a full one. */
	tanksPerRace: number | null;
	fuelStops: number | null;
};

/** What both answers say of the lap that they are about. */
export type About = {
	setting: Setting;
	/** The only situation, or null: the mean over the situations by share. */
	situation: string | null;
	/** How many situations that mean is over. */
	situations: number;
	/** Laps of the race; null where not known. */
	laps: number | null;
	/** Of the whole lap; null where parts of it are left out. */
	lapM: number | null;
	/** Of each corner; null where they are left out. */
	cornerM: number | null;
	/** What is assumed, and what is left out. */
	assumptions: string[];
	remarks: string[];
};

export type LifeAnswer = About & {
	aboveRpm: number;
	stepRpm: number;
	/** The pair that is asked about, then the one that it is held against, where there is another. */
	pairs: EngineLife[];
};

export type FuelAnswer = About & {
	fuelConsumptionKgPerJ: number;
	fuelDensityKgM3: number;
	tankM3: number | null;
	pairs: PairFuel[];
};
