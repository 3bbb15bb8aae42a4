/** Round numbers along an axis. */

const steps = [1, 2, 2.5, 5, 10];
/** Enough to tell neighboring ticks apart, and without the noise of the multiplication. */
const digits = 12;
const rounding = 1e-9;

/** Multiples of 1, 2, 2.5 or 5 times a power of ten between two numbers, about so many; rising. */
export function niceTicks(from: number, to: number, about: number): number[] {
	if (!(to > from) || !Number.isFinite(to - from)) return Number.isFinite(from) ? [from] : [];
	const rough = (to - from) / Math.max(1, about);
	const power = 10 ** Math.floor(Math.log10(rough));
	const step = (steps.find(step => step * power >= rough) ?? 10) * power;
	const first = Math.ceil(from / step - rounding);
	const last = Math.floor(to / step + rounding);
	// Numbers so near each other, or so near 0, that they have no round ones between them.
	if (!Number.isSafeInteger(first) || !Number.isSafeInteger(last)) return [from];
	return Array.from({length: last - first + 1}, (_, i) => Number(((first + i) * step).toPrecision(digits)));
}

/** All ticks with the digits that the finest of them needs. */
export function tickLabels(ticks: readonly number[]): string[] {
	const decimals = Math.max(0, ...ticks.map(tick => (String(tick).split('.')[1] ?? '').length));
	return ticks.map(tick => (Object.is(tick, -0) ? 0 : tick).toFixed(Math.min(decimals, 6)));
}
