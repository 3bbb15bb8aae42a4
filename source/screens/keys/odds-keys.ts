/** Looking at odds, and the risk that is accepted. */

import type {AnyBinding} from './binding.ts';

export const oddsKeys = [
	{scope: 'odds', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'odds', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{scope: 'odds', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'odds', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'odds',
		keys: ['n'],
		does: 'risk',
		words: 'the chance of passing the limit that you accept; it orders the ranking',
		short: 'risk',
		rank: 1,
	},
	{scope: 'odds', keys: ['enter'], does: 'ranking', words: 'back to the ranking'},

	{scope: 'risk', keys: ['enter'], does: 'accept risk', words: 'take it; nothing accepts none', short: 'take it'},
	{scope: 'risk', keys: ['escape'], does: 'uncover', words: 'leave it as it was', short: 'as it was'},
] as const satisfies readonly AnyBinding[];
