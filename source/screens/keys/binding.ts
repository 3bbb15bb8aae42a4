import type {Scope} from './scopes.ts';

/** A line of the key table. */
export type AnyBinding = {
	readonly scope: Scope;
	/** As `keyName` gives them; the first one is shown. */
	readonly keys: readonly string[];
	/** What it does, in a word or two. */
	readonly does: string;
	/** For the help. */
	readonly words: string;
	/** For the line of keys; left out there where absent. */
	readonly short?: string;
	/** Where the line of keys is too short, the highest is left out first; 5 unless given. */
	readonly rank?: number;
};
