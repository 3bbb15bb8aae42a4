/** Answers as planning gives them, written by hand for the tests of the text output; invented numbers. */

import type {
	Check,
	Ranking,
	Row,
	RpmTable,
	Setting,
	SituationResult,
	StraightResult,
} from '../../source/planning/results.ts';
import type {Heading} from '../../source/text/heading-view.ts';

export const heading: Heading = {
	car: 'Fixture Car',
	track: 'Fixture Oval',
	trackType: 'short',
	day: '2026-03-14',
	air: {temperatureC: 20, pressurePa: 98_000, humidity: 0.4, dewPointC: undefined},
};

export const setting: Setting = {
	engine: 'Open 358',
	rpmLimit: 8900,
	limitFrom: 'track',
	bandLowRpm: 6904.4,
	bandHighRpm: 8790.2,
	peakPowerW: 490_000,
	peakPowerRpm: 8210.4,
	correction: 0.9876,
	airDensityKgM3: 1.1612,
	anchored: false,
};

export const front: StraightResult = {
	name: 'Front',
	timeS: 6.3444,
	fastestS: 6.3411,
	exitSpeedMps: 39.34,
	exitRpm: 7110.3,
	exitGear: 3,
	endSpeedMps: 60.88,
	endRpm: 7716.2,
	endGear: 4,
	finalSpeedMps: 60.88,
	limiterM: 0,
	reachRpm: 7716.2,
	minimumSpeedMps: null,
	minimumRpm: null,
	shifts: [
		{
			from: 3,
			rpm: 8799.9,
			lightRpm: 8620.9,
			rpmAfter: 7201.4,
			speedMps: 56.7,
			distanceM: 163.4,
			timeS: 3.5,
			leftS: 2.6,
		},
	],
	remarks: [],
};

export const base: SituationResult = {
	name: 'Base',
	share: 1,
	timeS: 12.3456,
	fastestS: 12.3411,
	straights: [front, {...front, name: 'Back', exitRpm: 6890, shifts: [], remarks: ['the car slows on it']}],
	restart: {...front, name: 'restart', exitGear: 2, shifts: []},
};

export const checks: Check[] = [
	{check: 'limit', verdict: 'near', value: 8860.2, bound: 8900, margin: 39.8, at: 'Front end', situation: 'In the tow'},
	{check: 'settle', verdict: 'pass', value: 2.6, bound: 0.6, margin: 2, at: 'Front shift 3-4', situation: 'Base'},
	{check: 'limiter', verdict: 'pass', value: 0, bound: 0, margin: 0, at: '', situation: ''},
	{check: 'housing', verdict: 'pass', value: 71, bound: 71, margin: 0, at: '', situation: ''},
	{
		check: 'mileage',
		verdict: 'near',
		value: 1_770_278.4,
		bound: 1_931_212.8,
		margin: 160_934.4,
		at: '',
		situation: '',
		remark: 'change the pair soon',
	},
];

export const row = (change: Partial<Row> = {}): Row => ({
	pair: '33/38',
	gearbox: 'A',
	pairRatio: 38 / 33,
	overall: [10.8534, 7.6348, 5.9132, 4.6407, 3.7424],
	verdict: 'near',
	reason:
		'Fastest of the pairs that keep the limit in every situation; 40 rpm are left in the tow at the end of the front straight.',
	timeS: 12.3456,
	fastestS: 12.3411,
	gainS: 0.0123,
	installed: false,
	situations: [base],
	pitRoad: {gear: 2, rpm: 4211.8, toleranceRpm: 4737.9},
	checks,
	remarks: [],
	...change,
});

export const ranking = (rows: number): Ranking => ({
	setting,
	rows: Array.from({length: rows}, (_, index) =>
		row({
			pair: `${33 - (index % 3)}/${38 + index}`,
			installed: index === rows - 1,
			verdict: index === rows - 1 ? 'fail' : 'pass',
			gainS: index === rows - 1 ? 0 : 0.0123 - index * 0.01,
		}),
	),
	remarks: ['Headwind comes from the wind at car height.'],
});

export const table: RpmTable = {
	setting,
	pair: '33/38',
	gearbox: 'A',
	overall: [10.8534, 7.6348, 5.9132, 4.6407, 3.7424],
	points: [
		{at: 'Front exit', situation: 'Base', speedMps: 39.34, rpm: [12_700.2, 9012, 7110.3, 5600, 4500], gear: 3},
		{at: 'Front top', situation: 'In the tow', speedMps: 62, rpm: [20_000, 14_000, 11_200, 8900.4, 7100], gear: 4},
		{at: 'pit road', situation: '', speedMps: 17.88, rpm: [5700, 4211.8, 3300, 2600, 2100], gear: 2},
	],
	remarks: [],
};
