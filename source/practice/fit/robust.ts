/** Medians and what belongs to them: the statistics that a few wild readings do not move. */

/** The standard deviation of a normal distribution ÷ its median distance from the middle: 1/Φ⁻¹(3/4). */
export const sdPerMedianDistance = 1 / 0.6744897501960817;

/** The median; NaN of nothing. The values stay as they are. */
export function median(values: ArrayLike<number>): number {
	return quantile(sorted(values), 0.5);
}

/** The value below which a share of sorted values lies, linear between neighbors; NaN of nothing. */
export function quantile(rising: ArrayLike<number>, share: number): number {
	if (rising.length === 0) return Number.NaN;
	const at = share * (rising.length - 1);
	const below = Math.floor(at);
	const low = rising[below]!;
	return low + (at - below) * ((rising[below + 1] ?? low) - low);
}

/** The mean of sorted values without that share, rounded up, at each end; with fewer than four of all of them. NaN of nothing. */
export function trimmedMean(rising: ArrayLike<number>, share: number): number {
	const off = rising.length < 4 ? 0 : Math.ceil(share * rising.length);
	let sum = 0;
	for (let i = off; i < rising.length - off; i++) sum += rising[i]!;
	return sum / (rising.length - 2 * off);
}

/** A rising copy. NaN goes to the end. */
export function sorted(values: ArrayLike<number>): Float64Array {
	return Float64Array.from(values).sort();
}

/** Robust standard deviation about a middle: the median distance from it, scaled to a normal distribution (Hampel, 1974). */
export function robustSd(values: ArrayLike<number>, middle = median(values)): number {
	return sdPerMedianDistance * median(Float64Array.from(values, value => Math.abs(value - middle)));
}

/**
 * The line through (x, y) by the median of the slopes of all pairs and the median of what is left (Theil, 1950; Sen, 1968).
 * Up to 29 % of the points may be wild. Level through the median where fewer than two x differ; at least one point.
 */
export function medianLine(x: ArrayLike<number>, y: ArrayLike<number>): {slope: number; at: (x: number) => number} {
	const slopes: number[] = [];
	for (let i = 0; i < x.length; i++) {
		for (let j = i + 1; j < x.length; j++) {
			if (x[j] !== x[i]) slopes.push((y[j]! - y[i]!) / (x[j]! - x[i]!));
		}
	}
	const slope = slopes.length === 0 ? 0 : median(slopes);
	const level = median(Float64Array.from(x, (xi, i) => y[i]! - slope * xi));
	return {slope, at: at => level + slope * at};
}
