/** Whether each shift leaves the engine in its band, and whether the car is settled when it comes. */
import {eachStraight} from '../run-row.ts';
import {checkOf, type Reading, type RowCheck, shiftPart, worseOf} from './check.ts';

/** RPM after the interruption against the bottom of the band. */
export const afterShift: RowCheck = (row, {plan}) => {
	const bound = plan.band.lowRpm;
	let worst: Reading | undefined;
	eachStraight(row, ({place, result}, {condition}) => {
		for (const {from, rpmAfter} of result.shifts) {
			worst = worseOf(worst, {
				verdict: rpmAfter < bound ? 'near' : 'pass',
				value: rpmAfter,
				bound,
				margin: rpmAfter - bound,
				place: place.name,
				part: shiftPart(from),
				situation: condition.name,
			});
		}
	});
	return checkOf('afterShift', worst);
};

/** Time from the exit to a shift's start, and from its end to the end of full throttle, each against its margin. */
export const settle: RowCheck = (row, {plan}) => {
	const {settleStartS, settleEndS} = plan.car.margins;
	let worst: Reading | undefined;
	eachStraight(row, ({place, result}, {condition}) => {
		for (const {from, timeS, leftS} of result.shifts) {
			const late = leftS - settleEndS < timeS - settleStartS;
			const [value, bound] = late ? [leftS, settleEndS] : [timeS, settleStartS];
			worst = worseOf(worst, {
				verdict: value < bound ? 'near' : 'pass',
				value,
				bound,
				margin: value - bound,
				place: place.name,
				part: shiftPart(from),
				situation: condition.name,
				remark: late ? 'before the end' : 'after the exit',
			});
		}
	});
	return checkOf('settle', worst);
};
