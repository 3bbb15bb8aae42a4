/** A road speed that changes evenly in time in one gear, off full throttle, as a run of the engine. */
import type {RoadGears} from '../drivetrain/road-gears.ts';
import {engineRpm, speedAtRpmMps} from '../drivetrain/tire.ts';
import {brakePowerW} from './brake-power.ts';
import type {EvenRun} from './even-run.ts';

export type SpeedRun = {
	readonly gear: number;
	readonly fromMps: number;
	readonly toMps: number;
	readonly timeS: number;
	/** `part`: as much power as the change of speed needs; `closed`: none. */
	readonly throttle: 'part' | 'closed';
	readonly steadySlip: number;
};

export function evenSpeed(gears: RoadGears, run: SpeedRun): EvenRun {
	const {gear, fromMps, toMps, timeS, throttle, steadySlip} = run;
	const {rolloutM, growth} = gears.vehicle;
	const overall = gears.train.overall[gear - 1]!;
	const speedAt = (share: number) => fromMps + share * (toMps - fromMps);
	const power = (share: number) => brakePowerW(gears, gear, speedAt(share), (toMps - fromMps) / timeS, steadySlip);
	return {
		gear,
		throttle,
		timeS,
		rpmAt: share => engineRpm(speedAt(share), overall, rolloutM, growth, steadySlip),
		shareAt: rpm => (speedAtRpmMps(rpm, overall, rolloutM, growth, steadySlip) - fromMps) / (toMps - fromMps),
		powerWAt: throttle === 'closed' ? () => 0 : power,
	};
}
