/** What planning answers: the shape that `--json` prints, that the text output and the screen lay out. SI; rpm is rev/min. */

export type Verdict = 'pass' | 'near' | 'fail';

export type CheckName =
	| 'limit'
	| 'limiter'
	| 'band'
	| 'afterShift'
	| 'settle'
	| 'pitRoad'
	| 'restart'
	| 'downshift'
	| 'permitted'
	| 'housing'
	| 'stock'
	| 'mileage';

/** One check's worst place. `margin` is positive on the good side; a bound that does not exist is null, and so is its margin. */
export type Check = {
	check: CheckName;
	verdict: Verdict;
	value: number | null;
	bound: number | null;
	margin: number | null;
	/** Where: "Front exit", "Back shift 3-4", "pit road"; empty where the check has no place. */
	at: string;
	/** In which situation; empty where the check has none. */
	situation: string;
	/** What a person should know beside the numbers; absent where there is nothing. */
	remark?: string;
};

export type Shift = {
	from: number;
	rpm: number;
	/** RPM one reaction time before the shift: where the light must come on. */
	lightRpm: number;
	/** RPM in the next gear at the speed after the interruption. */
	rpmAfter: number;
	/** Speed and distance at which the interruption starts. */
	speedMps: number;
	distanceM: number;
	/** From the exit to the start of the interruption. */
	timeS: number;
	/** From the end of the interruption to the end of full throttle. */
	leftS: number;
};

/** A straight in one situation. Without length its times, distances and `reachRpm` are null and its end is the held one. */
export type StraightResult = {
	name: string;
	timeS: number | null;
	fastestS: number | null;
	exitSpeedMps: number;
	exitRpm: number;
	exitGear: number;
	/** The highest speed on the straight, and the RPM there in the gear then in use. */
	endSpeedMps: number;
	endRpm: number;
	endGear: number;
	/** Speed at the end of the straight's length. */
	finalSpeedMps: number;
	/** Distance and time on the limiter in the gears that `timeS` takes. */
	limiterM: number;
	/** The end RPM that would be reached without a limiter. */
	reachRpm: number | null;
	/** RPM and speed at the slowest point of the corner before, in the exit gear; null where none is given. */
	minimumSpeedMps: number | null;
	minimumRpm: number | null;
	shifts: Shift[];
	remarks: string[];
};

export type SituationResult = {
	name: string;
	share: number;
	timeS: number | null;
	fastestS: number | null;
	straights: StraightResult[];
	/** The restart as a straight of its own, not part of the lap; null without one. */
	restart: StraightResult | null;
};

export type Row = {
	/** `driving/driven`. */
	pair: string;
	gearbox: string;
	/** driven ÷ driving. */
	pairRatio: number;
	/** Overall ratio of each gear. */
	overall: number[];
	verdict: Verdict;
	reason: string;
	/** Share-weighted means over the situations; null where no straight has a length or an exit is above every gear's limit. */
	timeS: number | null;
	fastestS: number | null;
	/** `fastestS` of the installed pair and set less this row's; null without `installed`. */
	gainS: number | null;
	/** Whether this is the pair and set in the car. */
	installed: boolean;
	situations: SituationResult[];
	/** Pit-road gear and RPM, at the limit and at limit + tolerance; null without a pit road. */
	pitRoad: {gear: number; rpm: number; toleranceRpm: number} | null;
	checks: Check[];
	remarks: string[];
};

/** What holds for every row of an answer: the build in use, its bounds and its day. */
export type Setting = {
	engine: string;
	rpmLimit: number;
	/** Where the limit comes from: "engine", "rules" or "track". */
	limitFrom: string;
	bandLowRpm: number;
	bandHighRpm: number;
	peakPowerW: number;
	peakPowerRpm: number;
	/** The power correction of the base situation, and the air density there. */
	correction: number;
	airDensityKgM3: number;
	anchored: boolean;
};

export type Ranking = {setting: Setting; rows: Row[]; remarks: string[]};
export type SingleRun = {setting: Setting; row: Row; remarks: string[]};

/** A speed on the track, and the RPM there in every gear. */
export type RpmPoint = {
	/** "Front exit", "Front minimum", "Front top", "Front entry", "Front measured", "pit road", "pit road + tolerance", "restart". */
	at: string;
	situation: string;
	speedMps: number;
	rpm: number[];
	/** The gear in use there; null where none is. */
	gear: number | null;
};
export type RpmTable = {
	setting: Setting;
	pair: string;
	gearbox: string;
	overall: number[];
	points: RpmPoint[];
	remarks: string[];
};

/** Bad input that only the whole of car and track shows. A value, not a throw; the reader's own words are in it. */
export type Fault = {
	/** Which document and where: "track", "straights.Front.exit". */
	document: 'track' | 'car' | 'command';
	path: string;
	found: string;
	allowed: string;
};
export type Outcome<T> = {ok: true; value: T} | {ok: false; faults: Fault[]};

/** Which rows to make: everything, or one pair and set (unless given, the installed ones, else the first on the rack). */
export type Choice = {pair?: {driving: number; driven: number} | undefined; gearbox?: string | undefined};
