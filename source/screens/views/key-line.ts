/** The keys of the place: as many as fit, the rest is in the help. */
import {type Binding, workingIn} from '../keys/key-table.ts';
import {asciiKeyWords, keyWords} from '../keys/key-words.ts';
import type {Scope} from '../keys/scopes.ts';
import {clipped, type Piece, type Pieces, piece, widthOf} from '../parts/pieces.ts';

const between = '  ';

const usualRank = 5;

/** So many lines of keys; help and the way out are always there. */
export function keyLines(scopes: readonly Scope[], width: number, count: number, ascii: boolean): Pieces[] {
	const shown = workingIn(scopes).filter(({short}) => short !== undefined);
	const once = shown.filter((binding, i) => shown.findIndex(other => other.short === binding.short) === i);
	const last = once.filter(({does}) => does === 'help' || does === 'quit');
	const rest = once
		.filter(binding => !last.includes(binding))
		.sort((a, b) => (a.rank ?? usualRank) - (b.rank ?? usualRank));
	const end = joined(last, ascii);
	const lines: Piece[][] = Array.from({length: count}, () => []);
	let at = 0;
	for (const binding of rest) {
		const part = keyPieces(binding, ascii);
		const fits = () => {
			const line = lines[at]!;
			const reserved = at === count - 1 && end.length > 0 ? widthOf(end) + between.length : 0;
			return widthOf(line) + (line.length > 0 ? between.length : 0) + widthOf(part) + reserved <= width;
		};
		while (at < count && !fits()) at++;
		if (at === count) break;
		const line = lines[at]!;
		line.push(...(line.length > 0 ? [piece(between)] : []), ...part);
	}
	const final = lines[count - 1]!;
	final.push(...(final.length > 0 && end.length > 0 ? [piece(between)] : []), ...end);
	return lines.map(line => clipped(line, width));
}

const joined = (bindings: readonly Binding[], ascii: boolean): Piece[] =>
	bindings.flatMap((binding, i) => [...(i > 0 ? [piece(between)] : []), ...keyPieces(binding, ascii)]);

/** Arrows that belong together are shown together. */
function keyPieces({keys, does, short}: Binding, ascii: boolean): Piece[] {
	const upDown = ascii ? 'Up Dn' : '↑↓';
	const both: Record<string, string> = {
		'row up': upDown,
		'field up': upDown,
		'choice up': upDown,
		'ahead up': upDown,
		'item up': upDown,
		'draft down': upDown,
		'practice up': upDown,
		'scroll up': 'PgUp PgDn',
	};
	return [piece(both[does] ?? (ascii ? asciiKeyWords : keyWords)(keys[0]!), 'key'), piece(` ${short}`, 'muted')];
}
