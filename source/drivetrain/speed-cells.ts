/**
 * The speeds of a gear, cut into cells over each of which one quadrature is exact enough. Cut where a run first comes by:
 * most runs see a small part of a gear's speeds.
 */
import type {GearMotion} from './gear-motion.ts';
import {cellOf} from './monotone-cubic.ts';
import {balancedBefore, gentle, integrate, type Stretch, settled} from './travel.ts';

export type Cell = {
	readonly lowMps: number;
	readonly highMps: number;
	/** The images of the motion between which it lies, and its place among the cells there. */
	readonly between: number;
	readonly place: number;
	/** From its low end to its high end, once it was asked for. */
	stretch: Stretch | undefined;
};

export class SpeedCells {
	readonly #motion: GearMotion;
	readonly #cells: (readonly Cell[])[] = [];

	constructor(motion: GearMotion) {
		this.#motion = motion;
	}

	/** The cell that a run at a speed goes into, upward or downward; undefined at the end of the speeds. */
	at(speedMps: number, rising: boolean): Cell | undefined {
		const {images} = this.#motion;
		const above = cellOf(images, speedMps);
		const between = !rising && speedMps === images[above] ? above - 1 : above;
		const cells = this.#cellsBetween(between);
		return cells.find(cell => (rising ? speedMps < cell.highMps : speedMps <= cell.highMps));
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
		const {images} = this.#motion;
		if (between < 0 || between >= images.length - 1) return [];
		this.#cells[between] ??= this.#cut(between, images[between]!, images[between + 1]!);
		return this.#cells[between];
	}

	/** At the kinks first, and then until the acceleration changes little over each cell. */
	#cut(between: number, lowMps: number, highMps: number): readonly Cell[] {
		const edges = [lowMps];
		for (const kink of [...this.#motion.gripCrossings(lowMps, highMps), highMps]) {
			cutSmooth(this.#motion, edges.at(-1)!, kink, edges);
		}
		return edges.slice(1).map((edge, place) => ({
			lowMps: edges[place]!,
			highMps: edge,
			between,
			place,
			stretch: undefined,
		}));
	}
}

/** A speed and the acceleration there. */
type Mark = {readonly speedMps: number; readonly mps2: number};

/** Below this speed nothing is cut any more. */
const standstillMps = 1e-9;

/** Adds the edges above `lowMps` of a piece without kinks; one with a zero of the acceleration in it is cut there first. */
function cutSmooth(motion: GearMotion, lowMps: number, highMps: number, edges: number[]): void {
	const mark = (speedMps: number): Mark => ({speedMps, mps2: motion.acceleration(speedMps)});
	const [low, middle, high] = [mark(lowMps), mark((lowMps + highMps) / 2), mark(highMps)];
	if (gentle(low.mps2, middle.mps2) && gentle(middle.mps2, high.mps2)) {
		edges.push(highMps);
		return;
	}
	const zero = balancedBefore(motion, lowMps, highMps);
	if (zero !== undefined && zero > lowMps && zero < highMps) {
		const balanced = {speedMps: zero, mps2: 0};
		halve(motion, low, balanced, edges);
		halve(motion, balanced, high, edges);
	} else halve(motion, low, high, edges);
}

function halve(motion: GearMotion, low: Mark, high: Mark, edges: number[]): void {
	const tiny = high.speedMps - low.speedMps <= settled * high.speedMps || high.speedMps <= standstillMps;
	if (tiny || gentle(low.mps2, high.mps2)) {
		edges.push(high.speedMps);
		return;
	}
	const speedMps = (low.speedMps + high.speedMps) / 2;
	const middle = {speedMps, mps2: motion.acceleration(speedMps)};
	halve(motion, low, middle, edges);
	halve(motion, middle, high, edges);
}
