/** Seeded chance for the generated logs: the same seed gives the same log everywhere. */
export type Chance = {
	/** Even between 0 and 1. */
	share(): number;
	/** Normal, mean 0, standard deviation 1. */
	normal(): number;
	between(low: number, high: number): number;
};

/** mulberry32 (T. Ettinger's small generator, public domain), and the Box-Muller transform. */
export function chance(seed: number): Chance {
	let state = (seed * 0x9e3779b1) >>> 0;
	const share = () => {
		state = (state + 0x6d2b79f5) >>> 0;
		let t = Math.imul(state ^ (state >>> 15), state | 1);
		t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
		return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
	};
	let spare: number | undefined;
	const normal = () => {
		if (spare !== undefined) {
			const kept = spare;
			spare = undefined;
			return kept;
		}
		const radius = Math.sqrt(-2 * Math.log(1 - share()));
		const angle = 2 * Math.PI * share();
		spare = radius * Math.sin(angle);
		return radius * Math.cos(angle);
	};
	return {share, normal, between: (low, high) => low + (high - low) * share()};
}
