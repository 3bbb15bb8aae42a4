import {expect, test} from 'vitest';
import {wantsColor} from '../../source/commands/surroundings.ts';

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
