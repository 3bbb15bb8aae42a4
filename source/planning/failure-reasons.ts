/** Why a row fails, in one sentence. */
import {checkNames, withoutLimiter} from './check-names.ts';
import type {Check, CheckName, Row} from './results.ts';
import {grouped, highestText, lengthText, longLengthText, placeText} from './words.ts';

/** The first failed check in words, and how many more fail. */
export function failureReason(row: Row): string {
	const failed = row.checks.filter(({verdict}) => verdict === 'fail');
	const [first, ...more] = failed;
	if (first === undefined) return '';
	const words = sentences[first.check] ?? fallback;
	const others = more.map(({check}) => names[check] ?? checkNames[check]);
	return `${words(first)}${others.length > 0 ? `; also ${others.join(', ')}` : ''}.`;
}

const where = (check: Check) => placeText(check.at, check.situation);
const fallback = (check: Check) => `${where(check) || checkNames[check.check]}: ${check.remark ?? 'fails'}`;

const sentences: Partial<Record<CheckName, (check: Check) => string>> = {
	limit: check =>
		`Over the limit: ${highestText(check.value!)} at ${where(check)}${check.remark === withoutLimiter ? ` ${withoutLimiter}` : ''}, ${grouped(Math.ceil(-check.margin!))} above ${grouped(check.bound!)}`,
	limiter: check => `On the limiter for ${lengthText(check.value!)} at ${where(check)}`,
	permitted: check => `Not permitted: ${check.remark}`,
	housing: check =>
		check.bound === null
			? `Does not fit the housing: it accepts no tooth sum`
			: `Does not fit the housing: tooth sum ${check.value}, nearest accepted ${check.bound}`,
	stock: () => 'No set on hand',
	mileage: check => `Out of miles: ${longLengthText(check.value!)} of ${longLengthText(check.bound!)}`,
};

/** How a check that can fail is called in a sentence, where that is not its name. */
const names: Partial<Record<CheckName, string>> = {
	limit: 'over the limit',
	limiter: 'on the limiter',
	band: 'stops on a straight',
	restart: 'stops on the restart',
	permitted: 'not permitted',
	housing: 'does not fit the housing',
	stock: 'no set on hand',
	mileage: 'out of miles',
};
