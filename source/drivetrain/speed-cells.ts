/**
 * The speeds of a gear, cut into cells over each of which one quadrature is exact enough. Cut where a run first comes by:
 * most runs see a small part of a gear's speeds.
 */
import type {GearMotion, Mark} from './gear-motion.ts';
import {balancedBefore, gentle, integrate, type Stretch, settled} from './travel.ts';

export type Cell = {
	readonly lowMps: number;
	readonly highMps: number;
	/** The acceleration at both ends; it has one sign on the way between them. */
	readonly lowMps2: number;
	readonly highMps2: number;
	/** The edge of the motion above which it lies, and its place among the cells up to the next. */
	readonly between: number;
	readonly place: number;
	/** From its low end to its high end, once it was asked for. */
	stretch: Stretch | undefined;
};

/** Whether the car gains speed in the cell. */
export function gains({lowMps2, highMps2}: Cell): boolean {
	return lowMps2 + highMps2 > 0;
}

export class SpeedCells {
	readonly #motion: GearMotion;
	readonly #cells: (readonly Cell[])[] = [];
	readonly #marks: Mark[] = [];

	constructor(motion: GearMotion) {
		this.#motion = motion;
	}

	/** The cell that a run at a speed goes on into: upward where the car gains speed there, else downward; undefined at the end of the speeds. */
	from(speedMps: number): Cell | undefined {
		const cell = this.#holding(speedMps);
		if (cell === undefined || gains(cell) || speedMps > cell.lowMps) return cell;
		return this.below(cell);
	}

	/** The cell below a speed. */
	under(speedMps: number): Cell | undefined {
		const cell = this.#holding(speedMps);
		return cell !== undefined && speedMps > cell.lowMps ? cell : cell && this.below(cell);
	}

	/** The cell with lowMps ≤ speedMps < highMps, or the last one at the top. */
	#holding(speedMps: number): Cell | undefined {
		const cells = this.#cellsBetween(this.#motion.edgeBelow(speedMps));
		return cells.find(({highMps}) => speedMps < highMps) ?? cells.at(-1);
	}

	above({between, place}: Cell): Cell | undefined {
		return this.#cellsBetween(between)[place + 1] ?? this.#cellsBetween(between + 1)[0];
	}

	below({between, place}: Cell): Cell | undefined {
		return this.#cellsBetween(between)[place - 1] ?? this.#cellsBetween(between - 1).at(-1);
	}

	/** Distance and time through the whole cell, positive where the car gains speed. */
	stretchOf(cell: Cell): Stretch {
		cell.stretch ??= integrate(this.#motion, cell.lowMps, cell.highMps);
		return cell.stretch;
	}

	#cellsBetween(between: number): readonly Cell[] {
		if (between < 0 || between >= this.#motion.lastEdge) return [];
		this.#cells[between] ??= this.#cut(between);
		return this.#cells[between];
	}

	/** At the kinks first, and then until the acceleration changes little over each cell. */
	#cut(between: number): readonly Cell[] {
		const low = this.#markAt(between);
		const high = this.#markAt(between + 1);
		const middle = this.#motion.mark((low.speedMps + high.speedMps) / 2);
		const crossed = low.gripHolds !== middle.gripHolds || middle.gripHolds !== high.gripHolds;
		const kinked = crossed || this.#motion.stillBetween(between);
		if (!kinked && gentle(low.mps2, middle.mps2, high.mps2)) return [cellBetween(low, high, between, 0)];
		const marks = [low];
		const kinks = kinked ? this.#motion.kinks(between) : [];
		for (const kink of kinks) cutSmooth(this.#motion, this.#motion.mark(kink), marks);
		cutSmooth(this.#motion, high, marks);
		return marks.slice(1).map((mark, place) => cellBetween(marks[place]!, mark, between, place));
	}

	/** At an edge, for the cells on both its sides. */
	#markAt(edge: number): Mark {
		this.#marks[edge] ??= this.#motion.mark(this.#motion.edge(edge));
		return this.#marks[edge];
	}
}

function cellBetween(low: Mark, high: Mark, between: number, place: number): Cell {
	return {
		lowMps: low.speedMps,
		highMps: high.speedMps,
		lowMps2: low.mps2,
		highMps2: high.mps2,
		between,
		place,
		stretch: undefined,
	};
}

/** Below this speed nothing is cut any more. */
const standstillMps = 1e-9;

/** Adds the marks up to `high` of a piece without kinks; one with a zero of the acceleration in it is cut there first. */
function cutSmooth(motion: GearMotion, high: Mark, marks: Mark[]): void {
	const low = marks.at(-1)!;
	const middle = motion.acceleration((low.speedMps + high.speedMps) / 2);
	if (gentle(low.mps2, middle, high.mps2)) {
		marks.push(high);
		return;
	}
	const zero = balancedBefore(motion, low.speedMps, high.speedMps);
	if (zero !== undefined && zero > low.speedMps && zero < high.speedMps) {
		const balanced = {...low, speedMps: zero, mps2: 0};
		halve(motion, low, balanced, marks);
		halve(motion, balanced, high, marks);
	} else halve(motion, low, high, marks);
}

function halve(motion: GearMotion, low: Mark, high: Mark, marks: Mark[]): void {
	const middle = motion.mark((low.speedMps + high.speedMps) / 2);
	const tiny = high.speedMps - low.speedMps <= settled * high.speedMps || high.speedMps <= standstillMps;
	if (tiny || gentle(low.mps2, middle.mps2, high.mps2)) {
		marks.push(high);
		return;
	}
	halve(motion, low, middle, marks);
	halve(motion, middle, high, marks);
}
