/** The checks of a row: verdict, number, bound, margin, where. */
import type {Check, CheckName} from '../../planning/results.ts';
import {type Block, cell, type Making, tableOf, text} from './blocks.ts';
import {verdictCell} from './heading-view.ts';
import {absent, fixed, rpm, rpmDown, rpmUp, seconds, type Units} from './units.ts';

type Words = {
	label: string;
	/** What the number counts; rounded so that a bound that is not kept never looks kept. */
	unit: (units: Units) => string;
	value: (value: number | null, units: Units) => string;
	margin: (value: number | null, units: Units) => string;
};

const ofRpm = (label: string, value: (value: number | null) => string): Words => ({
	label,
	unit: () => 'rpm',
	value,
	margin: rpmDown,
});
const ofCount = (label: string, unit: string): Words => {
	const count = (value: number | null) => (value === null ? absent : fixed(value, 0));
	return {label, unit: () => unit, value: count, margin: count};
};
const ofLength = (label: string, quantity: 'distance' | 'longDistance'): Words => {
	const number = (value: number | null, units: Units) => units.number(quantity, value);
	return {label, unit: units => units.label(quantity), value: number, margin: number};
};

const words: Record<CheckName, Words> = {
	limit: ofRpm('RPM limit', rpmUp),
	limiter: ofLength('on the limiter', 'distance'),
	band: ofRpm('power band', rpmDown),
	afterShift: ofRpm('after a shift', rpmDown),
	settle: {label: 'shift settled', unit: () => 's', value: seconds, margin: seconds},
	pitRoad: ofRpm('pit road', rpmDown),
	restart: ofRpm('restart', rpmDown),
	downshift: ofRpm('downshift', rpmUp),
	permitted: ofCount('permitted', ''),
	housing: ofCount('fits the housing', 'teeth'),
	stock: ofCount('sets on hand', 'sets'),
	mileage: ofLength('mileage', 'longDistance'),
};

const columnsFor = (units: Units): Making<Check>[] => {
	const of = (check: Check) => words[check.check];
	const number = (check: Check, value: number | null) => of(check).value(value, units);
	return [
		{head: 'check', align: 'left', keep: 0, cell: check => cell(of(check).label)},
		{head: 'verdict', align: 'left', keep: 0, cell: check => verdictCell(check.verdict)},
		{head: 'value', align: 'right', keep: 1, cell: check => cell(number(check, check.value))},
		{
			head: 'bound',
			align: 'right',
			keep: 2,
			cell: check => cell(check.bound === null ? absent : boundText(check, units)),
		},
		{head: 'margin', align: 'right', keep: 1, cell: check => cell(of(check).margin(check.margin, units))},
		{
			head: 'unit',
			align: 'left',
			keep: 3,
			cell: check => cell(check.value === null ? '' : of(check).unit(units), 'muted'),
		},
		{head: 'at', align: 'left', keep: 4, shortest: 10, cell: check => cell(check.at)},
		{head: 'situation', align: 'left', keep: 5, shortest: 8, cell: check => cell(check.situation, 'muted')},
	];
};

/** A bound is a given number or one to be kept below: never rounded up. */
const boundText = (check: Check, units: Units): string => {
	const {unit, value} = words[check.check];
	return unit(units) === 'rpm'
		? check.check === 'downshift'
			? rpmDown(check.bound)
			: rpm(check.bound)
		: value(check.bound, units);
};

/** The table of checks, and below it what they remark. */
export const checkView = (checks: readonly Check[], units: Units): Block[] => [
	tableOf(columnsFor(units), checks),
	...checks.flatMap(check =>
		check.remark ? [text(`- ${words[check.check].label}: ${check.remark}`, 'plain', 2)] : [],
	),
];
