/** Looking at rows: the ranking, the reasons, the pictures. */

import type {AnyBinding} from './binding.ts';

export const lookingKeys = [
	{scope: 'ranking', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'ranking', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{
		scope: 'ranking',
		keys: ['enter'],
		does: 'why',
		words: 'see why: checks, points and straights of this row',
		short: 'why',
		rank: 2,
	},
	{scope: 'ranking', keys: ['pageup'], does: 'page up', words: 'ten rows up'},
	{scope: 'ranking', keys: ['pagedown'], does: 'page down', words: 'ten rows down'},
	{scope: 'ranking', keys: ['home'], does: 'first row', words: 'the first row'},
	{scope: 'ranking', keys: ['end'], does: 'last row', words: 'the last row'},
	{
		scope: 'ranking',
		keys: ['o'],
		does: 'next order',
		words: 'sort by place, ratio, margin, exit RPM, shifts',
		short: 'sort',
		rank: 7,
	},
	{
		scope: 'ranking',
		keys: ['h'],
		does: 'hide failing',
		words: 'hide rows that fail a check, or show them',
		short: 'hide FAIL',
		rank: 7,
	},
	{
		scope: 'ranking',
		keys: ['b'],
		does: 'next gearbox',
		words: 'one gearbox set after the other, then all',
		short: 'set',
		rank: 8,
	},
	{
		scope: 'ranking',
		keys: ['n'],
		does: 'least margin',
		words: 'hide rows with less to the limit than so many RPM',
		short: 'margin',
		rank: 8,
	},

	{
		scope: 'margin',
		keys: ['enter'],
		does: 'accept margin',
		words: 'take it; nothing shows every row',
		short: 'take it',
	},
	{scope: 'margin', keys: ['escape'], does: 'uncover', words: 'leave it as it was', short: 'as it was'},

	{scope: 'why', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'why', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{scope: 'why', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'why', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{scope: 'why', keys: ['enter'], does: 'ranking', words: 'back to the ranking'},

	{scope: 'pictures', keys: ['tab'], does: 'next picture', words: 'the next picture', short: 'picture', rank: 1},
	{scope: 'pictures', keys: ['shift+tab'], does: 'previous picture', words: 'the picture before'},
	{scope: 'pictures', keys: ['l'], does: 'next straight', words: 'the next straight', short: 'straight', rank: 1},
	{scope: 'pictures', keys: ['L'], does: 'previous straight', words: 'the straight before'},
	{scope: 'pictures', keys: ['up', 'k'], does: 'row up', words: 'the row above'},
	{scope: 'pictures', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
] as const satisfies readonly AnyBinding[];
