/** Why a row stands where it stands, in a few lines: always in view beside or below the ranking. */

import {visible} from '../../documents/visible.ts';
import type {Check, Row} from '../../planning/results.ts';
import {countsRpm} from '../../text/check-view.ts';
import {rpmDown, rpmUp, seconds, signed} from '../../text/units.ts';
import {wrap} from '../../text/width.ts';
import {line, type Meaning, type Piece, type Pieces, piece, widthOf} from '../parts/pieces.ts';

/** Name, verdict and the sentence; then each check with its margin, as many as fit a line. */
export function reasonView(row: Row, width: number): Pieces[] {
	return [...sentenceView(row, width), ...flowing(checkWords(row.checks), width)];
}

export function sentenceView(row: Row, width: number): Pieces[] {
	const verdict = row.verdict === 'fail' ? 'FAIL' : row.verdict;
	const name = `${row.pair} ${visible(row.gearbox)}`;
	const reason = row.reason === '' ? 'The pair in the car; the rest of the rack is being ranked.' : row.reason;
	const [first = '', ...rest] = wrap(visible(`${name} ${verdict} ${reason}`), width);
	const head: Piece[] = [
		piece(name, 'strong'),
		piece(' '),
		piece(verdict, row.verdict),
		piece(first.slice(name.length + 1 + verdict.length)),
	];
	return [first.startsWith(`${name} ${verdict}`) ? head : line(first), ...rest.map(text => line(text))];
}

/** Shorter than in the tables, since all of them share a few lines. */
const names: Record<Check['check'], string> = {
	limit: 'limit',
	limiter: 'limiter',
	band: 'band',
	afterShift: 'after shift',
	settle: 'settled',
	pitRoad: 'pit road',
	restart: 'restart',
	downshift: 'downshift',
	permitted: 'permitted',
	housing: 'housing',
	stock: 'stock',
	mileage: 'mileage',
};

/** What is wrong first, and of what is right only the words. */
function checkWords(checks: readonly Check[]): Piece[][] {
	const rank = {fail: 0, near: 1, pass: 2};
	return checks
		.toSorted((a, b) => rank[a.verdict] - rank[b.verdict])
		.map(check => {
			const tone: Meaning = check.verdict === 'pass' ? 'muted' : check.verdict;
			const word = check.verdict === 'fail' ? 'FAIL' : check.verdict;
			// Where the highest RPM is turned is always told.
			const at = check.verdict === 'pass' && check.check !== 'limit' ? '' : placeWords(check);
			return [piece(`${names[check.check]} `), piece(word, tone), piece(`${marginWords(check)}${at}`)];
		});
}

/** What is right although it is below its bound has its reason elsewhere. */
function marginWords({check, margin, verdict}: Check): string {
	if (margin === null || (verdict === 'pass' && margin < 0)) return '';
	if (check === 'settle') return ` ${signed(margin, 1)} s`;
	return countsRpm(check) ? ` ${margin > 0 ? '+' : ''}${margin < 0 ? rpmUp(margin) : rpmDown(margin)}` : '';
}

const placeWords = ({at, situation}: Check): string => {
	const words = [at, situation].filter(Boolean).map(visible).join(', ');
	return words === '' ? '' : ` (${words})`;
};

/** Parts one after the other, on as many lines as they need. */
export function flowing(parts: readonly (readonly Piece[])[], width: number, between = '  '): Pieces[] {
	const lines: Piece[][] = [];
	for (const part of parts) {
		const last = lines.at(-1);
		if (last && widthOf(last) + between.length + widthOf(part) <= width) last.push(piece(between), ...part);
		else lines.push([...part]);
	}
	return lines;
}

/** Times of a row in words. */
export const timeWords = ({timeS, fastestS}: Row): string =>
	timeS === null ? 'no times' : `${seconds(timeS)} s a lap (fastest ${seconds(fastestS)} s)`;
