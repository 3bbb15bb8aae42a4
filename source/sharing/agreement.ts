/** What a plan states, beside what computing it again gives. */
import type {Stated} from './plan-document.ts';

export type Agreement = {
	/** "highest RPM, In the tow". */
	what: string;
	/** Undefined where only one side has it. */
	stated: number | undefined;
	computed: number | undefined;
	agrees: boolean;
};

/** Whole RPM of two computers may round to neighbors. */
const neighborRpm = 1;

/** Every stated number, in the order of the plan, then what only the computation has. */
export function agreements(stated: Stated, computed: Stated): Agreement[] {
	const [said, found] = [numbersOf(stated), numbersOf(computed)];
	return [...new Set([...said.keys(), ...found.keys()])].map(what => {
		const [one, other] = [said.get(what), found.get(what)];
		const agrees = one !== undefined && other !== undefined && Math.abs(one - other) <= toleranceOf(what);
		return {what, stated: one, computed: other, agrees};
	});
}

function toleranceOf(what: string): number {
	return what.endsWith('gear') ? 0 : neighborRpm;
}

function numbersOf({limit, highest, shifts, pitRoad, restart}: Stated): Map<string, number> {
	return new Map([
		['RPM limit', limit.rpm],
		...highest.map(({situation, rpm}) => [`highest RPM, ${situation}`, rpm] as const),
		...shifts.flatMap(({from, rpm, light}) => [
			[`shift RPM, ${from} to ${from + 1}`, rpm] as const,
			[`shift light, ${from} to ${from + 1}`, light] as const,
		]),
		...(pitRoad === undefined
			? []
			: ([
					['pit-road gear', pitRoad.gear],
					['pit-road RPM', pitRoad.rpm],
					['pit-road RPM with tolerance', pitRoad.tolerance],
				] as const)),
		...(restart === undefined
			? []
			: ([
					['restart gear', restart.gear],
					['restart RPM', restart.rpm],
				] as const)),
	]);
}
