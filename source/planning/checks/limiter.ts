/** The longest distance held at the limiter on any straight of the lap. */
import {eachStraight} from '../run-row.ts';
import {checkOf, type Reading, type RowCheck, worseOf} from './check.ts';

export const limiter: RowCheck = row => {
	let worst: Reading | undefined;
	eachStraight(row, ({place, state, result, sequence}, {condition}) => {
		if (state !== 'ran') return;
		const held = result.limiterM > 0 || sequence?.pushed === true;
		worst = worseOf(worst, {
			verdict: held ? 'fail' : 'pass',
			value: result.limiterM,
			bound: 0,
			margin: 0 - result.limiterM,
			place: place.name,
			part: 'end',
			situation: condition.name,
		});
	});
	return checkOf('limiter', worst);
};
