import {expect, test} from 'vitest';
import {nearest} from '../../source/documents/nearest.ts';

test.each([
	['exitt', ['exit', 'entry'], 'exit'],
	['RpmLimit', ['rpmLimit', 'pairs'], 'rpmLimit'],
	['mhp', ['mph', 'm/s'], 'mph'],
	['banana', ['exit', 'entry'], undefined],
	['x', ['m', 'g'], undefined],
	['e'.repeat(1e6), ['exit'], undefined],
])('%.20s among %j is %s', (name, known, wanted) => {
	expect(nearest(name, known)).toBe(wanted);
});
