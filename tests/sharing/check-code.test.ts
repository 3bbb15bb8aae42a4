import {expect, test} from 'vitest';
import {checkCode, entryCheck} from '../../source/sharing/check-code.ts';

test('the check code of 123456789 is cbf43926', () => {
	// published (catalogue of parametrised CRC algorithms, CRC-32/ISO-HDLC: check value)
	expect(checkCode('123456789')).toBe('cbf43926');
	expect(checkCode('')).toBe('00000000');
});

test('an entry check is three letters and changes with any one letter', () => {
	expect(entryCheck('Wind: speed 8 mph')).toMatch(/^[0-9a-hjkmnp-tv-z]{3}$/);
	expect(entryCheck('Wind: speed 8 mph')).not.toBe(entryCheck('Wind: speed 9 mph'));
});
