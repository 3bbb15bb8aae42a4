/** Handing over: what there is to hand over, and of which row. */
import type {Drawn, Window} from '../../sharing/qr.ts';
import {current, type Documents, titleOf} from './documents.ts';
import type {Placed} from './rows.ts';

export const items = [
	'plan as text',
	'one line',
	'QR of plan',
	'QR of line',
	'driver card',
	'swap sheet',
	'engine sheet',
] as const;
export type Item = (typeof items)[number];

/** `date` is when it was asked for (ISO 8601), `day` that day where the person is (YYYY-MM-DD). */
export type HandOver = {readonly item: Item; readonly date: string; readonly day: string};

/** What is copied and written; and for a QR code how it is drawn for a window. */
export type Handed = {readonly text: string; readonly draw: ((window: Window) => Drawn) | undefined};

/** The row that is handed over: the plan, or where there is none on the rack the row under the cursor. */
export function rowToHandOver(
	plan: string | undefined,
	all: readonly Placed[],
	here: Placed | undefined,
): {readonly placed: Placed; readonly words: string} | undefined {
	const planned = all.find(({name}) => name === plan);
	if (planned) return {placed: planned, words: `${planned.name}, the plan`};
	if (here === undefined) return undefined;
	const lost = plan === undefined ? 'p makes it the plan' : `the plan ${plan} is not on the rack`;
	return {placed: here, words: `${here.name}, the row under the cursor; ${lost}`};
}

/** A name for a file of it: `quillmere-driver-card.txt`. */
export function fileNameFor(documents: Documents, item: Item): string {
	const words = `${titleOf(current(documents, 'track'))} ${item}`.normalize('NFKD').toLowerCase();
	return `${words
		.replace(/\p{Mark}/gu, '')
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-|-$/g, '')}.txt`;
}
