/** Units beyond the table that `learn-units.ts` has looked up in this process. What a name means never changes. */
import type {Dimension, Unit} from './units.ts';

const rare = new Map<string, Unit>();

export function rareUnit(name: string, dimension: Dimension): Unit | undefined {
	const unit = rare.get(name);
	return unit?.dimension === dimension ? unit : undefined;
}

export function rareUnitOf(name: string): Unit | undefined {
	return rare.get(name);
}

export function keepRareUnit(unit: Unit): void {
	rare.set(unit.name, unit);
}
