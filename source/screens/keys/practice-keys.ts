/** Learning from practice. */

import type {AnyBinding} from './binding.ts';

export const practiceKeys = [
	{
		scope: 'practice',
		keys: ['enter'],
		does: 'practice enter',
		words: 'type the RPM seen on this straight (a digit begins at once); accept this line, or take it back',
		short: 'RPM, accept',
		rank: 1,
	},
	{scope: 'practice', keys: ['up', 'k'], does: 'practice up', words: 'the line above', short: 'line', rank: 1},
	{scope: 'practice', keys: ['down', 'j'], does: 'practice down', words: 'the line below'},
	{
		scope: 'practice',
		keys: ['tab'],
		does: 'next pane',
		words: 'numbers, what would change; of a log also what it shows, its gears and a lap',
		short: 'changes',
		rank: 1,
	},
	{scope: 'practice', keys: ['shift+tab'], does: 'previous pane', words: 'the one before'},
	{scope: 'practice', keys: ['f'], does: 'name log', words: 'read a logged run', short: 'log', rank: 2},
	{
		scope: 'practice',
		keys: ['h'],
		does: 'hold other',
		words: 'where no speed was seen: take the circumference for right, or the speed of the model',
		short: 'hold',
		rank: 3,
	},
	{
		scope: 'practice',
		keys: ['g'],
		does: 'grip too',
		words: 'of a log: learn grip too, from exits that it holds; or not',
		short: 'grip',
		rank: 4,
	},
	{
		scope: 'practice',
		keys: ['a'],
		does: 'accept all',
		words: 'accept all that would change',
		short: 'accept all',
		rank: 2,
	},
	{
		scope: 'practice',
		keys: ['b'],
		does: 'take all back',
		words: 'take back all that was learned',
		short: 'take back',
		rank: 4,
	},
	{
		scope: 'practice',
		keys: ['delete', 'backspace'],
		does: 'clear number',
		words: 'take this number away, or put the log away',
	},
	{scope: 'practice', keys: ['pageup'], does: 'scroll up', words: 'scroll up'},
	{scope: 'practice', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'practice',
		keys: ['escape'],
		does: 'leave practice',
		words: 'leave the log that is being read; else back to the ranking',
		short: 'back',
		rank: 3,
	},
] as const satisfies readonly AnyBinding[];
