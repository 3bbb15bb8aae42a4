import {expect, test} from 'vitest';
import {quantityOf} from '../../../source/documents/quantity.ts';
import {known} from '../../../source/practice/learn/reading.ts';
import {numberTexts, writtenNumber, writtenQuantity} from '../../../source/practice/learn/written.ts';

const inch = 0.0254;

test.each([
	[86.4237, 0.0612, 1e-4, '86.42', '0.06'],
	[86.4237, 0.0152, 1e-4, '86.424', '0.015'],
	// One digit of the uncertainty would move 9000 rpm by five.
	[86.1781, 0.52, 1e-4, '86.18', '0.52'],
	[0.89849, 0.0141, 1e-3, '0.898', '0.014'],
	[8420.3, 14.6, 1, '8420', '15'],
])('%d ± %d is written to the place that is known', (value, se, rounding, number, spread) => {
	expect(numberTexts(known(value, se), rounding)).toEqual([number, spread]);
});

test('without an uncertainty there is none', () => {
	expect(numberTexts(known(86.4, 0), 1e-4)).toEqual(['86.4', undefined]);
	expect(numberTexts(known(86.4, Number.POSITIVE_INFINITY), 1e-4)).toEqual(['86.4', undefined]);
	expect(writtenNumber(known(8420, 0))).toBe(8420);
});

test('the unit is the one that stood there', () => {
	const rollout = known(86.42 * inch, 0.06 * inch);
	expect(writtenQuantity(rollout, 'length', '86.4 in', 'metric')).toBe('86.42 in ± 0.06 in');
	expect(writtenQuantity(rollout, 'length', '219.5 cm ± 1 cm', 'us')).toBe('219.51 cm ± 0.15 cm');
	expect(writtenQuantity(rollout, 'length', undefined, 'metric')).toBe('2195.1 mm ± 1.5 mm');
});

test('what is written can be read', () => {
	const text = writtenQuantity(known(0.00912, 0.00061), 'share', '0.9 %', 'us');
	expect(text).toBe('0.91 % ± 0.06 %');
	expect(quantityOf(text, 'share')).toMatchObject({ok: true, value: 0.0091, uncertainty: 0.0006});
});
