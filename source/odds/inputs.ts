/** Which numbers are drawn, and how each moves the world. */
import type {Car, Engine} from '../drivetrain/car.ts';
import type {Change, Track} from '../drivetrain/track.ts';
import {type Default, defaults} from './defaults.ts';
import type {Input, InputKind, InputUnit} from './input.ts';
import {type Stated, StatedFields} from './stated.ts';
import type {Shift} from './world.ts';

const statedWhy = 'as stated';

export type Inputs = {
	readonly inputs: readonly Input[];
	/** "track: pitRoad.limit": stated in a document, and not among what is drawn. */
	readonly notDrawn: readonly string[];
};

/** The inputs of a car as it is at a track. The most general first: they get the best of the draws. */
export function inputsOf(car: Car, track: Track, engine: Engine, anchored: boolean, stated: Stated): Inputs {
	const fields = new StatedFields(stated);
	const inputs = [
		...carInputs(car, track, engine, anchored, fields),
		...dayInputs(track, fields),
		...situationInputs(track, fields),
		...straightInputs(track, fields),
	];
	return {inputs: inputs.filter(({sd}) => sd > 0), notDrawn: fields.notAsked()};
}

function input(
	name: string,
	kind: InputKind,
	unit: InputUnit,
	stated: number | undefined,
	otherwise: Default,
	move: (shift: Shift, off: number) => void,
): Input {
	return stated === undefined
		? {name, kind, unit, sd: otherwise.sd, source: 'default', why: otherwise.why, move}
		: {name, kind, unit, sd: stated, source: 'stated', why: statedWhy, move};
}

/** Nothing is drawn of it unless it is stated. */
const onlyStated: Default = {sd: 0, why: ''};

const either = (one: {sd: number; anchored: number; why: string}, anchored: boolean): Default => ({
	sd: anchored ? one.anchored : one.sd,
	why: one.why,
});

const over = (stated: number | undefined, value: number): number | undefined =>
	stated === undefined || value === 0 ? undefined : stated / Math.abs(value);

const most = (...values: (number | undefined)[]): number | undefined => {
	const known = values.filter(value => value !== undefined);
	return known.length > 0 ? Math.max(...known) : undefined;
};

function carInputs(car: Car, track: Track, engine: Engine, anchored: boolean, fields: StatedFields): Input[] {
	const {tires, grip, power, dragAreaM2, massKg, downforceAreaM2} = track.car;
	const {growth, leftM, rightM} = car.tires;
	const rollout = most(
		over(fields.replaceable('tires.left', tires.leftM !== undefined), leftM),
		over(fields.replaceable('tires.right', tires.rightM !== undefined), rightM),
	);
	const ofEngine = fields.car(`engines[${car.engines.findIndex(({name}) => name === engine.name)}].power`);
	const ofTrack = fields.track('car.power');
	const growthShare = anchored ? defaults.growth.anchoredShare : defaults.growth.share;
	return [
		input('rollout', 'rollout', 'share', rollout, defaults.rollout, (shift, off) => {
			shift.rollout += off;
		}),
		input(
			'slip',
			'slip',
			'points',
			fields.replaceable('tires.slip', tires.slip !== undefined),
			either(defaults.slip, anchored),
			(shift, off) => {
				shift.slip += off;
			},
		),
		input(
			'drag area',
			'drag',
			'share',
			over(fields.replaceable('dragArea', dragAreaM2 !== undefined), car.dragAreaM2),
			either(defaults.drag, anchored),
			(shift, off) => {
				shift.drag += off;
			},
		),
		input(
			'power',
			'power',
			'share',
			over(power === undefined ? ofEngine : ofTrack, engine.power),
			either(defaults.power, anchored),
			(shift, off) => {
				shift.power += off;
			},
		),
		input(
			'growth',
			'growth',
			'points',
			fields.replaceable('tires.growth', tires.growth !== undefined),
			{sd: growth * growthShare, why: defaults.growth.why},
			(shift, off) => {
				shift.growth += off;
			},
		),
		input(
			'grip',
			'grip',
			'share',
			over(fields.replaceable('grip', grip !== undefined), car.grip),
			defaults.grip,
			(shift, off) => {
				shift.grip += off;
			},
		),
		input('mass', 'other', 'mass', fields.replaceable('mass', massKg !== undefined), onlyStated, (shift, off) => {
			shift.massKg += off;
		}),
		input(
			'downforce area',
			'other',
			'area',
			fields.replaceable('downforceArea', downforceAreaM2 !== undefined),
			onlyStated,
			(shift, off) => {
				shift.downforceM2 += off;
			},
		),
		input('rolling resistance', 'other', 'number', fields.car('rolling'), onlyStated, (shift, off) => {
			shift.rolling += off;
		}),
	];
}

function dayInputs(track: Track, fields: StatedFields): Input[] {
	const {air, wind, straights} = track;
	const {temperature, pressure, windSpeed, windDirection} = defaults;
	const temperatureSd = air?.temperatureC === undefined ? temperature.unknown : temperature.sd;
	const pressureSd = air?.pressurePa === undefined ? pressure.unknown : pressure.sd;
	const blows = wind !== undefined && straights.some(({headingRad}) => headingRad !== undefined);
	const day = [
		input(
			'air temperature',
			'temperature',
			'temperature',
			fields.track('air.temperature'),
			{sd: temperatureSd, why: temperature.why},
			(shift, off) => {
				shift.temperatureC += off;
			},
		),
		input(
			'air pressure',
			'pressure',
			'pressure',
			most(fields.track('air.pressure'), fields.track('air.altimeter')),
			{sd: pressureSd, why: pressure.why},
			(shift, off) => {
				shift.pressurePa += off;
			},
		),
	];
	if (!blows) return day;
	return [
		...day,
		input('wind speed', 'wind speed', 'speed', fields.track('wind.speed'), windSpeed, (shift, off) => {
			shift.windMps += off;
		}),
		input('wind direction', 'wind direction', 'angle', fields.track('wind.from'), windDirection, (shift, off) => {
			shift.windRad += off;
		}),
	];
}

function situationInputs(track: Track, fields: StatedFields): Input[] {
	return track.situations.flatMap((situation, i) => {
		const stated = (field: string) => fields.situation(track, i, field);
		const where = `in ${situation.name}`;
		const inputs: Input[] = [];
		if (situation.drag !== undefined)
			inputs.push(
				input(
					`drag ${where}`,
					'tow',
					situation.drag.kind === 'scale' ? 'points' : 'area',
					stated('drag'),
					{sd: defaults.tow.share * sizeOf(situation.drag), why: defaults.tow.why},
					(shift, off) => {
						shift.situations[i]!.drag += off;
					},
				),
			);
		if (situation.exit !== undefined)
			inputs.push(
				input(
					`exit ${where}`,
					'situation exit',
					situation.exit.kind === 'scale' ? 'points' : 'speed',
					most(stated('exit'), undefined),
					{sd: situation.exit.kind === 'scale' ? 0 : defaults.situationExit.sd, why: defaults.situationExit.why},
					(shift, off) => {
						shift.situations[i]!.exitMps += off;
					},
				),
			);
		for (const field of ['grip', 'mass', 'rollout', 'power'] as const) {
			if (situation[field] === undefined) continue;
			const unit = situation[field].kind === 'scale' ? 'points' : unitsOfFields[field];
			inputs.push(
				input(`${field} ${where}`, 'other', unit, stated(field), onlyStated, (shift, off) => {
					shift.situations[i]![field] += off;
				}),
			);
		}
		return inputs;
	});
}

const unitsOfFields = {grip: 'number', mass: 'mass', rollout: 'length', power: 'power'} as const;

/** How large a change is; what replaces a number says nothing of a change. */
const sizeOf = (change: Change): number =>
	change.kind === 'scale' ? Math.abs(change.factor - 1) : change.kind === 'add' ? Math.abs(change.value) : 0;

function straightInputs(track: Track, fields: StatedFields): Input[] {
	return track.straights.flatMap(({name, entryMps, lengthM, endMps}, i) => {
		const stated = (field: string) => fields.track(`straights[${i}].${field}`);
		const inputs = [
			input(`exit of ${name}`, 'exit', 'speed', stated('exit'), defaults.exit, (shift, off) => {
				shift.straights[i]!.exitMps += off;
			}),
		];
		// The end is held at a speed of its own: as well known as the exit.
		if (endMps !== undefined)
			inputs.push(
				input(`end of ${name}`, 'exit', 'speed', stated('end'), defaults.exit, (shift, off) => {
					shift.straights[i]!.endMps += off;
				}),
			);
		if (entryMps !== undefined)
			inputs.push(
				input(`entry of ${name}`, 'other', 'speed', stated('entry'), onlyStated, (shift, off) => {
					shift.straights[i]!.entryMps += off;
				}),
			);
		if (lengthM !== undefined)
			inputs.push(
				input(`length of ${name}`, 'other', 'length', stated('length'), onlyStated, (shift, off) => {
					shift.straights[i]!.lengthM += off;
				}),
			);
		return inputs;
	});
}
