import {expect, test} from 'vitest';
import {askedColumns, columnOption} from '../../source/logs/column-option.ts';

test('values of --column are channels with their headers', () => {
	expect(askedColumns(['speed=GPS Speed [mph]', ' RPM = #3', 'brake=none', 'time=a=b'])).toEqual({
		speed: 'GPS Speed [mph]',
		rpm: '#3',
		brake: 'none',
		time: 'a=b',
	});
});

test('others are refused with what is allowed', () => {
	expect(askedColumns(['GPS Speed'])).toBe('--column is CHANNEL=HEADER, such as speed="GPS Speed", found GPS Speed.');
	expect(askedColumns(['speed='])).toBe('--column is CHANNEL=HEADER, such as speed="GPS Speed", found speed=.');
	expect(askedColumns(['sped=x'])).toBe(
		'--column knows no channel sped. Did you mean "speed"? Channels: time, distance, speed, rpm, throttle, gear, lap, brake, steering.',
	);
	expect(askedColumns(['__proto__=x'])).toContain('--column knows no channel __proto__.');
});

test('the option in a message is one that a shell hands over as it is', () => {
	expect(columnOption('speed', 'GPS Speed')).toBe('--column speed="GPS Speed"');
	expect(columnOption('rpm', 'RPM')).toBe('--column rpm=RPM');
	expect(columnOption('rpm', '$(x) "a"')).toBe(`--column rpm='$(x) "a"'`);
	expect(columnOption('rpm', `it's "a"`)).toBe(`--column rpm='it'\\''s "a"'`);
});
