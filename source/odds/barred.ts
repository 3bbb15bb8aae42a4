/** What rules a pair and set out whatever the numbers are: rules, case, stock and miles. */
import type {Candidate} from '../planning/candidates.ts';
import type {Ground} from '../planning/checks/check.ts';
import {housing, mileage, stock} from '../planning/checks/hardware.ts';
import {permitted} from '../planning/checks/permitted.ts';

const checks = {permitted, housing, stock, mileage} as const;
const words = {
	permitted: 'not permitted here',
	housing: 'does not fit the housing',
	stock: 'not on hand',
	mileage: 'past its miles',
};

/** The first of them that it fails, in words; null where it fails none. No run is needed for any of them. */
export function barredBy(candidate: Candidate, ground: Ground): string | null {
	const row = {candidate, situations: [], pitRoad: undefined};
	for (const [name, check] of Object.entries(checks)) {
		if (check(row, ground)?.verdict === 'fail') return words[name as keyof typeof words];
	}
	return null;
}
