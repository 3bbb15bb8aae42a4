/** What a load list says: the shape that `--json` prints. SI; rpm is rev/min. */

export type LoadOptions = {
	/** How many steps shorter and taller than its best pair a track has to have. */
	readonly shorter: number;
	readonly taller: number;
	/** A pair this close to a track's best in lap time stands for it; the car's margin `level` unless given. */
	readonly withinS: number | undefined;
	/** Pairs this close in ratio (a fraction of 1) are no step apart. */
	readonly stepRatio: number;
	/** Only with this gearbox set; with any of the car's unless given. */
	readonly gearbox: string | undefined;
	/** Every set by itself, instead of the best of them. */
	readonly eachSet: boolean;
};

/** 0.5 % of 8000 rpm is 40 rpm: less than that is not what a gear is changed for. */
export const defaultStepRatio = 0.005;
export const defaultSteps = 1;
/** More is the whole rack. */
export const mostSteps = 5;

export type RoleName = 'best' | 'shorter' | 'taller';

/** What a pair on the list is for. */
export type Role = {
	track: string;
	/** The set that it is taken with there. */
	gearbox: string;
	role: RoleName;
	/** 0 for the best; the first step is 1. */
	step: number;
	/** Of a best pair: a lap's time more than the very best of the rack. */
	lossS: number | null;
};

/** The track that suffers first without a pair, and by how much. */
export type Without =
	/** A lap is slower by this with the best pair that is left. */
	| {kind: 'slower'; track: string; pair: string; gearbox: string; lossS: number}
	/** Where there are no times: the nearest pair turns the engine so much more or less. */
	| {kind: 'nearest'; track: string; pair: string; rpm: number}
	/** Nothing that is left fails no check. */
	| {kind: 'nothing'; track: string}
	/** The next pair that way turns the engine so much further from the best pair's RPM than this one. */
	| {kind: 'further'; track: string; role: RoleName; pair: string; rpm: number}
	/** There is no pair left further that way than this one. */
	| {kind: 'noStep'; track: string; role: RoleName; than: string};

export type LoadedPair = {
	pair: string;
	pairRatio: number;
	sets: number;
	milesM: number;
	maxMilesM: number | null;
	/** Of the races at the tracks that it is the best for, as far as their length is known; null where none is. */
	raceM: number | null;
	roles: Role[];
	reason: string;
	without: Without | null;
};

/** A track and, where every set counts, a set: what serves it. */
export type LoadedTrack = {
	track: string;
	/** The very best of the rack with what may be used. */
	best: {pair: string; gearbox: string; fastestS: number | null};
	/** What stands for it on the list. */
	served: {pair: string; gearbox: string; lossS: number | null};
	/** Nearest step first. */
	shorter: string[];
	taller: string[];
	/** How many pairs would do as its best. */
	choices: number;
};

export type LoadList = {
	pairs: LoadedPair[];
	tracks: LoadedTrack[];
	/** What is short: on the rack, on hand, in miles. */
	short: string[];
	shorter: number;
	taller: number;
	withinS: number;
	stepRatio: number;
};
