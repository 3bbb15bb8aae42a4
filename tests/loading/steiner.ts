import type {CoverProblem} from '../../source/loading/cover.ts';

/** Each demand a need of its own: a set cover turned around, a hitting set. */
export const hitting = (things: number, demands: readonly (readonly number[])[]): CoverProblem => ({
	unease: Array.from({length: things}, () => 0),
	needs: demands.map(demand => [{loss: 0, demands: [demand]}]),
});

/** The lines of the affine space of three elements a direction: a Steiner triple system of 3^d elements. */
export function triples(directions: number): number[][] {
	const count = 3 ** directions;
	const digits = (element: number) => Array.from({length: directions}, (_, k) => Math.floor(element / 3 ** k) % 3);
	const third = (a: number, b: number) => {
		const [one, other] = [digits(a), digits(b)];
		return one.reduce((sum, digit, k) => sum + ((6 - digit - other[k]!) % 3) * 3 ** k, 0);
	};
	const lines = new Set<string>();
	for (let a = 0; a < count; a++) {
		for (let b = a + 1; b < count; b++) lines.add([a, b, third(a, b)].sort((x, y) => x - y).join());
	}
	return [...lines].map(one => one.split(',').map(Number));
}
