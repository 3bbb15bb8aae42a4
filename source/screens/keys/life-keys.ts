/** Looking at engine life and fuel. */

import type {AnyBinding} from './binding.ts';

export const lifeKeys = [
	{scope: 'life', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'life', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{scope: 'life', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'life', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{scope: 'life', keys: ['enter'], does: 'ranking', words: 'back to the ranking'},
] as const satisfies readonly AnyBinding[];
