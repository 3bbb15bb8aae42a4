import {expect, test} from 'vitest';
import {normalQuantile} from '../../../source/odds/draws/normal-quantile.ts';

test.each([
	// Published: the checks at the end of the algorithm's article (M. J. Wichura, Appl. Stat. 37, 1988), one in each range.
	[0.25, -0.6744897501960817],
	[0.001, -3.090232306167813],
	[1e-20, -9.262340089798409],
	// Published: the usual 97.5 % point.
	[0.975, 1.959963984540054],
	// Recomputed: scipy.stats.norm.ppf, SciPy 1.17.1.
	[0.6, 0.2533471031357997],
])('the quantile of %d is %d', (p, expected) => {
	expect(Math.abs(normalQuantile(p) / expected - 1)).toBeLessThan(1e-14);
});

test('it is odd about a half and rises', () => {
	expect(normalQuantile(0.5)).toBe(0);
	const values = Array.from({length: 999}, (_, i) => normalQuantile((i + 1) / 1000));
	values.forEach((value, i) => {
		expect(value).toBeCloseTo(-values[998 - i]!, 12);
		if (i > 0) expect(value).toBeGreaterThan(values[i - 1]!);
	});
});
