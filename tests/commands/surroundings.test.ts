import {expect, test} from 'vitest';
import {canDraw, wantsColor} from '../../source/commands/surroundings.ts';

test('color goes to a terminal and not through a pipe', () => {
	expect(wantsColor({}, true)).toBe(true);
	expect(wantsColor({}, false)).toBe(false);
	expect(wantsColor({TERM: 'dumb'}, true)).toBe(false);
});

test('NO_COLOR takes color away, FORCE_COLOR gives it, and the first decides', () => {
	expect(wantsColor({NO_COLOR: '1'}, true)).toBe(false);
	expect(wantsColor({NO_COLOR: ''}, true)).toBe(true);
	expect(wantsColor({FORCE_COLOR: '1'}, false)).toBe(true);
	expect(wantsColor({FORCE_COLOR: '0'}, true)).toBe(false);
	expect(wantsColor({NO_COLOR: '1', FORCE_COLOR: '1'}, true)).toBe(false);
});

test('a screen is drawn on a terminal that moves its cursor', () => {
	expect(canDraw({TERM: 'xterm'}, true)).toBe(true);
	expect(canDraw({}, true)).toBe(true);
	expect(canDraw({TERM: 'dumb'}, true)).toBe(false);
	expect(canDraw({TERM: 'xterm'}, false)).toBe(false);
});
