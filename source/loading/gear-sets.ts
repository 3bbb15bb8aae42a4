/** The gearbox sets that can be built from single gears. */
import type {Gearbox, GearInventory, SpareGear} from '../drivetrain/car.ts';

/**
 * Every set of gears on hand that goes together: each gear taller than the one before it, the ratio from a gear to the next
 * within the inventory's steps, and one group among those of all gears that name groups. Sets of the same ratios are one.
 * A set that is built already has its name; the others are named by their ratios.
 */
export function buildableSets(inventory: GearInventory, built: readonly Gearbox[]): Gearbox[] {
	const places = Math.max(...inventory.gears.map(({gear}) => gear));
	let sets: SpareGear[][] = [[]];
	for (let place = 1; place <= places; place++) {
		const onHand = inventory.gears.filter(({gear, pieces}) => gear === place && pieces > 0);
		sets = sets.flatMap(set => onHand.filter(gear => follows(set, gear, inventory)).map(gear => [...set, gear]));
	}
	const names = new Map(built.map(({name, ratios}) => [ratiosName(ratios), name]));
	const byRatios = new Map(sets.map(set => set.map(({ratio}) => ratio)).map(ratios => [ratiosName(ratios), ratios]));
	return [...byRatios].map(([ratiosText, ratios]) => ({name: names.get(ratiosText) ?? ratiosText, ratios}));
}

function follows(set: readonly SpareGear[], gear: SpareGear, {smallestStep, largestStep}: GearInventory): boolean {
	const before = set.at(-1);
	if (before === undefined) return true;
	const step = before.ratio / gear.ratio;
	return step > 1 && isAtMost(smallestStep, step) && isAtMost(step, largestStep) && goTogether([...set, gear]);
}

/** A quotient of two written ratios is as good as the bound that it rounds to. */
const rounding = 1e-9;
const isAtMost = (one: number, other: number): boolean => one <= other * (1 + rounding);

function goTogether(gears: readonly SpareGear[]): boolean {
	const named = gears.flatMap(({fits}) => (fits === undefined ? [] : [fits]));
	const [first, ...others] = named;
	return first === undefined || first.some(group => others.every(fits => fits.includes(group)));
}

/** "2.62 1.93 1.52 1.22 1" */
export const ratiosName = (ratios: readonly number[]): string => ratios.join(' ');
