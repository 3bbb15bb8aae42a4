/** A result as text for a terminal or as JSON for programs. */

import type {Block} from '../text/blocks.ts';
import {layOut} from '../text/layout.ts';
import {paint} from '../text/paint.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

const narrowest = 40;
const widest = 200;

export const printText = (blocks: readonly Block[], request: Request, around: Surroundings): string => {
	const width = Math.min(widest, Math.max(narrowest, around.columns));
	return paint(layOut(blocks, width, request.ascii), {color: around.color, ascii: request.ascii});
};

/** What JSON leaves as it is and a terminal may act on: further controls, direction marks, line separators. */
const unsafe = /[\u007f-\u009f\u061c\u200e\u200f\u2028-\u202e\u2066-\u2069]/g;
const beyondAscii = /[\u0080-\uffff]/g;
const escaped = (unit: string) => `\\u${unit.charCodeAt(0).toString(16).padStart(4, '0')}`;

/** JSON with the same content whatever the terminal; with `--ascii` in ASCII characters. */
export const printJson = (value: unknown, request: Pick<Request, 'ascii'>): string =>
	`${JSON.stringify(value, null, 2).replace(request.ascii ? beyondAscii : unsafe, escaped)}\n`;
