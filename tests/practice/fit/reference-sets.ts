/**
 * Reference sets of NIST, Statistical Reference Datasets, linear regression. Data and certified values from memory; that
 * they agree with each other to so many digits shows that both were remembered well.
 */

export type ReferenceSet = {
	readonly columns: readonly Float64Array[];
	readonly y: Float64Array;
	readonly coefficients: readonly number[];
	readonly standardErrors: readonly number[];
	readonly residualSd: number;
};

const numbers = (text: string) => Float64Array.from(text.trim().split(/\s+/), Number);
const ones = (count: number) => new Float64Array(count).fill(1);

/** A line through 36 points. */
export const norris: ReferenceSet = {
	columns: [
		ones(36),
		numbers(`
			0.2 337.4 118.2 884.6 10.1 226.5 666.3 996.3 448.6 777 558.2 0.4 0.6 775.5 666.9 338 447.5 11.6
			556 228.1 995.8 887.6 120.2 0.3 0.3 556.8 339.1 887.2 999 779 11.1 118.3 229.2 669.1 448.9 0.5
		`),
	],
	y: numbers(`
		0.1 338.8 118.1 888 9.2 228.1 668.5 998.5 449.1 778.9 559.2 0.3 0.1 778.1 668.8 339.3 448.9 10.8
		557.7 228.3 998 888.8 119.6 0.3 0.6 557.6 339.3 888 998.5 778.9 10.2 117.6 228.9 668.4 449.2 0.2
	`),
	coefficients: [-0.262323073774029, 1.00211681802045],
	standardErrors: [0.232818234301152, 0.429796848199937e-3],
	residualSd: 0.884796396144373,
};

const longleyRows = [
	[60323, 83, 234289, 2356, 1590, 107608, 1947],
	[61122, 88.5, 259426, 2325, 1456, 108632, 1948],
	[60171, 88.2, 258054, 3682, 1616, 109773, 1949],
	[61187, 89.5, 284599, 3351, 1650, 110929, 1950],
	[63221, 96.2, 328975, 2099, 3099, 112075, 1951],
	[63639, 98.1, 346999, 1932, 3594, 113270, 1952],
	[64989, 99, 365385, 1870, 3547, 115094, 1953],
	[63761, 100, 363112, 3578, 3350, 116219, 1954],
	[66019, 101.2, 397469, 2904, 3048, 117388, 1955],
	[67857, 104.6, 419180, 2822, 2857, 118734, 1956],
	[68169, 108.4, 442769, 2936, 2798, 120445, 1957],
	[66513, 110.8, 444546, 4681, 2637, 121950, 1958],
	[68655, 112.6, 482704, 3813, 2552, 123366, 1959],
	[69564, 114.2, 502601, 3931, 2514, 125368, 1960],
	[69331, 115.7, 518173, 4806, 2572, 127852, 1961],
	[70551, 116.9, 554894, 4007, 2827, 130081, 1962],
];
const longleyColumn = (j: number) => Float64Array.from(longleyRows, row => row[j]!);

/** Seven nearly dependent columns. */
export const longley: ReferenceSet = {
	columns: [ones(16), ...[1, 2, 3, 4, 5, 6].map(longleyColumn)],
	y: longleyColumn(0),
	coefficients: [
		-3482258.63459582, 15.0618722713733, -0.35819179292591e-1, -2.02022980381683, -1.03322686717359,
		-0.511041056535807e-1, 1829.15146461355,
	],
	standardErrors: [
		890420.383607373, 84.9149257747669, 0.334910077722432e-1, 0.488399681651699, 0.214274163161675, 0.22607320006937,
		455.478499142212,
	],
	residualSd: 304.854073561965,
};
