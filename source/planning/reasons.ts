/** One plain sentence for each row: what makes it first, what the others lose and where, which check fails. */
import {checkNames} from './check-names.ts';
import {failureReason} from './failure-reasons.ts';
import {type Judged, limitMargin} from './order.ts';
import type {Plan} from './plan.ts';
import type {Row} from './results.ts';
import {grouped, highestText, marginText, placeText, secondsText} from './words.ts';

/** The reasons of rows in their ranked order. */
export function reasonsOf(rows: readonly Judged[], plan: Plan): string[] {
	const passing = rows.filter(({row}) => row.verdict !== 'fail').length;
	const first = rows[0];
	if (first === undefined) return [];
	return rows.map((judged, i) => {
		if (judged.row.verdict === 'fail') return withNone(failureReason(judged.row), i, passing, rows.length);
		const second = passing > 1 ? rows[1]!.row : undefined;
		const reason =
			i === 0 ? firstReason(first.row, second, passing, rows.length, plan) : laterReason(judged.row, first.row, plan);
		return reason + nearCauses(judged.row);
	});
}

function withNone(reason: string, place: number, passing: number, total: number): string {
	return place === 0 && passing === 0 && total > 1 ? `Each of the ${total} fails a check. ${reason}` : reason;
}

function firstReason(row: Row, second: Row | undefined, passing: number, total: number, plan: Plan): string {
	if (second === undefined) return `The only one of ${grouped(total)} that fails no check: ${topText(row)}.`;
	if (row.fastestS === null || second.fastestS === null) {
		return `Widest margin of ${grouped(passing)} that fail no check, without times: ${topText(row)}.`;
	}
	const ahead = second.fastestS - row.fastestS;
	const lead = `Fastest of ${grouped(passing)} that fail no check`;
	if (ahead > plan.car.margins.levelS)
		return `${lead}: ${secondsText(ahead)} a lap ahead of ${nameOf(second)}; ${topText(row)}.`;
	return `${lead}, level with ${nameOf(second)} (${secondsText(ahead)} a lap): ${differences(row, second)}.`;
}

function laterReason(row: Row, first: Row, plan: Plan): string {
	if (row.fastestS === null || first.fastestS === null) return `${sentence(topText(row))}.`;
	const behind = row.fastestS - first.fastestS;
	if (behind <= plan.car.margins.levelS) {
		return `Level with ${nameOf(first)} (${secondsText(behind)} a lap slower): ${differences(row, first)}.`;
	}
	return `${secondsText(behind)} a lap slower than ${nameOf(first)}${mostOn(row, first, plan)}; ${underLimit(row)}.`;
}

/** What tells two rows of the same time apart: margin to the limit, shifts, and how fast the engine turns at the ends. */
function differences(row: Row, other: Row): string {
	const pairs: [string, string, string, string][] = [
		['margin', marginText(limitMargin(row)), ' rpm', marginText(limitMargin(other))],
		['', grouped(shiftCount(row)), shiftCount(row) === 1 ? ' shift' : ' shifts', grouped(shiftCount(other))],
	];
	// Where the highest RPM of both is at an end, the margins have told it.
	if ([row, other].some(each => highestEndRpm(each) < highestRpm(each)))
		pairs.push(['at most', highestText(highestEndRpm(row)), ' rpm at an end', highestText(highestEndRpm(other))]);
	const words = pairs
		.filter(([, mine, , its]) => mine !== its)
		.map(([name, mine, unit, its]) => `${name} ${mine}${unit} against ${its}`.trim());
	return words.length === 0 ? 'the same margin and shifts' : words.join(', ');
}

/** " Near: settle, restart.": the checks that are near, but for the limit, whose margin is told. */
function nearCauses({checks}: Row): string {
	const near = checks.filter(({check, verdict}) => verdict === 'near' && check !== 'limit');
	return near.length === 0 ? '' : ` Near: ${near.map(({check}) => checkNames[check]).join(', ')}.`;
}

/** ", most on Back (0.031 s)": the straight with the largest mean loss; nothing where there is only one to lose on. */
function mostOn(row: Row, first: Row, plan: Plan): string {
	const names = row.situations[0]!.straights.filter(({timeS}) => timeS !== null).map(({name}) => name);
	if (names.length < 2) return '';
	const losses = lossesByStraight(row, first, plan);
	let most = 0;
	losses.forEach((loss, i) => {
		if (loss > losses[most]!) most = i;
	});
	return `, most on ${row.situations[0]!.straights[most]!.name} (${secondsText(losses[most]!)})`;
}

function lossesByStraight(row: Row, first: Row, plan: Plan): number[] {
	return row.situations[0]!.straights.map((_, i) =>
		plan.conditions.reduce((sum, {weight}, k) => {
			const [mine, its] = [row, first].map(({situations}) => situations[k]!.straights[i]!.fastestS ?? 0);
			return sum + weight * (mine! - its!);
		}, 0),
	);
}

function topText(row: Row): string {
	const check = row.checks.find(({check}) => check === 'limit');
	if (check?.value == null) return 'no RPM to show';
	return `highest RPM ${highestText(check.value)} at ${placeText(check.at, check.situation)}, ${underLimit(row)}`;
}

function underLimit(row: Row): string {
	const margin = marginText(limitMargin(row));
	return margin === '0' ? 'at the limit' : `${margin} under the limit`;
}

function shiftCount(row: Row): number {
	return row.situations[0]!.straights.reduce((sum, {shifts}) => sum + shifts.length, 0);
}

/** Over all situations; shifts are left out, as they are planned at the same RPM with every pair. */
function highestEndRpm(row: Row): number {
	let highest = 0;
	for (const {straights} of row.situations) for (const {endRpm} of straights) highest = Math.max(highest, endRpm);
	return highest;
}

function highestRpm(row: Row): number {
	return row.checks.find(({check}) => check === 'limit')?.value ?? 0;
}

function nameOf(row: Row): string {
	return `${row.pair} ${row.gearbox}`;
}

function sentence(text: string): string {
	return text.charAt(0).toUpperCase() + text.slice(1);
}
