/** Arithmetic in a field against that of mathjs. */
import {evaluate} from 'mathjs';
import {quantityOf} from '../../../source/documents/quantity.ts';
import type {Answer, Reader} from '../reader.ts';

/** A line end would end the expression there. */
const toMathjs = (text: string): string =>
	text.replaceAll('×', '*').replaceAll('÷', '/').replaceAll('−', '-').replace(/\s+/g, ' ').trim();

function read(text: string): Answer {
	const reading = quantityOf(text, 'number');
	if (!reading.ok) {
		const {found, allowed} = reading;
		return {accepted: false, said: `${found}${allowed}`, problems: [{path: 'field', found, allowed}]};
	}
	const expected = Number(evaluate(toMathjs(text)));
	const {value} = reading;
	const isSame = value === expected || Math.abs(value - expected) <= 1e-12 * Math.abs(expected);
	return {accepted: true, broken: isSame ? undefined : `it is what mathjs makes of it: ${value}, not ${expected}`};
}

export const expressions: Reader = {
	name: 'expressions',
	examples: () => ['1', '-2.5', '86+1/2', '2*(3+4)', '1-2-3', '12/3/2', '-(1+2)*-3', '1e3+.5', '2×3÷4−1', '((7))'],
	words: ['+', '-', '*', '/', '×', '÷', '−', '(', ')', '()', '--', '(-', '1', '2.', '.5', '1e5', '1e-5', ' '],
	longest: 260,
	read,
};
