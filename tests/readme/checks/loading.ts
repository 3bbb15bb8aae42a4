/** The exact choice under the load list. */
import {fewest} from '../../../source/loading/fewest.ts';
import {hitting, triples} from '../../loading/steiner.ts';
import type {OutsideCheck} from '../outside-check.ts';

export const loading: readonly OutsideCheck[] = [
	{
		what: 'Fewest elements that hit every triple of the Steiner system A9',
		source: 'Fulkerson, Nemhauser & Trotter, Math. Prog. Study 2 (1974)',
		mark: 'from memory',
		cases: [{outside: '5', ours: fewest(hitting(9, triples(2)))!.things.length}],
		tolerance: 0,
	},
];
