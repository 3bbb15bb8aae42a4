import {expect, test} from 'vitest';
import {longLengthText} from '../../source/planning/words.ts';

test.each([
	[1200 * 1609.344, '1200 miles (1931 km)'],
	[1500, '0.9 miles (1.5 km)'],
	[15_000, '9.3 miles (15 km)'],
])('%d m is %s', (lengthM, text) => {
	expect(longLengthText(lengthM)).toBe(text);
});
