/** What of each need is open between one thing and the next, and how taking or leaving a thing changes it. */
import type {Need, Way} from './cover.ts';

/** A way's code is the bits of its demands met, or this: it cannot be had any more, or gains nothing. */
const dead = 0xffff;

/** The code of a need is the number of the best way that is there, from 1; 0 where none is yet. */
const unserved = 0;

type OpenWay = {readonly way: Way; readonly place: number; readonly number: number};
type OpenNeed = {
	readonly place: number;
	readonly ways: readonly OpenWay[];
	readonly closes: boolean;
	/** Things that needs beyond its reach want at least. */
	readonly wantedBeyond: number;
};

/** The needs that a thing or things on both sides of it serve: those before are settled, those after untouched. */
export class Frontiers {
	readonly #needs: readonly Need[];
	readonly #spans: readonly (readonly [number, number])[];
	readonly #bits: readonly (readonly Bits[])[];
	#places = new Map<number, number>();
	readonly #wantedAhead: readonly number[];

	constructor(needs: readonly Need[], thingCount: number) {
		this.#needs = needs.map(need => [...need].sort((one, other) => one.loss - other.loss));
		this.#spans = this.#needs.map(need => {
			const things = need.flatMap(({demands}) => demands.flat());
			return [Math.min(...things, thingCount), Math.max(...things, -1)] as const;
		});
		this.#bits = this.#needs.map(need => need.map(bitsOf));
		this.#wantedAhead = wantedAhead(this.#needs, this.#spans, thingCount);
	}

	/** Things that the needs want at least of which nothing is decided yet after a thing. */
	wantedAhead(thing: number): number {
		return this.#wantedAhead[thing + 1]!;
	}

	/** The layer of the next thing; to be asked for in order. */
	layer(thing: number): Layer {
		const before = this.#places;
		this.#places = new Map();
		const from: number[] = [];
		const open: OpenNeed[] = [];
		const bits: Bits[] = [];
		for (const [index, [first, last]] of this.#spans.entries()) {
			if (first > thing || last < thing) continue;
			const place = from.length;
			this.#places.set(index, place);
			const known = before.get(index);
			const ways = this.#needs[index]!.map((way, k) => ({way, place: place + 1 + k, number: k + 1}));
			for (let k = 0; k <= ways.length; k++) from.push(known === undefined ? -1 : known + k);
			bits.push(...this.#bits[index]!);
			open.push({place, ways, closes: last === thing, wantedBeyond: this.wantedAhead(last)});
		}
		return new Layer(thing, from, open, bits, this.wantedAhead(thing));
	}
}

/** Needs that reach over no common thing take things of their own: the most that some of them want together, from each thing on. */
function wantedAhead(
	needs: readonly Need[],
	spans: readonly (readonly [number, number])[],
	thingCount: number,
): number[] {
	const wanted = Array.from({length: thingCount + 1}, () => 0);
	for (let thing = thingCount - 1; thing >= 0; thing--) {
		wanted[thing] = wanted[thing + 1]!;
		for (const [i, [first, last]] of spans.entries()) {
			if (first === thing) wanted[thing] = Math.max(wanted[thing]!, leastWanted(needs[i]!) + wanted[last + 1]!);
		}
	}
	return wanted;
}

const leastWanted = (need: Need): number => Math.min(...need.map(({demands}) => demands.length));

/** Of a way: which demands a thing meets, and which are lost after it. */
type Bits = {
	readonly meets: ReadonlyMap<number, number>;
	readonly ends: ReadonlyMap<number, number>;
	readonly all: number;
};

function bitsOf({demands}: Way): Bits {
	const meets = new Map<number, number>();
	const ends = new Map<number, number>();
	demands.forEach((demand, i) => {
		const bit = 1 << i;
		for (const thing of demand) meets.set(thing, (meets.get(thing) ?? 0) | bit);
		const last = Math.max(...demand);
		ends.set(last, (ends.get(last) ?? 0) | bit);
	});
	return {meets, ends, all: (1 << demands.length) - 1};
}

export class Layer {
	readonly #from: Int32Array;
	readonly #open: readonly OpenNeed[];
	readonly #meets: Uint16Array;
	readonly #ends: Uint16Array;
	readonly #all: Uint16Array;
	readonly #wantedAhead: number;

	constructor(
		thing: number,
		from: readonly number[],
		open: readonly OpenNeed[],
		bits: readonly Bits[],
		wantedAhead: number,
	) {
		this.#from = Int32Array.from(from);
		this.#open = open;
		this.#meets = Uint16Array.from(bits, ({meets}) => meets.get(thing) ?? 0);
		this.#ends = Uint16Array.from(bits, ({ends}) => ends.get(thing) ?? 0);
		this.#all = Uint16Array.from(bits, ({all}) => all);
		this.#wantedAhead = wantedAhead;
	}

	/** The codes of the layer before, at their places in this one; needs that open here are untouched. */
	carry(codes: Uint16Array): Uint16Array {
		const carried = new Uint16Array(this.#from.length);
		for (let i = 0; i < carried.length; i++) carried[i] = this.#from[i]! < 0 ? 0 : codes[this.#from[i]!]!;
		return carried;
	}

	/**
	 * Changes the codes by taking the thing or leaving it. Gives the change of the loss, and how many more things the needs want
	 * at least: infinitely many where it can no longer be served. A need that closes here, or that nothing later can serve
	 * better, keeps no codes that tell states apart.
	 */
	decide(codes: Uint16Array, isTaken: boolean): {loss: number; wanted: number} {
		let loss = 0;
		let wanted = this.#wantedAhead;
		let row = 0;
		for (const need of this.#open) {
			const lossBefore = lossAt(need, codes[need.place]!);
			let least = Number.POSITIVE_INFINITY;
			for (const {place, number} of need.ways) {
				const index = row++;
				if (codes[place] === dead) continue;
				const all = this.#all[index]!;
				const served = codes[need.place]!;
				const met = isTaken ? codes[place]! | this.#meets[index]! : codes[place]!;
				const isLost = (this.#ends[index]! & ~met) !== 0 || (served !== unserved && served < number);
				codes[place] = isLost || met === all ? dead : met;
				if (!isLost && met === all) codes[need.place] = number;
				if (codes[place] !== dead) least = Math.min(least, bitCount(all & ~met));
			}
			const served = codes[need.place]!;
			if (served === unserved) wanted = Math.max(wanted, least + need.wantedBeyond);
			if (wanted === Number.POSITIVE_INFINITY) break;
			loss += lossAt(need, served) - lossBefore;
			if (least === Number.POSITIVE_INFINITY || need.closes)
				codes.fill(dead, need.place, need.place + 1 + need.ways.length);
		}
		return {loss, wanted};
	}
}

function bitCount(bits: number): number {
	let count = 0;
	for (let left = bits; left !== 0; left &= left - 1) count++;
	return count;
}

/** Once closed a need has nothing more to give. */
function lossAt({ways}: OpenNeed, served: number): number {
	return served === unserved || served === dead ? 0 : ways[served - 1]!.way.loss;
}
