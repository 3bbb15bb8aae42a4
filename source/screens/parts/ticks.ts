/** Round numbers along an axis. */

const steps = [1, 2, 2.5, 5, 10];
/** Enough to tell neighboring ticks apart, and without the noise of the multiplication. */
const digits = 12;

/** Multiples of 1, 2, 2.5 or 5 times a power of ten between two numbers, about so many; rising. */
export function niceTicks(from: number, to: number, about: number): number[] {
	if (!(to > from) || !Number.isFinite(to - from)) return Number.isFinite(from) ? [from] : [];
	const rough = (to - from) / Math.max(1, about);
	const power = 10 ** Math.floor(Math.log10(rough));
	const step = (steps.find(step => step * power >= rough) ?? 10) * power;
	const ticks: number[] = [];
	for (let i = Math.ceil(from / step - 1e-9); i * step <= to + step * 1e-9; i++) {
		ticks.push(Number((i * step).toPrecision(digits)));
	}
	return ticks;
}

/** All ticks with the digits that the finest of them needs. */
export function tickLabels(ticks: readonly number[]): string[] {
	const decimals = Math.max(0, ...ticks.map(tick => (String(tick).split('.')[1] ?? '').length));
	return ticks.map(tick => (Object.is(tick, -0) ? 0 : tick).toFixed(Math.min(decimals, 6)));
}
