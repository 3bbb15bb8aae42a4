/** Taking in a plan: what was read of it, and what the reader has of those names. */
import type {Agreement} from '../../sharing/agreement.ts';
import type {Own} from '../../sharing/hold-against.ts';
import type {PlanDocument} from '../../sharing/plan-document.ts';
import type {ShortPlan} from '../../sharing/short-form.ts';
import type {Documents, OpenDocument} from './documents.ts';

/** The documents of the reader that have the names of the plan's. */
export type OwnDocuments = {readonly track: OpenDocument | undefined; readonly car: OpenDocument | undefined};

export type Incoming =
	| {
			readonly form: 'plan';
			readonly plan: PlanDocument;
			readonly compared: readonly Agreement[];
			/** Why the plan fails a check, computed again; undefined where it fails none. */
			readonly failure: string | undefined;
			readonly own: OwnDocuments;
			readonly differences: Own;
	  }
	/** Only the numbers to act on. */
	| {readonly form: 'short'; readonly fields: ShortPlan};

/** Whether a paste is a plan, not the name of a file that holds one. */
export const looksLikePlan = (text: string): boolean =>
	/DROPRACK\s+PLAN|\bDR1\s|DRP1:|^\s*\{/i.test(text) || /\S[^\S\r\n]*[\r\n]+[^\S\r\n]*\S/.test(text);

/** The documents of those names among these, as they stand where they are open. */
export function ownAmong(
	catalog: readonly OpenDocument[],
	{open}: Documents,
	names: {track: unknown; car: unknown},
): OwnDocuments {
	const known = [...Object.values(open), ...catalog.filter(({id}) => !(id in open))];
	const named = (kind: 'track' | 'car') => known.find(one => one.kind === kind && one.json.name === names[kind]);
	return {track: named('track'), car: named('car')};
}
