/** The speeds at which odds tabulate the car: many draws and rows want the same answer to a millisecond, not to a nanosecond. */

/** One step of Simpson's rule. Over it a car gains a few tenths of a second, and its acceleration is nearly straight. */
export const cellMps = 2;
/** Ends and middles of the cells. */
export const nodeMps = cellMps / 2;
/** Above the last of them, and wherever the acceleration is steep, the exact solver is asked. */
export const lastCell = 70;
export const nodes = 2 * lastCell + 1;

export const nodeSpeeds = Float64Array.from({length: nodes}, (_, node) => node * nodeMps);
