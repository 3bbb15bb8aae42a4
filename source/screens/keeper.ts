/** What the screen asks of whoever started it: to keep what was changed, beyond this process. */
import type {Documents, OpenDocument} from './session/documents.ts';

/** `words` are for the person. */
export type Saving = {readonly ok: boolean; readonly words: string};

/** What is saved beside a track: the car it was ranked with, and the pair and set that were chosen. */
export type Chosen = {readonly car: string; readonly plan: string | undefined};

export type Keeper = {
	/** The session as it stands, for the next start; called after every change, and must not keep a key waiting. */
	keep(documents: Documents): void;
	/** The session ended well, or its changes are not wanted. */
	drop(): void;
	/** An earlier session that ended without being saved. */
	readonly earlier: Documents | undefined;
	/** That one was taken up, or is not wanted any more. */
	dropEarlier(): void;
	/** Saves a document under its own name. */
	save(document: OpenDocument, chosen: Chosen): Saving;
	/** Where the session is, for a person to read after a crash; undefined where nothing had to be kept. */
	where(): string | undefined;
};
