/** Which engine runs at a type of track, and the RPM limit that holds there. */
import type {Car, Engine, Rules, TrackType} from './car.ts';

export type LimitInForce = {
	readonly rpm: number;
	/** Whose limit it is: the engine's, the car's rules' for the track type, or the track's own. */
	readonly from: 'engine' | 'rules' | 'track';
};

/** The first build that lists the track type; undefined where none does. */
export function engineFor(car: Car, type: TrackType): Engine | undefined {
	return car.engines.find(engine => engine.for.includes(type));
}

/** The lowest of the engine's limit, the car's rules' for the track type, and the track's; among equals the first of these. */
export function limitInForce(engine: Engine, carRules: Rules | undefined, trackRules: Rules | undefined): LimitInForce {
	const limits: LimitInForce[] = [
		{rpm: engine.rpmLimit, from: 'engine'},
		{rpm: carRules?.rpmLimit ?? Number.POSITIVE_INFINITY, from: 'rules'},
		{rpm: trackRules?.rpmLimit ?? Number.POSITIVE_INFINITY, from: 'track'},
	];
	return limits.reduce((lowest, limit) => (limit.rpm < lowest.rpm ? limit : lowest));
}
