/** The tracks ahead: what to load for them, which gears to build for them. */

import type {AnyBinding} from './binding.ts';

export const aheadKeys = [
	{scope: 'load', keys: ['up', 'k'], does: 'ahead up', words: 'the track above', short: 'track', rank: 1},
	{scope: 'load', keys: ['down', 'j'], does: 'ahead down', words: 'the track below'},
	{
		scope: 'load',
		keys: ['space', 'enter'],
		does: 'toggle ahead',
		words: 'this track lies ahead, or no longer',
		short: 'ahead or not',
		rank: 1,
	},
	{
		scope: 'load',
		keys: ['right', '+'],
		does: 'more shorter',
		words: 'one step shorter more, after five none',
		short: 'steps shorter',
		rank: 2,
	},
	{
		scope: 'load',
		keys: ['left', '-'],
		does: 'more taller',
		words: 'one step taller more, after five none',
		short: 'steps taller',
		rank: 2,
	},
	{
		scope: 'load',
		keys: ['b'],
		does: 'each set',
		words: 'every gearbox set needs its pairs, or only the best set',
		short: 'each set',
		rank: 3,
	},
	{scope: 'load', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 3},
	{scope: 'load', keys: ['pagedown'], does: 'scroll down', words: 'scroll down'},

	{scope: 'gears', keys: ['up', 'k'], does: 'ahead up', words: 'the track above', short: 'track', rank: 1},
	{scope: 'gears', keys: ['down', 'j'], does: 'ahead down', words: 'the track below'},
	{
		scope: 'gears',
		keys: ['space', 'enter'],
		does: 'toggle ahead',
		words: 'this track lies ahead, or no longer',
		short: 'ahead or not',
		rank: 1,
	},
	{
		scope: 'gears',
		keys: ['b'],
		does: 'one set for all',
		words: 'one set for all tracks, or each by itself',
		short: 'one set for all',
		rank: 2,
	},
	{scope: 'gears', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 3},
	{scope: 'gears', keys: ['pagedown'], does: 'scroll down', words: 'scroll down'},
] as const satisfies readonly AnyBinding[];
