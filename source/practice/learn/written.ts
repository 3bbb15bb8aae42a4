/** A learned number as it is written into a document: in the unit that stood there, with as many digits as are known. */
import {type Dimension, quantityOf} from '../../documents/quantity.ts';
import {findUnit} from '../../documents/units.ts';
import type {Known} from './reading.ts';

export type Readers = 'us' | 'metric';

/** The unit where none stood. */
const unitNames: Record<Readers, Partial<Record<Dimension, string>>> = {
	us: {length: 'in', speed: 'mph', area: 'm^2', share: '%'},
	metric: {length: 'mm', speed: 'km/h', area: 'm^2', share: '%'},
};

/** A rounding by more than this, as a fraction, would show: 1 rpm of 9000 for a rollout; of a growth of 1 % little hangs on it. */
const finest: Partial<Record<Dimension, number>> = {length: 1e-4, share: 1e-2};
const fineEnough = 1e-3;

/** "86.42 in ± 0.06 in", in the unit of the text that stood there or of `like`. */
export function writtenQuantity(
	{value, se}: Known,
	dimension: Dimension,
	like: string | number | undefined,
	readers: Readers,
): string {
	const former = typeof like === 'string' ? quantityOf(like, dimension) : undefined;
	const unit =
		(former?.ok ? former.unit : undefined) ?? findUnit(unitNames[readers][dimension] ?? '', dimension) ?? undefined;
	if (unit === undefined) throw new Error(`no unit for a ${dimension}`);
	const [number, spread] = numberTexts(
		{value: value / unit.factor, se: se / unit.factor},
		finest[dimension] ?? fineEnough,
	);
	return spread === undefined ? `${number} ${unit.name}` : `${number} ${unit.name} ± ${spread} ${unit.name}`;
}

/** "8420 ± 15"; a number alone where its uncertainty is not known. */
export function writtenNumber(value: Known): string | number {
	const [number, spread] = numberTexts(value, wholeNumbers);
	return spread === undefined ? Number(number) : `${number} ± ${spread}`;
}

/** "1.13 ± 0.02": a coefficient. */
export function writtenCoefficient(value: Known): string | number {
	const [number, spread] = numberTexts(value, fineEnough);
	return spread === undefined ? Number(number) : `${number} ± ${spread}`;
}

/** RPM is read in whole numbers. */
const wholeNumbers = 1;

/**
 * Number and uncertainty to the same place: of the uncertainty one digit, two where it starts with 1 or 2; more where the
 * number would lose more than the fraction `rounding` by it.
 */
export function numberTexts({value, se}: Known, rounding: number): readonly [string, string | undefined] {
	const byValue = Math.max(0, Math.min(maxDecimals, Math.ceil(-Math.log10(2 * rounding * Math.abs(value)))));
	if (!(se > 0) || !Number.isFinite(se)) return [String(Number(value.toFixed(byValue))), undefined];
	const power = Math.floor(Math.log10(se));
	const first = Math.floor(se / 10 ** power);
	const bySpread = (first <= 2 ? 1 : 0) - power;
	const decimals = Math.min(maxDecimals, Math.max(bySpread, byValue));
	return [value.toFixed(decimals), se.toFixed(decimals)];
}
/** A standard error far below what any document writes is not worth its digits. */
const maxDecimals = 5;
