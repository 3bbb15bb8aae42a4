/** What reads text of people and strangers, as the fuzzer sees it. One file a reader in `readers`. */
import type {Problem} from '../../source/documents/problem.ts';
import type {Random} from './random.ts';

export type Answer = {
	accepted: boolean;
	/** Everything that a person is shown of it. */
	said?: string;
	/** Of a rejected document: each with where it stands, what was found and what is allowed. */
	problems?: readonly Problem[];
	/** A promise of this reader's own that does not hold, such as: printed and read again it is the same. */
	broken?: string | undefined;
};

/** Changes a text with some knowledge of what it is; undefined where it does not apply. */
export type Mutator = (text: string, random: Random) => string | undefined;

export type Reader = {
	name: string;
	/** Texts that it accepts. */
	examples: () => Promise<readonly string[]> | readonly string[];
	/** Words of its language, put in and exchanged for one another. */
	words: readonly string[];
	/** Beside the general ones of `mutate.ts`. */
	mutators?: readonly Mutator[];
	/** Longer texts are not made. */
	longest: number;
	/** How often a piece of our source may run: so many times, and so many more a character. Time is not measured. */
	work?: {start: number; perCharacter: number};
	read: (text: string) => Promise<Answer> | Answer;
};
