/** The checks of a row: verdict, number, bound, margin, where. */
import {checkNames} from '../planning/check-names.ts';
import type {Check, CheckName} from '../planning/results.ts';
import {type Block, cell, type Making, tableOf, text} from './blocks.ts';
import {verdictCell} from './heading-view.ts';
import {absent, fixed, rpm, rpmDown, rpmUp, type Units} from './units.ts';

type Words = {
	/** What the numbers count, where it is not RPM. */
	unit?: (units: Units) => string;
	/** Rounded so that a bound that is not kept never looks kept. */
	value: (value: number | null, units: Units) => string;
	bound?: (value: number | null) => string;
	margin: (value: number | null, units: Units) => string;
};

const ofRpm = (value: Words['value'], bound = rpm): Words => ({value, bound, margin: rpmDown});
const ofNumber = (unit: string, digits = 0): Words => {
	const number = (value: number | null) => (value === null ? absent : fixed(value, digits));
	return {...(unit && {unit: () => unit}), value: number, margin: number};
};
const ofLength = (quantity: 'distance' | 'longDistance'): Words => {
	const number = (value: number | null, units: Units) => units.number(quantity, value);
	return {unit: units => units.label(quantity), value: number, margin: number};
};

const words: Record<CheckName, Words> = {
	limit: ofRpm(rpmUp),
	limiter: ofLength('distance'),
	band: ofRpm(rpmDown),
	afterShift: ofRpm(rpmDown),
	settle: ofNumber('s', 3),
	pitRoad: ofRpm(rpmDown),
	restart: ofRpm(rpmDown),
	downshift: ofRpm(rpmUp, rpmDown),
	permitted: ofNumber(''),
	housing: ofNumber('teeth'),
	stock: ofNumber('sets'),
	mileage: ofLength('longDistance'),
};

/** Whether a check compares RPM. */
export const countsRpm = (name: CheckName): boolean => words[name].margin === rpmDown;

const labelled = (name: CheckName, units: Units): string => {
	const {unit} = words[name];
	return unit ? `${checkNames[name]}, ${unit(units)}` : checkNames[name];
};

const columnsFor = (units: Units): Making<Check>[] => {
	const number = (check: Check, value: number | null) => words[check.check].value(value, units);
	const bound = (check: Check) => words[check.check].bound?.(check.bound) ?? number(check, check.bound);
	const margin = (check: Check) => words[check.check].margin(check.margin, units);
	return [
		{head: 'check', align: 'left', keep: 0, cell: check => cell(labelled(check.check, units))},
		{head: 'verdict', align: 'left', keep: 0, cell: check => verdictCell(check.verdict)},
		{head: 'value', align: 'right', keep: 1, cell: check => cell(number(check, check.value))},
		{head: 'bound', align: 'right', keep: 2, cell: check => cell(bound(check))},
		{head: 'margin', align: 'right', keep: 1, cell: check => cell(margin(check))},
		{head: 'at', align: 'left', keep: 3, shortest: 12, cell: check => cell(check.at)},
		{head: 'situation', align: 'left', keep: 4, shortest: 9, cell: check => cell(check.situation, 'muted')},
	];
};

/** The table of checks, and below it what they remark. */
export const checkView = (checks: readonly Check[], units: Units): Block[] => [
	tableOf(columnsFor(units), checks),
	...checks.flatMap(check => (check.remark ? [text(`- ${checkNames[check.check]}: ${check.remark}`, 'plain', 2)] : [])),
];
