/** Check codes of shared text. */
import {crc32} from 'node:zlib';

/** CRC-32 (ISO-HDLC, as in zlib) of the UTF-8 bytes as eight hexadecimal digits. A change within 32 bits never goes unseen. */
export function checkCode(text: string): string {
	return crc32(text).toString(16).padStart(8, '0');
}

/** Digits and letters that are not taken for one another (Crockford's base 32). */
const digits = '0123456789abcdefghjkmnpqrstvwxyz';
const bitsPerDigit = 5;
const entryDigits = 3;

/** Three letters for one entry: enough to name the line that was damaged; the whole text has its own code. */
export function entryCheck(text: string): string {
	const code = crc32(text);
	const digit = (i: number) => digits[(code >>> (bitsPerDigit * i)) & (2 ** bitsPerDigit - 1)]!;
	return Array.from({length: entryDigits}, (_, i) => digit(i)).join('');
}
