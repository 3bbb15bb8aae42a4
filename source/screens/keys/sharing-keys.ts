/** Handing plans over and taking them in. */

import type {AnyBinding} from './binding.ts';

export const sharingKeys = [
	{
		scope: 'hand over',
		keys: ['up', 'k'],
		does: 'item up',
		words: 'what stands above in the list',
		short: 'what',
		rank: 1,
	},
	{scope: 'hand over', keys: ['down', 'j'], does: 'item down', words: 'what stands below in the list'},
	{scope: 'hand over', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 2},
	{scope: 'hand over', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'hand over',
		keys: ['c'],
		does: 'copy it',
		words: "send it to the terminal's clipboard",
		short: 'copy',
		rank: 1,
	},
	{scope: 'hand over', keys: ['f'], does: 'name file', words: 'write it to a file', short: 'file', rank: 1},
	{
		scope: 'hand over',
		keys: ['n'],
		does: 'write notes',
		words: 'notes for the plan, kept with the track',
		short: 'notes',
		rank: 1,
	},
	{
		scope: 'hand over',
		keys: ['b'],
		does: 'name directory',
		words: 'write all that is kept to a directory, one file each',
		short: 'all that is kept',
		rank: 3,
	},
	{scope: 'hand over', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back', rank: 2},

	{scope: 'entry', keys: ['enter'], does: 'accept entry', words: 'take it', short: 'take it'},
	{scope: 'entry', keys: ['escape'], does: 'uncover', words: 'leave it as it was', short: 'as it was'},

	{scope: 'overwriting', keys: ['y'], does: 'write over', words: 'write over it', short: 'write over it'},
	{
		scope: 'overwriting',
		keys: ['escape', 'n'],
		does: 'other name',
		words: 'it stays; type another name',
		short: 'another name',
	},

	{scope: 'take in', keys: ['enter'], does: 'read file', words: 'read the file of that name', short: 'read the file'},
	{scope: 'take in', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back'},

	{
		scope: 'incoming',
		keys: ['enter'],
		does: 'take over',
		words: "take over the plan's track, with its pair, set and notes",
		short: 'take it over',
		rank: 1,
	},
	{scope: 'incoming', keys: ['pageup', 'up', 'k'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'incoming', keys: ['pagedown', 'space', 'down', 'j'], does: 'scroll down', words: 'scroll down'},
	{scope: 'incoming', keys: ['escape'], does: 'read another', words: 'read another one', short: 'another', rank: 1},
] as const satisfies readonly AnyBinding[];
