import type {Car, Engine, GearInventory, Margins, Rack, Rules, Tires, TrackType} from '../drivetrain/car.ts';
import {mileM} from '../drivetrain/constants.ts';
import type {CarDocument} from './car-fields.ts';

/** Half of the wheels are driven. */
const undrivenShare = 0.5;

/** The car that a checked document describes, with what is so unless given. */
export function carFrom(document: CarDocument): Car {
	return {
		name: document.name,
		massKg: document.mass,
		rearShare: document.rearShare,
		dragAreaM2: document.dragArea,
		downforceAreaM2: document.downforceArea,
		rearDownforceShare: document.rearDownforceShare,
		rolling: document.rolling,
		grip: document.grip,
		wheelInertiaKgM2: document.wheelInertia,
		undrivenInertiaKgM2: document.undrivenInertia ?? undrivenShare * document.wheelInertia,
		shiftTimeS: document.shiftTime,
		reactionTimeS: document.reactionTime,
		wheelbaseM: document.wheelbase,
		cgHeightM: document.cgHeight,
		engines: document.engines.map(engineFrom),
		gearboxes: document.gearboxes,
		gearInventory: inventoryFrom(document.gearInventory),
		finalDrive: document.finalDrive,
		efficiencies: document.efficiencies ?? document.efficiency!,
		fuelDensityKgM3: document.fuelDensity,
		tankM3: document.tank,
		tires: tiresFrom(document.tires),
		rack: rackFrom(document.rack),
		margins: marginsFrom(document.margins),
		installed: document.installed,
		rules: rulesByType(document.rules ?? {}),
	};
}

function engineFrom(engine: CarDocument['engines'][number]): Engine {
	const {inertia, limiter, fuelConsumption, curve, pullRpm = curve[0]!.rpm, ...same} = engine;
	const points = curve.map(({rpm, torque}) => ({rpm, torqueNm: torque}));
	return {...same, inertiaKgM2: inertia, limiter, pullRpm, fuelConsumptionKgPerJ: fuelConsumption, curve: points};
}

function inventoryFrom(inventory: CarDocument['gearInventory']): GearInventory | undefined {
	if (inventory === undefined) return undefined;
	const {gears, smallestStep = 1, largestStep = Number.POSITIVE_INFINITY} = inventory;
	return {gears: gears.map(({fits, ...gear}) => ({...gear, fits})), smallestStep, largestStep};
}

function tiresFrom({left, right, growth, slip, steadySlip, diameter, size = diameter}: CarDocument['tires']): Tires {
	return {leftM: left, rightM: right, growth, slip, steadySlip, diameterM: size};
}

function rackFrom({toothSums, eitherShaft, pairs}: CarDocument['rack']): Rack {
	return {
		toothSums,
		eitherShaft,
		pairs: pairs.map(({driving, driven, sets, miles, maxMiles}) => ({
			driving,
			driven,
			sets,
			milesM: miles * mileM,
			maxMilesM: maxMiles === undefined ? undefined : maxMiles * mileM,
		})),
	};
}

function marginsFrom({settleStart, settleEnd, sameTime, level, ...rpm}: CarDocument['margins']): Margins {
	return {...rpm, settleStartS: settleStart, settleEndS: settleEnd, sameTimeS: sameTime, levelS: level};
}

function rulesByType(rules: NonNullable<CarDocument['rules']>): Partial<Record<TrackType, Rules>> {
	const given = Object.entries(rules).filter(([, allowed]) => allowed !== undefined);
	return Object.fromEntries(given.map(([type, allowed]) => [type, rulesFrom(allowed)]));
}

/** What a rule book allows; everything where nothing is said. */
export function rulesFrom(rules: {[field in keyof Rules]?: Rules[field]} | undefined): Rules {
	return {rpmLimit: rules?.rpmLimit, gearboxes: rules?.gearboxes, pairs: rules?.pairs};
}
