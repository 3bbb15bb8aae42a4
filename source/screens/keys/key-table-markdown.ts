import {bindingsOf} from './key-table.ts';
import {keyWords} from './key-words.ts';
import {type Scope, scopes} from './scopes.ts';

/** The table of keys for the README. */
export function keyTableMarkdown(): string {
	const row = (cells: readonly string[]) => `| ${cells.map(cell => cell.replaceAll('|', '\\|')).join(' | ')} |`;
	const sections = (Object.keys(scopes) as Scope[]).map(scope => {
		const rows = bindingsOf(scope).map(({keys, words}) => row([keys.map(keyWords).join(', '), words]));
		return [row([`**${scopes[scope]}**`, '']), ...rows].join('\n');
	});
	return [row(['key', 'what it does']), row(['---', '---']), ...sections].join('\n');
}
