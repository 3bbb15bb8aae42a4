/** What of each need is open between one thing and the next, and how taking or leaving a thing changes it. */
import type {Need, Way} from './cover.ts';

/** A way's code is the bits of its demands met, or this: it cannot be had any more, or gains nothing. */
const dead = 0xffff;

/** The code of a need is the number of the best way that is there, from 1; 0 where none is yet. */
const unserved = 0;

type OpenWay = {readonly way: Way; readonly place: number; readonly number: number};
type OpenNeed = {readonly place: number; readonly ways: readonly OpenWay[]; readonly closes: boolean};

/** The needs that a thing or things on both sides of it serve: those before are settled, those after untouched. */
export class Frontiers {
	readonly #needs: readonly Need[];
	readonly #spans: readonly (readonly [number, number])[];
	readonly #bits: readonly (readonly Bits[])[];
	#places = new Map<number, number>();

	constructor(needs: readonly Need[], thingCount: number) {
		this.#needs = needs.map(need => [...need].sort((one, other) => one.loss - other.loss));
		this.#spans = this.#needs.map(need => {
			const things = need.flatMap(({demands}) => demands.flat());
			return [Math.min(...things, thingCount), Math.max(...things, -1)] as const;
		});
		this.#bits = this.#needs.map(need => need.map(bitsOf));
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
			open.push({place, ways, closes: last === thing});
		}
		return new Layer(thing, from, open, bits);
	}
}

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

	constructor(thing: number, from: readonly number[], open: readonly OpenNeed[], bits: readonly Bits[]) {
		this.#from = Int32Array.from(from);
		this.#open = open;
		this.#meets = Uint16Array.from(bits, ({meets}) => meets.get(thing) ?? 0);
		this.#ends = Uint16Array.from(bits, ({ends}) => ends.get(thing) ?? 0);
		this.#all = Uint16Array.from(bits, ({all}) => all);
	}

	/** The codes of the layer before, at their places in this one; needs that open here are untouched. */
	carry(codes: Uint16Array): Uint16Array {
		const carried = new Uint16Array(this.#from.length);
		for (let i = 0; i < carried.length; i++) carried[i] = this.#from[i]! < 0 ? 0 : codes[this.#from[i]!]!;
		return carried;
	}

	/**
	 * Changes the codes by taking the thing or leaving it; the change of the loss, or undefined where a need can no longer be
	 * served. A need that closes here, or that nothing later can serve better, keeps no codes that tell states apart.
	 */
	decide(codes: Uint16Array, isTaken: boolean): number | undefined {
		let gained = 0;
		let row = 0;
		for (const need of this.#open) {
			const lossBefore = lossAt(need, codes[need.place]!);
			let isOpen = false;
			for (const {place, number} of need.ways) {
				const index = row++;
				if (codes[place] === dead) continue;
				const served = codes[need.place]!;
				const met = isTaken ? codes[place]! | this.#meets[index]! : codes[place]!;
				const lost = (this.#ends[index]! & ~met) !== 0 || (served !== unserved && served < number);
				codes[place] = lost || met === this.#all[index] ? dead : met;
				if (!lost && met === this.#all[index]) codes[need.place] = number;
				isOpen ||= codes[place] !== dead;
			}
			const served = codes[need.place]!;
			if (!isOpen && served === unserved) return undefined;
			gained += lossAt(need, served) - lossBefore;
			if (isOpen && !need.closes) continue;
			codes.fill(dead, need.place, need.place + 1 + need.ways.length);
		}
		return gained;
	}
}

/** Once closed a need has nothing more to give. */
function lossAt({ways}: OpenNeed, served: number): number {
	return served === unserved || served === dead ? 0 : ways[served - 1]!.way.loss;
}
