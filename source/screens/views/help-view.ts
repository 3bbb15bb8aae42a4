/** Every key, those of the place first. */
import {bindingsOf, workingIn} from '../keys/key-table.ts';
import {asciiKeyWords, keyWords} from '../keys/key-words.ts';
import {type Scope, scopes} from '../keys/scopes.ts';
import {blank, line, type Pieces, padded, piece} from '../parts/pieces.ts';
import {marks} from './marks.ts';

const keysWidth = 18;

export function helpView(held: readonly Scope[], ascii: boolean): Pieces[] {
	const others = (Object.keys(scopes) as Scope[]).filter(scope => !held.includes(scope));
	const working = workingIn(held);
	const bindings = (scope: Scope) =>
		held.includes(scope) ? working.filter(binding => binding.scope === scope) : bindingsOf(scope);
	const sections = [...held, ...others].flatMap((scope): Pieces[] => [
		line(scopes[scope], 'strong'),
		...bindings(scope).map(
			({keys, words}): Pieces => [
				piece('  '),
				padded(keys.map(ascii ? asciiKeyWords : keyWords).join(' '), keysWidth, 'key'),
				piece(` ${words}`),
			],
		),
		blank,
	]);
	return [...sections, ...wordsOfTheScreen.map(words => line(words))];
}

const wordsOfTheScreen = [
	`${marks.cursor} the cursor, ${marks.installed} in the car, ${marks.plan} the plan, ${marks.comparison} compared with`,
	'margin: from the highest RPM to the limit. exit: the lowest RPM at an exit. of band: that above the low end of the band.',
	'shorter: higher ratio, more RPM. taller: lower ratio, less RPM.',
	'A field takes a number with its unit, or arithmetic: 118 mph, 118*1.02 mph, 86.5+0.25 in. A number alone gets the unit that stood there.',
];
