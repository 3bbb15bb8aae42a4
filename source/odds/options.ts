/** What may be asked of odds. */
import type {Stated} from './stated.ts';

export type OddsOptions = {
	/** The chance of passing the RPM limit that is accepted, a share of 1. */
	readonly risk?: number | undefined;
	readonly seed?: number | undefined;
	/** The only situation; all of them unless given. */
	readonly situation?: string | undefined;
	/** What the documents say of how well their numbers are known. */
	readonly stated?: Stated | undefined;
	/** Draws for every row that matters, and the most of all; powers of two. */
	readonly draws?: number | undefined;
	readonly mostDraws?: number | undefined;
	/** Names of rows in the order of a ranking that is known, so that the first answer is about the best of them at once. */
	readonly order?: readonly string[] | undefined;
	/** Leaves nothing for later: every row goes through every draw. For tests. */
	readonly inFull?: boolean | undefined;
};

export const seedUnlessGiven = 1;
/** With these a chance near a half is known to a few percent. */
export const drawsUnlessGiven = 512;
/** More would not change what a person does. */
export const mostDrawsUnlessGiven = 4096;
