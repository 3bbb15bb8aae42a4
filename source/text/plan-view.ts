/** A plan that was read: what it says, which numbers agree, and what differs from the reader's own documents. */
import type {Agreement} from '../sharing/agreement.ts';
import type {Difference} from '../sharing/compare.ts';
import type {Own, Recomputed} from '../sharing/hold-against.ts';
import type {PlanDocument} from '../sharing/plan-document.ts';
import type {ShortPlan} from '../sharing/short-form.ts';
import {type Block, cell, gap, type Making, tableOf, text} from './blocks.ts';
import {caution} from './heading-view.ts';
import {absent} from './units.ts';

/** `end` says what became of it. */
export const planView = (plan: PlanDocument, {compared, failure}: Recomputed, own: Own, end: string): Block[] => [
	text(`${plan.car.name} · engine ${plan.engine} · plan of ${plan.date}`, 'strong', 2),
	text(`${plan.track.name} · pair ${plan.pair} · gearbox ${plan.gearbox}`, 'plain', 2),
	...(plan.notes ? [text(`Notes: ${plan.notes}`, 'plain', 2)] : []),
	gap,
	text(agreementWords(compared), compared.every(({agrees}) => agrees) ? 'pass' : 'fail'),
	tableOf(numberColumns, compared, 2),
	...(failure === undefined ? [] : [text(`The plan FAILS a check. ${failure}`, 'fail', 2)]),
	gap,
	...ownView('track', String(plan.track.name), own.track),
	...ownView('car', String(plan.car.name), own.car),
	gap,
	text(end),
	text(caution, 'muted'),
];

const agreementWords = (compared: readonly Agreement[]): string => {
	const differing = compared.filter(({agrees}) => !agrees).length;
	if (differing === 0) return `Computed again: all ${compared.length} numbers agree.`;
	return `Computed again: ${differing} of ${compared.length} numbers DIFFER.`;
};

const numberColumns: readonly Making<Agreement>[] = [
	{head: '', align: 'left', keep: 0, shortest: 12, cell: ({what}) => cell(what)},
	{head: 'stated', align: 'right', keep: 0, cell: ({stated}) => cell(String(stated ?? absent))},
	{head: 'computed', align: 'right', keep: 0, cell: ({computed}) => cell(String(computed ?? absent))},
	{head: '', align: 'left', keep: 0, cell: ({agrees}) => (agrees ? cell('agrees', 'pass') : cell('DIFFERS', 'fail'))},
];

const ownView = (kind: string, name: string, differences: Difference[] | undefined): Block[] => {
	if (differences === undefined) return [text(`You have no ${kind} called ${name}.`)];
	if (differences.length === 0) return [text(`Your ${kind} ${name} says the same.`)];
	return [text(`Your ${kind} ${name} differs:`), differenceTable(differences, 'yours', 'plan')];
};

/** Differences of two documents, side by side. */
export const differenceTable = (differences: readonly Difference[], a: string, b: string): Block => {
	const columns: readonly Making<Difference>[] = [
		{head: '', align: 'left', keep: 0, shortest: 16, cell: ({path}) => cell(path)},
		{head: a, align: 'left', keep: 0, shortest: 8, cell: one => cell(one.a ?? absent)},
		{head: b, align: 'left', keep: 0, shortest: 8, cell: one => cell(one.b ?? absent)},
	];
	return tableOf(columns, differences, 2);
};

export const shortView = (fields: ShortPlan): Block[] => [
	text(`${fields.track} · ${fields.type} · pair ${fields.pair} · gearbox ${fields.gearbox}`, 'strong', 2),
	...fields.shifts.map(({from, rpm}) => text(`  shift ${from} to ${from + 1} at ${rpm}`)),
	...(fields.pitRoad ? [text(`  pit road in gear ${fields.pitRoad.gear} at ${fields.pitRoad.rpm}`)] : []),
	...(fields.restartGear === undefined ? [] : [text(`  restart in gear ${fields.restartGear}`)]),
	text(`  highest RPM ${fields.highestRpm}, limit ${fields.limitRpm}`),
	gap,
	text('The short form: there is nothing in it to compute again. The whole plan comes with droprack share.', 'muted'),
	text(caution, 'muted'),
];
