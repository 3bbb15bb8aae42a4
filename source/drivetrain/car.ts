/** What the arithmetic knows of a car. SI throughout; the unit is in the name. Shares and percentages are fractions of 1. */

export type TrackType = 'short' | 'intermediate' | 'superspeedway' | 'road';
export const trackTypes: readonly TrackType[] = ['short', 'intermediate', 'superspeedway', 'road'];

export type CurvePoint = {readonly rpm: number; readonly torqueNm: number};

/** The day that a dyno curve is corrected to; `air` means the day's own air, so no correction. */
export type CorrectedTo = 'J1349' | 'J607' | 'air';

export type Engine = {
	readonly name: string;
	/** The track types that this build runs at. */
	readonly for: readonly TrackType[];
	readonly rpmLimit: number;
	readonly inertiaKgM2: number;
	readonly correctedTo: CorrectedTo;
	/** Where the ignition cuts; undefined: at the limit in force. */
	readonly limiter: number | undefined;
	readonly pullRpm: number;
	/** Share of peak power that bounds the power band. */
	readonly bandShare: number;
	/** Brake specific fuel consumption, kg per joule at the crankshaft. */
	readonly fuelConsumptionKgPerJ: number;
	/** At least three points, rising in rpm. */
	readonly curve: readonly CurvePoint[];
};

export type Gearbox = {
	readonly name: string /** Gear 1 first, none above the one before it. */;
	readonly ratios: readonly number[];
};

export type Tires = {
	readonly leftM: number;
	readonly rightM: number;
	/** Growth of the rolling circumference at 100 mph. */
	readonly growth: number;
	/** Slip ratio under full throttle. */
	readonly slip: number;
	/** Slip ratio at a steady or closed throttle. */
	readonly steadySlip: number;
	/** Overall diameter by the size on the sidewall, where it is given. */
	readonly diameterM: number | undefined;
};

/** A pair is written `driving/driven` everywhere. */
export type Pair = {readonly driving: number; readonly driven: number};

export type RackPair = Pair & {
	readonly sets: number;
	readonly milesM: number;
	readonly maxMilesM: number | undefined;
};

export type Rack = {
	/** Tooth sums that the housing accepts; undefined: every sum. */
	readonly toothSums: readonly number[] | undefined;
	/** Whether the gears of a pair may be put on either shaft. */
	readonly eitherShaft: boolean;
	readonly pairs: readonly RackPair[];
};

/** A single gear that may be built into a gearbox. */
export type SpareGear = {
	/** Its place in the gearbox, counted from 1. */
	readonly gear: number;
	readonly ratio: number;
	readonly pieces: number;
	/** What it goes together with, by the names of groups; undefined: with everything. */
	readonly fits: readonly string[] | undefined;
};

/** What gearboxes may be built from. The largest and smallest ratio of a gear to the next bound what is built. */
export type GearInventory = {
	/** At least one for each place. */
	readonly gears: readonly SpareGear[];
	readonly smallestStep: number;
	readonly largestStep: number;
};

export type Margins = {
	readonly limitRpm: number;
	readonly shiftRpm: number;
	readonly downshiftRpm: number;
	readonly cleanRpm: number;
	readonly settleStartS: number;
	readonly settleEndS: number;
	/** Gear sequences this close in time count as equally fast. */
	readonly sameTimeS: number;
	/** Rows this close in lap time are called level. */
	readonly levelS: number;
};

/** What a rule book allows at a type of track; an undefined field allows everything. */
export type Rules = {
	readonly rpmLimit: number | undefined;
	readonly gearboxes: readonly string[] | undefined;
	readonly pairs: readonly Pair[] | undefined;
};

export type Car = {
	readonly name: string;
	/** As raced, driver and fuel in. */
	readonly massKg: number;
	readonly rearShare: number;
	readonly dragAreaM2: number;
	readonly downforceAreaM2: number;
	readonly rearDownforceShare: number;
	/** Coefficient of rolling resistance. */
	readonly rolling: number;
	/** Coefficient of friction of the driven tires. */
	readonly grip: number;
	/** All four wheels with what turns with them. */
	readonly wheelInertiaKgM2: number;
	readonly undrivenInertiaKgM2: number;
	readonly shiftTimeS: number;
	readonly reactionTimeS: number;
	/** Both given, or both undefined: no load transfer. */
	readonly wheelbaseM: number | undefined;
	readonly cgHeightM: number | undefined;
	readonly engines: readonly Engine[];
	readonly gearboxes: readonly Gearbox[];
	/** Undefined: no gearbox is built from single gears. */
	readonly gearInventory: GearInventory | undefined;
	readonly finalDrive: number;
	/** From engine to wheels: one number for every gear, or one a gear. */
	readonly efficiencies: number | readonly number[];
	readonly fuelDensityKgM3: number;
	/** Undefined: not known. */
	readonly tankM3: number | undefined;
	readonly tires: Tires;
	readonly rack: Rack;
	readonly margins: Margins;
	readonly installed: {readonly pair: Pair; readonly gearbox: string} | undefined;
	readonly rules: Readonly<Partial<Record<TrackType, Rules>>>;
};
