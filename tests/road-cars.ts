/**
 * Published: Consumer Reports, April 1990, as R's rpart::car90. Tire, overall ratio in high gear, engine rpm at 60 mph; the
 * ratio is rounded to 0.01 and the rpm to 5.
 */
export const roadCars: readonly [size: string, overall: number, rpm: number][] = [
	['185/70R14', 2.51, 2160],
	['185/70R14', 2.55, 2195],
	['185/70R14', 2.78, 2390],
	['185/70R14', 2.94, 2530],
	['185/70R14', 3.04, 2615],
	['185/70R14', 3.27, 2810],
	['185/70R14', 2.71, 2330],
	['175/70R13', 3.13, 2855],
	['175/70R13', 3.27, 2980],
	['175/70R13', 2.75, 2510],
	['205/60R15', 2.95, 2505],
	['205/60R15', 3.27, 2775],
	['205/60R15', 2.51, 2130],
	['205/60R15', 2.86, 2430],
	['185/60R14', 3.5, 3225],
	['185/60R14', 3.26, 3000],
	['195/60R14', 3.26, 2935],
	['195/60R14', 3.47, 3125],
	['185/65R15', 3.27, 2780],
	['185/65R15', 2.71, 2305],
];

/** Turns a mile by tire size, from the same source: the median of the cars on that size, 1 to 11 of them. */
export const turnsPerMile: Readonly<Record<string, number>> = {
	'185/70R14': 860.5,
	'175/70R13': 911.6,
	'205/60R15': 848.9,
	'185/60R14': 920.9,
	'195/60R14': 900.3,
	'175/70R14': 872.3,
	'155/80R13': 905.4,
	'185/65R15': 850.2,
	'195/65R15': 838.1,
	'275/40R17': 799.4,
};
