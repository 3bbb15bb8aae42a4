/** What the checks are called in a sentence or a table. */
import type {CheckName} from './results.ts';

/** Remark of the limit check where a straight would bring the engine there if the ignition were not cut. */
export const withoutLimiter = 'without the limiter';

export const checkNames: Readonly<Record<CheckName, string>> = {
	limit: 'RPM limit',
	limiter: 'on the limiter',
	band: 'power band',
	afterShift: 'after a shift',
	settle: 'settle',
	pitRoad: 'pit road',
	restart: 'restart',
	downshift: 'downshift',
	permitted: 'permitted',
	housing: 'housing',
	stock: 'on hand',
	mileage: 'mileage',
};
