import {expect, test} from 'vitest';
import {sidewallDiameterM} from '../../source/documents/tire-size.ts';

// ISO 4000-1: D = 25.4 · rim + 2 · width · aspect / 100, worked by hand.
test.each([
	['275/40R17', 0.6518],
	['P275/40ZR17', 0.6518],
	['205/55 R16', 0.6319],
	['315/30-18', 0.6462],
	['245/70R19.5', 0.8383],
])('%s is %d m in diameter', (size, wanted) => {
	expect(sidewallDiameterM(size)).toBeCloseTo(wanted, 12);
});

test.each(['', '275', '275/40', '275/40R', 'R17', '275/40R17 wide'])('%j is no size', size => {
	expect(sidewallDiameterM(size)).toBeUndefined();
});
