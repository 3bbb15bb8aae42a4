/** The keys of the place, on one line: as many as fit, the rest is in the help. */
import {type Binding, bindingsOf, keyWords, type Scope} from '../key-table.ts';
import {fitted, type Piece, type Pieces, piece, widthOf} from '../parts/pieces.ts';

const between = '  ';

/** Help and the way out are always there. */
export function keyLine(scopes: readonly Scope[], width: number): Pieces {
	const shown = scopes.flatMap(scope => bindingsOf(scope).filter(({short}) => short !== undefined));
	const once = shown.filter((binding, i) => shown.findIndex(other => other.short === binding.short) === i);
	const last = once.filter(({does}) => does === 'help' || does === 'quit');
	const rest = once.filter(binding => !last.includes(binding));
	const end = joined(last);
	const line: Piece[] = [];
	for (const binding of rest) {
		const part = keyPieces(binding);
		const room = width - widthOf(line) - widthOf(part) - (end.length > 0 ? widthOf(end) + between.length : 0);
		if (room < between.length) break;
		line.push(...(line.length > 0 ? [piece(between)] : []), ...part);
	}
	return fitted([...line, ...(line.length > 0 && end.length > 0 ? [piece(between)] : []), ...end], width);
}

const joined = (bindings: readonly Binding[]): Piece[] =>
	bindings.flatMap((binding, i) => [...(i > 0 ? [piece(between)] : []), ...keyPieces(binding)]);

/** Arrows that belong together are shown together. */
function keyPieces({keys, does, short}: Binding): Piece[] {
	const both: Record<string, string> = {'row up': '↑↓', 'field up': '↑↓', 'choice up': '↑↓', 'scroll up': 'PgUp PgDn'};
	return [piece(both[does] ?? keyWords(keys[0]!), 'key'), piece(` ${short}`, 'muted')];
}
