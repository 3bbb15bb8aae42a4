/** Which of the finished sequences is driven. */
import type {Finish} from './sequence.ts';

/** The least time. */
export function fastestOf(finishes: readonly Finish[]): Finish {
	let best = finishes[0]!;
	for (const finish of finishes) if (finish.timeS < best.timeS) best = finish;
	return best;
}

/**
 * Among those within `sameTimeS` of the fastest: first the ones that never touch the limiter nor pass the limit, then the
 * fewest shifts, then the fastest. A shift that gains less than the driver can feel is not worth making.
 */
export function chosenOf(finishes: readonly Finish[], sameTimeS: number): Finish {
	let best = fastestOf(finishes);
	const bound = best.timeS + sameTimeS;
	for (const finish of finishes) if (finish.timeS <= bound && preferred(finish, best)) best = finish;
	return best;
}

function preferred(one: Finish, other: Finish): boolean {
	const limiter = Number(one.pastTop) - Number(other.pastTop);
	if (limiter !== 0) return limiter < 0;
	const shifts = one.entered.length - other.entered.length;
	return shifts !== 0 ? shifts < 0 : one.timeS < other.timeS;
}
