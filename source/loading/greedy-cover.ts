/** A cover that is quickly found and seldom the smallest: more things than it takes need not be looked at. */
import {isServed, type Need} from './cover.ts';

/** Serves one need after the other in the way that asks for the fewest more things; undefined where one cannot be served. */
export function greedyCover(needs: readonly Need[], thingCount: number): number[] | undefined {
	if (needs.some(need => need.length === 0)) return undefined;
	const worth = Array.from({length: thingCount}, () => 0);
	for (const need of needs)
		for (const way of need) for (const thing of way.demands.flat()) worth[thing]! += 1 / need.length;
	const taken = new Set<number>();
	const has = (thing: number) => taken.has(thing);
	for (const need of needs) {
		if (need.some(way => isServed(way, has))) continue;
		const missing = need.map(way => way.demands.filter(demand => !demand.some(has)));
		const fewest = missing.reduce((best, one) => (one.length < best.length ? one : best));
		for (const demand of fewest) {
			if (!demand.some(has)) taken.add(demand.reduce((best, thing) => (worth[thing]! > worth[best]! ? thing : best)));
		}
	}
	return withoutSpares([...taken], needs);
}

/** The same without what is not needed. */
function withoutSpares(things: readonly number[], needs: readonly Need[]): number[] {
	let kept = [...things];
	for (const thing of things) {
		const fewer = kept.filter(other => other !== thing);
		if (needs.every(need => need.some(way => isServed(way, other => fewer.includes(other))))) kept = fewer;
	}
	return kept;
}
