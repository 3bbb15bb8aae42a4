/** A built set at a track in the words of the answer: its gears, what is used of them, how they overlap. */
import type {Gearbox} from '../drivetrain/car.ts';
import type {Plan} from '../planning/plan.ts';
import type {Row, StraightResult} from '../planning/results.ts';
import type {Built} from './best-sets.ts';
import type {BuiltRow, GearStep} from './gearbox-results.ts';

export function builtRow(
	{row}: Built,
	plan: Plan,
	{name, ratios}: Gearbox,
	bestS: number | null,
	changes: number,
): BuiltRow {
	return {
		pair: row.pair,
		gearbox: name,
		ratios: [...ratios],
		fastestS: row.fastestS,
		behindS: row.fastestS === null || bestS === null ? null : row.fastestS - bestS,
		verdict: row.verdict,
		used: usedGears(row),
		changes: hasInstalledOf(plan, ratios.length) ? changes : null,
		steps: stepsOf(row, plan, ratios),
		checks: row.checks,
	};
}

function hasInstalledOf({car}: Plan, gears: number): boolean {
	return car.gearboxes.find(({name}) => name === car.installed?.gearbox)?.ratios.length === gears;
}

/** From the lowest exit gear to the highest gear on the straights. */
function usedGears({situations}: Row): {lowest: number; highest: number} | null {
	const straights = situations.flatMap(situation => situation.straights);
	if (straights.length === 0) return null;
	const lastOf = ({exitGear, shifts}: StraightResult) => exitGear + shifts.length;
	return {
		lowest: Math.min(...straights.map(({exitGear}) => exitGear)),
		highest: Math.max(...straights.map(lastOf)),
	};
}

/** Each gear to the next at the highest RPM that a shift is planned at; without what is lost in the interruption. */
function stepsOf({situations}: Row, {base, band}: Plan, ratios: readonly number[]): GearStep[] {
	const runs = situations.flatMap(({straights, restart}) => (restart === null ? straights : [...straights, restart]));
	const rpm = base.vehicle.shiftCapRpm;
	return ratios.slice(0, -1).map((ratio, i) => {
		const step = ratio / ratios[i + 1]!;
		const used = runs.some(({shifts}) => shifts.some(({from}) => from === i + 1));
		return {from: i + 1, step, rpm, rpmAfter: rpm / step, overBandRpm: rpm / step - band.lowRpm, used};
	});
}
