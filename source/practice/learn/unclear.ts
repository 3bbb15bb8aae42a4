/** Whether it is clear what was in the car. */
import type {Findings} from '../find/findings.ts';

/**
 * True where the log fits another pair than what is said to be mounted, or nothing is said and several pairs fit: a
 * circumference that was learned with the wrong pair is worse than none.
 */
export function isUnclear(findings: Findings | undefined): boolean {
	if (findings === undefined) return false;
	const {verdict, alsoFit} = findings.mounted;
	return verdict === 'otherFits' || verdict === 'flippedFits' || (verdict === 'noInstalled' && alsoFit.length > 0);
}
