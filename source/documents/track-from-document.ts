import {stationPressurePa} from '../drivetrain/standard-atmosphere.ts';
import type {
	Air,
	CarChange,
	GearRange,
	Measured,
	PitRoad,
	Restart,
	Situation,
	Straight,
	Track,
} from '../drivetrain/track.ts';
import {rulesFrom} from './car-from-document.ts';
import type {SituationDocument, StraightDocument, TrackDocument} from './track-fields.ts';
import {baseName} from './track-rules.ts';

/** The track that a checked document describes. `Base` comes first among the situations, the others as written. */
export function trackFrom(document: TrackDocument): Track {
	const {name, type, lap, laps, air, wind, gears, straights, situations = [], rules} = document;
	const written = situations.map(situation => situationFrom(situation, air?.elevation));
	const base =
		written.find(situation => situation.name === baseName) ?? situationFrom({name: baseName, share: 1}, undefined);
	return {
		name,
		type,
		lapM: lap,
		laps,
		air: air && airFrom(air, undefined),
		wind: wind && {speedMps: wind.speed, fromRad: wind.from},
		pitRoad: pitRoadFrom(document),
		restart: restartFrom(document),
		gears: gearRange(gears),
		straights: straights.map(straightFrom),
		situations: [base, ...written.filter(situation => situation !== base)],
		rules: rulesFrom(rules),
		car: carChangeFrom(document.car ?? {}),
	};
}

function straightFrom(straight: StraightDocument): Straight {
	return {
		name: straight.name,
		exitMps: straight.exit,
		minimumMps: straight.minimum,
		lengthM: straight.length,
		endMps: straight.end,
		entryMps: straight.entry,
		brakingMps2: straight.braking,
		grade: straight.grade,
		headingRad: straight.heading,
		load: straight.load,
		extraDragN: straight.extraDrag,
		gears: gearRange(straight.gears),
		measured: straight.measured && measuredFrom(straight.measured),
	};
}

function measuredFrom({end, rpm, pair, gearbox, gear}: NonNullable<StraightDocument['measured']>): Measured {
	return {endMps: end, rpm, pair, gearbox, gear};
}

/** `elevationM` is the track's: the station does not move between situations. */
function situationFrom(situation: SituationDocument, elevationM: number | undefined): Situation {
	const {air, wind, headwind} = situation;
	return {
		name: situation.name,
		share: situation.share,
		exit: situation.exit,
		end: situation.end,
		entry: situation.entry,
		minimum: situation.minimum,
		drag: situation.drag,
		grip: situation.grip,
		power: situation.power,
		mass: situation.mass,
		rollout: situation.rollout,
		air: air && airFrom(air, elevationM),
		wind: wind && {
			...(wind.speed !== undefined && {speedMps: wind.speed}),
			...(wind.from !== undefined && {fromRad: wind.from}),
		},
		headwindMps: headwind,
	};
}

function airFrom(air: NonNullable<TrackDocument['air']>, trackElevationM: number | undefined): Air {
	const {temperature, pressure, altimeter, elevation = trackElevationM, humidity, dewPoint} = air;
	const isReduced = altimeter !== undefined && elevation !== undefined;
	return {
		temperatureC: temperature,
		pressurePa: isReduced ? stationPressurePa(altimeter, elevation) : pressure,
		humidity,
		dewPointC: dewPoint,
	};
}

function pitRoadFrom({pitRoad}: TrackDocument): PitRoad | undefined {
	return pitRoad && {limitMps: pitRoad.limit, toleranceMps: pitRoad.tolerance, gear: pitRoad.gear};
}

function restartFrom({restart}: TrackDocument): Restart | undefined {
	return restart && {speedMps: restart.speed, distanceM: restart.distance, gear: restart.gear};
}

function gearRange(gears: readonly number[] | undefined): GearRange | undefined {
	return gears && {lowest: gears[0]!, highest: gears.at(-1)!};
}

function carChangeFrom({
	tires = {},
	grip,
	mass,
	dragArea,
	downforceArea,
}: NonNullable<TrackDocument['car']>): CarChange {
	const {left, right, growth, slip, steadySlip, diameter, size = diameter} = tires;
	return {
		tires: {
			...(left !== undefined && {leftM: left}),
			...(right !== undefined && {rightM: right}),
			...(growth !== undefined && {growth}),
			...(slip !== undefined && {slip}),
			...(steadySlip !== undefined && {steadySlip}),
			...(size !== undefined && {diameterM: size}),
		},
		grip,
		massKg: mass,
		dragAreaM2: dragArea,
		downforceAreaM2: downforceArea,
	};
}
