import {engineFor} from '../../drivetrain/limits.ts';
import {highestBySituation, shiftsByGear, wholeDown, wholeUp} from '../stated-results.ts';
import {type CardSource, cardOf, item} from './card.ts';

export type EngineSheetSource = CardSource & {
	/** Time above an RPM of the builder's choice, where a log or the like tells it. */
	timeAbove?: {rpm: number; seconds: number} | undefined;
};

const caution =
	"The engine builder's limit rules. An estimate: a missed shift or an early downshift can pass the limit whatever the plan says.";

/** For the engine builder. */
export function engineSheet(source: EngineSheetSource): string[] {
	const {row, setting, car, track, timeAbove} = source;
	const limiter = engineFor(car, track.type)?.limiter ?? setting.rpmLimit;
	const highest = highestBySituation(row);
	// What a straight would bring it to, were the ignition not cut: the limit check judges by that.
	const isCut = highest.some(({rpm}) => wholeUp(rpm) > limiter);
	const body = [
		item(`Limit in force (${setting.limitFrom})`, wholeDown(setting.rpmLimit)),
		item('Ignition cut', wholeDown(limiter)),
		isCut ? 'Highest RPM were there no cut, and where' : 'Highest RPM, and where',
		...highest.map(({situation, rpm, at}) => `${item(situation, wholeUp(rpm))}  ${at}`),
		...shiftLines(source),
		...limiterLines(source),
		...(timeAbove ? [item(`Seconds above ${timeAbove.rpm} RPM`, timeAbove.seconds.toFixed(1))] : []),
	];
	return cardOf("ENGINE BUILDER'S SHEET", source, body, caution);
}

function shiftLines({row}: CardSource): string[] {
	const shifts = shiftsByGear(row).map(({from, rpm}) => item(`${from} to ${from + 1}`, wholeDown(rpm)));
	return shifts.length === 0 ? ['No shift is made'] : ['Shift RPM', ...shifts];
}

/** The car is held at one speed while the ignition cuts, so the time is the distance over that speed. */
function limiterLines({row}: CardSource): string[] {
	const held = row.situations.flatMap(({name, straights}) =>
		straights
			.filter(({limiterM}) => limiterM > 0)
			.map(straight => item(`${straight.name} (${name})`, (straight.limiterM / straight.endSpeedMps).toFixed(2))),
	);
	return held.length === 0 ? ['On the limiter: never'] : ['Seconds on the limiter, a lap', ...held];
}
