/** What odds are asked for at the screen, and what is known of them. */
import type {OneTooth} from '../../odds/one-tooth.ts';
import type {Matters, Odds} from '../../odds/results.ts';
import type {Ranked} from '../../planning/rank-rack.ts';
import type {Documents} from './documents.ts';

export type OddsSoFar = {
	readonly odds: Odds | undefined;
	readonly matters: Matters | undefined;
	readonly isDone: boolean;
};

/** What the place of odds shows: of the same ranking as the rows. */
export type OddsShown = OddsSoFar & {readonly tooth: OneTooth | undefined};

export type OddsAsked = {
	readonly documents: Documents;
	readonly situation: string | undefined;
	readonly risk: number | undefined;
	readonly ranked: Ranked;
};
