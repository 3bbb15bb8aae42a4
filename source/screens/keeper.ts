/** What the screen asks of whoever started it: to keep what was changed, beyond this process. */
import type {Documents, OpenDocument} from './session/documents.ts';

export type Saving = {readonly ok: true; readonly words: string} | {readonly ok: false; readonly words: string};

export type Keeper = {
	/** The session as it stands, for the next start; called after every change, and must not keep a key waiting. */
	keep(documents: Documents): void;
	/** The session ended well, or its changes are not wanted. */
	drop(): void;
	/** An earlier session that ended without being saved. */
	readonly earlier: Documents | undefined;
	/** That one is not wanted any more. */
	dropEarlier(): void;
	/** Saves documents under their own names. */
	save(documents: readonly OpenDocument[]): Promise<Saving>;
	/** Where the session is, for a person to read after a crash; undefined where nothing had to be kept. */
	where(): string | undefined;
};
