/** The session itself: its help, its end, taking it up again. */

import type {AnyBinding} from './binding.ts';

export const sessionKeys = [
	{scope: 'help', keys: ['up', 'pageup', 'k'], does: 'scroll up', words: 'scroll up', short: 'scroll'},
	{scope: 'help', keys: ['down', 'pagedown', 'space', 'j'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'help',
		keys: ['escape', '?', 'q', 'enter', 'f1'],
		does: 'uncover',
		words: 'back to where you were',
		short: 'back',
	},

	{scope: 'quitting', keys: ['s'], does: 'save and leave', words: 'save, then leave', short: 'save, then leave'},
	{
		scope: 'quitting',
		keys: ['l'],
		does: 'leave',
		words: 'leave; the session is offered again at the next start',
		short: 'leave, keep for next time',
	},
	{scope: 'quitting', keys: ['d'], does: 'discard and leave', words: 'leave and forget the changes', short: 'discard'},
	{scope: 'quitting', keys: ['escape', 'n', 'q'], does: 'uncover', words: 'stay', short: 'stay'},

	{scope: 'recovery', keys: ['enter', 'y'], does: 'recover', words: 'take it up where it ended', short: 'take it up'},
	{scope: 'recovery', keys: ['d'], does: 'forget recovery', words: 'forget it', short: 'forget it'},
	{scope: 'recovery', keys: ['escape', 'n'], does: 'uncover', words: 'not now; it is offered again', short: 'not now'},
] as const satisfies readonly AnyBinding[];
