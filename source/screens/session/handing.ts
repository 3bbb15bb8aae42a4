/** What can be handed over of one row, made when it is looked at. Loaded only then: a start does not need it. */

import type {JsonObject} from '../../documents/json.ts';
import {type Ranked, rankSteps} from '../../planning/rank-rack.ts';
import {pointsOf} from '../../planning/rpm-table.ts';
import {finish} from '../../planning/run-rack.ts';
import type {RowRun} from '../../planning/run-row.ts';
import type {CardSource} from '../../sharing/cards/card.ts';
import {driverCard} from '../../sharing/cards/driver-card.ts';
import {engineSheet} from '../../sharing/cards/engine-sheet.ts';
import {swapSheet} from '../../sharing/cards/swap-sheet.ts';
import {densePlan} from '../../sharing/dense.ts';
import {makePlan} from '../../sharing/make-plan.ts';
import type {PlanDocument} from '../../sharing/plan-document.ts';
import {printPlan} from '../../sharing/print-plan.ts';
import {drawQr} from '../../sharing/qr.ts';
import {shortForm} from '../../sharing/short-form.ts';
import {readBoth} from './answer.ts';
import {current, type Documents} from './documents.ts';
import type {Handed, HandOver, Item} from './hand-over.ts';
import {rowNamed} from './rows.ts';
import type {Session} from './session.ts';

/** Of the row of that name; undefined where the rack has none, or nothing can be ranked. `ranked` is the answer on the screen. */
export function handed(
	{history: {present}, situation, units}: Pick<Session, 'history' | 'situation' | 'units'>,
	{item, date, day}: HandOver,
	name: string,
	ranked: Ranked,
): Handed | undefined {
	const read = readBoth(present);
	// Plans and cards are about every situation, whichever one is looked at.
	const whole = situation === undefined ? ranked : rankedWhole(present);
	const row = whole && rowNamed(whole, name);
	const run = whole?.runs.get(name);
	if (!read.ok || whole === undefined || row === undefined || run === undefined) return undefined;
	const {setting} = whole.ranking;
	const table = tableOf(whole, run);
	const documents = {track: current(present, 'track').json, car: current(present, 'car').json};
	const {notes} = current(present, 'track');
	return contentOf[item](() => makePlan({...documents, row, setting, table, date, notes}), {
		car: read.car,
		track: read.track,
		row,
		setting,
		table,
		day,
		units,
	});
}

type Making = (plan: () => PlanDocument, card: CardSource) => Handed;

const asText = (text: string): Handed => ({text, draw: undefined});
const card =
	(make: (source: CardSource) => string[]): Making =>
	(_, source) =>
		asText(`${make(source).join('\n')}\n`);
const lineOf = (plan: PlanDocument): string => shortForm(plan).line;

const contentOf: Record<Item, Making> = {
	'plan as text': plan => asText(printPlan(plan())),
	'one line': plan => asText(`${lineOf(plan())}\n`),
	'QR of plan': plan => {
		const content = plan();
		return {text: printPlan(content), draw: window => drawQr(densePlan(content), window)};
	},
	'QR of line': plan => {
		const line = lineOf(plan());
		return {text: `${line}\n`, draw: window => drawQr(line, window)};
	},
	'driver card': card(driverCard),
	'swap sheet': card(swapSheet),
	'engine sheet': card(engineSheet),
};

const tableOf = ({ground}: Ranked, run: RowRun) => ({points: pointsOf(run, ground)});

let last: {track: JsonObject; car: JsonObject; ranked: Ranked | undefined} | undefined;

/** Ranked over all situations; once for the same content. */
function rankedWhole(documents: Documents): Ranked | undefined {
	const [track, car] = [current(documents, 'track').json, current(documents, 'car').json];
	if (last?.track !== track || last.car !== car) {
		const read = readBoth(documents);
		const ranked = read.ok ? finish(rankSteps(read.car, read.track, {})) : undefined;
		last = {track, car, ranked: ranked?.ok ? ranked.value : undefined};
	}
	return last.ranked;
}
