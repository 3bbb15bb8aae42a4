import {restartOf} from '../make-plan.ts';
import {shiftsByGear} from '../stated-results.ts';
import {type CardSource, cardOf, downTo, estimate, item, speedText} from './card.ts';

/** As fine as a tachometer is read. */
const dialRpm = 50;

/** What the driver acts on, and nothing else. */
export function driverCard(source: CardSource): string[] {
	const body = [...shiftLines(source), ...pitLines(source), ...restartLines(source), ...downshiftLines(source)];
	return cardOf('DRIVER CARD', source, body, estimate);
}

function shiftLines({row}: CardSource): string[] {
	const shifts = shiftsByGear(row);
	if (shifts.length === 0) return ['Shift: no shift is made.'];
	const lines = shifts.map(
		({from, rpm, light}) =>
			`${item(`${from} to ${from + 1}`, downTo(dialRpm, rpm))}  ${String(downTo(1, light)).padStart(7)}`,
	);
	return [`${'Shift'.padEnd(30)} ${'RPM'.padStart(7)}  ${'light'.padStart(7)}`, ...lines];
}

function pitLines({row: {pitRoad: pit}, track: {pitRoad}, units}: CardSource): string[] {
	if (pit === null || pitRoad === undefined) return [];
	const {limitMps, toleranceMps} = pitRoad;
	return [
		`Pit road in gear ${pit.gear}`,
		item(`${speedText(limitMps, units)}, the limit`, downTo(1, pit.rpm)),
		item(`NEVER above, ${speedText(limitMps + toleranceMps, units)}`, downTo(1, pit.toleranceRpm)),
	];
}

function restartLines({table}: CardSource): string[] {
	const restart = restartOf(table);
	return restart ? ['Restart', item(`in gear ${restart.gear}, at`, downTo(1, restart.rpm))] : [];
}

function downshiftLines(source: CardSource): string[] {
	const lines = downshiftRpms(source).map(({gear, rpm}) => item(`${gear} to ${gear - 1}`, downTo(1, rpm)));
	return lines.length > 0 ? ['Downshift only below', ...lines] : [];
}

/** In each gear above the first, the RPM below which the next lower one may be taken: (limit − margin)·i_k/i_k−1. */
export function downshiftRpms({row, car, setting}: Pick<CardSource, 'row' | 'car' | 'setting'>) {
	const afterRpm = setting.rpmLimit - car.margins.downshiftRpm;
	return row.overall.slice(1).map((overall, i) => ({gear: i + 2, rpm: (afterRpm * overall) / row.overall[i]!}));
}
