/**
 * The speeds of a gear, cut into cells over each of which one quadrature is exact enough. Cut where a run first comes by:
 * most runs see a small part of a gear's speeds, and few come near the speed at which the acceleration falls to 0.
 */

import {balancedBefore} from './balance.ts';
import type {GearMotion, Mark} from './gear-motion.ts';
import {gentle, integrate, type Stretch} from './quadrature.ts';
import {settled} from './travel.ts';

export type Cell = {
	readonly lowMps: number;
	highMps: number;
	/** The acceleration at both ends; it has one sign on the way between them. */
	readonly lowMps2: number;
	highMps2: number;
	/** The edge of the motion above which it lies. */
	readonly edge: number;
	/** Whether it needs no more cutting; known once a run has come by. */
	whole: boolean;
	/** The neighbors up to the edges on both sides. */
	above: Cell | undefined;
	below: Cell | undefined;
	/** From its low end to its high end, once it was asked for. */
	stretch: Stretch | undefined;
};

/** Whether the car gains speed in the cell. */
export function gains({lowMps2, highMps2}: Cell): boolean {
	return lowMps2 + highMps2 > 0;
}

/** Below this speed nothing is cut any more. */
const standstillMps = 1e-9;

export class SpeedCells {
	readonly #motion: GearMotion;
	/** The lowest and the highest cell above each edge. */
	readonly #ends: {lowest: Cell; highest: Cell}[] = [];
	readonly #marks: Mark[] = [];

	constructor(motion: GearMotion) {
		this.#motion = motion;
	}

	/** The cell that a run at a speed goes on into: upward where the car gains speed there, else downward; undefined at the end of the speeds. */
	from(speedMps: number): Cell | undefined {
		const cell = this.#holding(speedMps);
		return gains(cell) || speedMps > cell.lowMps ? cell : this.below(cell);
	}

	/** The cell below a speed. */
	under(speedMps: number): Cell | undefined {
		const cell = this.#holding(speedMps);
		return speedMps > cell.lowMps ? cell : this.below(cell);
	}

	above(cell: Cell): Cell | undefined {
		const next = cell.above ?? (cell.edge + 1 < this.#motion.lastEdge ? this.#over(cell.edge + 1).lowest : undefined);
		return next && this.#holdingIn(next, next.lowMps);
	}

	below(cell: Cell): Cell | undefined {
		const next = cell.below ?? (cell.edge > 0 ? this.#over(cell.edge - 1).highest : undefined);
		return next && this.#holdingIn(next, next.highMps);
	}

	/** Distance and time through the whole cell, positive where the car gains speed. */
	stretchOf(cell: Cell): Stretch {
		cell.stretch ??= integrate(this.#motion, cell.lowMps, cell.highMps);
		return cell.stretch;
	}

	/** The cell with lowMps ≤ speedMps < highMps, or the last one at the top. */
	#holding(speedMps: number): Cell {
		let cell = this.#over(this.#motion.edgeBelow(speedMps)).lowest;
		while (speedMps >= cell.highMps && cell.above !== undefined) cell = cell.above;
		return this.#holdingIn(cell, speedMps);
	}

	/** Of the cells that a cell is cut into, the one that holds a speed of it; its own top is in the highest. */
	#holdingIn(whole: Cell, speedMps: number): Cell {
		let cell = whole;
		while (!cell.whole) {
			const middle = this.#motion.mark((cell.lowMps + cell.highMps) / 2);
			if (isTiny(cell) || gentle(cell.lowMps2, middle.mps2, cell.highMps2)) cell.whole = true;
			else if (speedMps >= this.#split(cell, middle).lowMps) cell = cell.above!;
		}
		return cell;
	}

	/** The cells above an edge, cut at the kinks and where the acceleration is 0. */
	#over(edge: number): {lowest: Cell; highest: Cell} {
		this.#ends[edge] ??= this.#firstCut(edge);
		return this.#ends[edge];
	}

	#firstCut(edge: number): {lowest: Cell; highest: Cell} {
		const low = this.#markAt(edge);
		const high = this.#markAt(edge + 1);
		const middle = this.#motion.mark((low.speedMps + high.speedMps) / 2);
		const lowest = cellBetween(low, high, edge);
		const ends = {lowest, highest: lowest};
		this.#ends[edge] = ends;
		const crossed = low.gripHolds !== middle.gripHolds || middle.gripHolds !== high.gripHolds;
		const kinks = crossed || this.#motion.stillBetween(edge) ? this.#motion.kinks(edge) : [];
		lowest.whole = kinks.length === 0 && gentle(low.mps2, middle.mps2, high.mps2);
		if (lowest.whole) return ends;
		for (const kink of kinks) this.#split(ends.highest, this.#motion.mark(kink));
		for (let cell: Cell | undefined = lowest; cell !== undefined; cell = cell.above) this.#splitAtZero(cell);
		return ends;
	}

	#splitAtZero(cell: Cell): void {
		const middle = this.#motion.acceleration((cell.lowMps + cell.highMps) / 2);
		if (gentle(cell.lowMps2, middle, cell.highMps2)) return;
		const zero = balancedBefore(this.#motion, cell.lowMps, cell.highMps);
		if (zero === undefined || zero <= cell.lowMps || zero >= cell.highMps) return;
		this.#split(cell, {speedMps: zero, mps2: 0});
	}

	/** Cuts a cell in two and gives the upper one. */
	#split(cell: Cell, at: Pick<Mark, 'speedMps' | 'mps2'>): Cell {
		const upper = cellBetween(at, {speedMps: cell.highMps, mps2: cell.highMps2}, cell.edge);
		upper.above = cell.above;
		upper.below = cell;
		if (cell.above === undefined) this.#ends[cell.edge]!.highest = upper;
		else cell.above.below = upper;
		cell.above = upper;
		cell.highMps = at.speedMps;
		cell.highMps2 = at.mps2;
		return upper;
	}

	/** At an edge, for the cells on both its sides. */
	#markAt(edge: number): Mark {
		this.#marks[edge] ??= this.#motion.mark(this.#motion.edge(edge));
		return this.#marks[edge];
	}
}

function cellBetween(low: Pick<Mark, 'speedMps' | 'mps2'>, high: Pick<Mark, 'speedMps' | 'mps2'>, edge: number): Cell {
	return {
		lowMps: low.speedMps,
		highMps: high.speedMps,
		lowMps2: low.mps2,
		highMps2: high.mps2,
		edge,
		whole: false,
		above: undefined,
		below: undefined,
		stretch: undefined,
	};
}

function isTiny({lowMps, highMps}: Cell): boolean {
	return highMps - lowMps <= settled * highMps || highMps <= standstillMps;
}
