/** The fewest things that serve every need: exact, by dynamic programming along the things. */
import {type Cover, type CoverProblem, lossOf, mostDemands, type Need, type Way} from './cover.ts';
import {Frontiers, type Layer} from './frontiers.ts';

/** Where the things from the first to some one have been taken or left: the cheapest way to have met what is met. */
type State = {
	readonly codes: Uint16Array;
	readonly count: number;
	readonly loss: number;
	readonly unease: number;
	/** The things taken, the last first. */
	readonly taken: Taken | undefined;
};
type Taken = {readonly thing: number; readonly before: Taken | undefined};

const start: State = {codes: new Uint16Array(0), count: 0, loss: 0, unease: 0, taken: undefined};

/**
 * The cover with the fewest things; among these the least loss, then the least unease. The same problem has the same answer;
 * undefined where some need cannot be served.
 *
 * Things are taken or left one by one in their order. What is still to come depends on the earlier choices only through the
 * demands met of the needs that reach over to later things; of two states that agree in these only the cheaper goes on
 * (Bellman's principle). That is done for one thing, for two, and so on, until there is a cover: a state is dropped where
 * needs miss more things, in whichever way, than may still be taken. So the answer is exact for every problem. The number
 * of states grows with how many things a need spans: few where things in order of their ratio serve needs that want
 * neighbors, up to 2^n for needs without any order.
 */
export function fewest({needs, unease}: CoverProblem): Cover | undefined {
	for (const way of needs.flat()) assertSound(way);
	if (needs.some(need => need.length === 0)) return undefined;
	for (let most = 0; most <= unease.length; most++) {
		const state = cheapest(needs, unease, most);
		if (state !== undefined) return coverOf(state, needs);
	}
	return undefined;
}

function assertSound({demands}: Way): void {
	if (demands.length > mostDemands) throw new Error(`a way with more than ${mostDemands} demands`);
	const things = demands.flatMap(demand => [...new Set(demand)]);
	if (new Set(things).size < things.length) throw new Error('a way with a thing in two demands');
	if (demands.some(demand => demand.length === 0)) throw new Error('a way with an empty demand');
}

/** The cheapest cover of at most so many things. */
function cheapest(needs: readonly Need[], unease: readonly number[], most: number): State | undefined {
	const frontiers = new Frontiers(needs, unease.length);
	if (frontiers.wantedAhead(-1) > most) return undefined;
	let states: State[] = [start];
	for (let thing = 0; thing < unease.length; thing++) {
		const layer = frontiers.layer(thing);
		const next = new Map<string, State>();
		for (const state of states) {
			if (state.count < most) keep(next, stepped(layer, state, most, thing, unease[thing]!));
			keep(next, stepped(layer, state, most, undefined, 0));
		}
		states = [...next.values()];
	}
	return states.reduce<State | undefined>(
		(best, state) => (best === undefined || cheaper(state, best) ? state : best),
		undefined,
	);
}

function stepped(
	layer: Layer,
	state: State,
	most: number,
	thing: number | undefined,
	unease: number,
): State | undefined {
	const codes = layer.carry(state.codes);
	const count = state.count + (thing === undefined ? 0 : 1);
	const step = layer.decide(codes, thing !== undefined);
	if (count + step.wanted > most) return undefined;
	const taken = thing === undefined ? state.taken : {thing, before: state.taken};
	return {codes, count, loss: state.loss + step.loss, unease: state.unease + unease, taken};
}

function keep(states: Map<string, State>, state: State | undefined): void {
	if (state === undefined) return;
	const key = String.fromCharCode(...state.codes);
	const other = states.get(key);
	if (other === undefined || cheaper(state, other)) states.set(key, state);
}

function cheaper(one: State, other: State): boolean {
	return (one.count - other.count || one.loss - other.loss || one.unease - other.unease) < 0;
}

function coverOf(state: State, needs: readonly Need[]): Cover {
	const things: number[] = [];
	for (let taken = state.taken; taken !== undefined; taken = taken.before) things.unshift(taken.thing);
	const has = (thing: number) => things.includes(thing);
	return {things, loss: needs.reduce((sum, need) => sum + lossOf(need, has), 0), unease: state.unease};
}
