import {expect, test} from 'vitest';
import {errorOf} from './outside-check.ts';
import {outsideChecks} from './outside-checks.ts';

test.each(outsideChecks)('$what agrees with $source', ({cases, tolerance}) => {
	for (const one of cases)
		expect(errorOf(one), `${one.outside} outside, ${one.ours} here`).toBeLessThanOrEqual(tolerance);
});

test('every check names its source, and no two are the same', () => {
	for (const check of outsideChecks) expect(check.source).not.toBe('');
	const names = outsideChecks.map(check => `${check.what} ${check.source}`);
	expect(new Set(names).size).toBe(names.length);
});
