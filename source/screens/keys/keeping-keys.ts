/** What is kept: the history of a track, and what differs from it. */

import type {AnyBinding} from './binding.ts';

export const keepingKeys = [
	{scope: 'history', keys: ['enter', 'a'], does: 'add to history', words: 'add an entry', short: 'add', rank: 1},
	{scope: 'history', keys: ['pageup', 'up', 'k'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'history', keys: ['pagedown', 'space', 'down', 'j'], does: 'scroll down', words: 'scroll down'},
	{scope: 'history', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back', rank: 2},

	{scope: 'draft', keys: ['enter'], does: 'keep entry', words: 'add it to the history', short: 'add it'},
	{scope: 'draft', keys: ['down', 'tab'], does: 'draft down', words: 'the field below', short: 'field'},
	{scope: 'draft', keys: ['up', 'shift+tab'], does: 'draft up', words: 'the field above'},
	{
		scope: 'draft',
		keys: ['escape'],
		does: 'leave draft',
		words: 'back; what was typed is there when you add again',
		short: 'back',
	},

	{
		scope: 'differences',
		keys: ['tab'],
		does: 'other document',
		words: 'of the track, or of the car',
		short: 'track or car',
		rank: 1,
	},
	{scope: 'differences', keys: ['pageup', 'up', 'k'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'differences', keys: ['pagedown', 'space', 'down', 'j'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'differences',
		keys: ['o'],
		does: 'whole to shipped',
		words: 'return to the shipped one as a whole',
		short: 'shipped one',
		rank: 1,
	},
	{
		scope: 'differences',
		keys: ['b'],
		does: 'whole to saved',
		words: 'return to the saved one as a whole',
		short: 'saved one',
		rank: 1,
	},
	{scope: 'differences', keys: ['f'], does: 'forget', words: 'forget what is saved of it', short: 'forget', rank: 2},
	{scope: 'differences', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back', rank: 2},

	{scope: 'forgetting', keys: ['y'], does: 'forget saved', words: 'forget it', short: 'forget it'},
	{scope: 'forgetting', keys: ['escape', 'n'], does: 'uncover', words: 'keep it', short: 'keep it'},
] as const satisfies readonly AnyBinding[];
