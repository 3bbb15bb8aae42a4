/** What a load list is, without gears and tracks: needs, each served in one of several ways, and things that serve them. */

/** A way to serve a need: of each demand at least one thing must be there. Things are counted from 0. */
export type Way = {
	/** What it costs to serve the need this way; 0 is best. */
	readonly loss: number;
	/** At most `mostDemands`, none empty, no two with a thing in common: each takes a thing of its own. */
	readonly demands: readonly (readonly number[])[];
};

/** The ways that serve a need; one of them is enough. Without any it can never be served. */
export type Need = readonly Way[];

export type CoverProblem = {
	/** Of each thing, what decides between covers of the same size and loss; 0 or more. */
	readonly unease: readonly number[];
	readonly needs: readonly Need[];
};

export type Cover = {
	/** Rising. */
	readonly things: readonly number[];
	/** The least loss of the ways that are there, added up over the needs. */
	readonly loss: number;
	readonly unease: number;
};

/** A state holds the demands met of a way in as many bits. */
export const mostDemands = 15;

export const isServed = (way: Way, has: (thing: number) => boolean): boolean =>
	way.demands.every(demand => demand.some(has));

/** The loss of the best way that is there; infinite where none is. */
export const lossOf = (need: Need, has: (thing: number) => boolean): number =>
	need.reduce((least, way) => (way.loss < least && isServed(way, has) ? way.loss : least), Number.POSITIVE_INFINITY);
