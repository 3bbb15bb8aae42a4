/** T. Ishigami and T. Homma, 1990: sin x1 + a·sin² x2 + b·x3⁴·sin x1 on [−π, π]³ with a = 7, b = 0.1; by u in [0, 1]³. */
export function ishigami(point: readonly number[]): number {
	const [x1, x2, x3] = point.map(u => Math.PI * (2 * u - 1)) as [number, number, number];
	return Math.sin(x1) + 7 * Math.sin(x2) ** 2 + 0.1 * x3 ** 4 * Math.sin(x1);
}
