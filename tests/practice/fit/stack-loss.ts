/** The stack loss data of K. A. Brownlee, Statistical Theory and Methodology in Science and Engineering, 1965. */
const air = [80, 80, 75, 62, 62, 62, 62, 62, 58, 58, 58, 58, 58, 58, 50, 50, 50, 50, 50, 56, 70];
const water = [27, 27, 25, 24, 22, 23, 24, 24, 23, 18, 18, 17, 18, 19, 18, 18, 19, 19, 20, 20, 20];
const acid = [89, 88, 90, 87, 87, 87, 93, 93, 87, 80, 89, 88, 82, 93, 89, 86, 72, 79, 80, 82, 91];
const loss = [42, 37, 37, 28, 18, 18, 19, 20, 15, 14, 14, 13, 11, 12, 8, 7, 8, 8, 9, 15, 15];

export const stackLoss = {
	columns: [air.map(() => 1), air, water, acid].map(column => Float64Array.from(column)),
	y: Float64Array.from(loss),
	/**
	 * Huber's fit. From memory: documentation of statsmodels (RLM, HuberT), rounded; R's rlm of MASS prints the same to four
	 * digits.
	 */
	coefficients: [-41.0265, 0.82938, 0.92607, -0.12785],
	standardErrors: [9.7919, 0.111, 0.30293, 0.12865],
} as const;
