/** Choosing a track and a car, and changing their fields. */

import type {AnyBinding} from './binding.ts';

export const formKeys = [
	{scope: 'edit', keys: ['enter'], does: 'open field', words: 'type into the field', short: 'type', rank: 1},
	{scope: 'edit', keys: ['up', 'k'], does: 'field up', words: 'the field above', short: 'field', rank: 1},
	{scope: 'edit', keys: ['down', 'j'], does: 'field down', words: 'the field below'},
	{scope: 'edit', keys: ['left'], does: 'column left', words: 'the column to the left, in a table'},
	{scope: 'edit', keys: ['right'], does: 'column right', words: 'the column to the right, in a table'},
	{scope: 'edit', keys: ['tab'], does: 'next section', words: 'the next section', short: 'section', rank: 1},
	{scope: 'edit', keys: ['shift+tab'], does: 'previous section', words: 'the section before'},
	{scope: 'edit', keys: ['pageup'], does: 'fields up', words: 'ten fields up'},
	{scope: 'edit', keys: ['pagedown'], does: 'fields down', words: 'ten fields down'},
	{
		scope: 'edit',
		keys: ['e'],
		does: 'other form',
		words: 'the form of the track, or of the car',
		short: 'track or car',
		rank: 2,
	},
	{
		scope: 'edit',
		keys: ['a'],
		does: 'add entry',
		words: 'add a copy of this entry (straight, situation, pair, set, engine, point)',
		short: 'add',
	},
	{scope: 'edit', keys: ['x'], does: 'remove entry', words: 'remove this entry', short: 'remove'},
	{scope: 'edit', keys: ['['], does: 'entry up', words: 'move this entry up'},
	{scope: 'edit', keys: [']'], does: 'entry down', words: 'move this entry down'},
	{scope: 'edit', keys: ['delete', 'backspace'], does: 'clear field', words: 'empty an optional field'},
	{
		scope: 'edit',
		keys: ['o'],
		does: 'to shipped',
		words: 'put the field back to its shipped value',
		short: 'shipped value',
	},

	{scope: 'field', keys: ['enter'], does: 'accept', words: 'take it', short: 'take it'},
	{scope: 'field', keys: ['escape'], does: 'put back', words: 'leave the field as it was', short: 'as it was'},
	{
		scope: 'field',
		keys: ['tab'],
		does: 'accept right',
		words: 'take it, and on to the next field or column',
		short: 'next',
	},
	{scope: 'field', keys: ['shift+tab'], does: 'accept left', words: 'take it, and back to the field or column before'},
	{scope: 'field', keys: ['down'], does: 'accept down', words: 'take it, and on to the field below'},
	{scope: 'field', keys: ['up'], does: 'accept up', words: 'take it, and on to the field above'},

	{scope: 'choose', keys: ['up'], does: 'choice up', words: 'the name above', short: 'choose'},
	{scope: 'choose', keys: ['down'], does: 'choice down', words: 'the name below'},
	{scope: 'choose', keys: ['enter'], does: 'take choice', words: 'take it', short: 'take it'},
	{scope: 'choose', keys: ['tab'], does: 'other choice', words: 'tracks, or cars', short: 'tracks or cars'},
	{scope: 'choose', keys: ['ctrl+n'], does: 'start new', words: 'start one from nothing', short: 'new'},
	{scope: 'choose', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back'},
] as const satisfies readonly AnyBinding[];
