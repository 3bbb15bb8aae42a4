/** What the engine goes through in a mean lap, and in a race. */
import type {Row} from '../planning/results.ts';
import type {EngineLife} from './results.ts';
import {cellsOf, type Tally} from './tally.ts';

/** `laps` of the race; null where not known. */
export function engineLifeOf(row: Row, tally: Tally, laps: number | null): EngineLife {
	const race = (perLap: number) => (laps === null ? null : laps * perLap);
	const {timeS, turns, aboveS} = tally;
	return {
		pair: row.pair,
		gearbox: row.gearbox,
		installed: row.installed,
		verdict: row.verdict,
		lapS: timeS,
		raceS: race(timeS),
		turnsPerLap: turns,
		turnsPerRace: race(turns),
		aboveLapS: aboveS,
		aboveRaceS: race(aboveS),
		meanRpm: (60 * turns) / timeS,
		highestRpm: tally.highestRpm,
		fullThrottleS: tally.throttleS.full,
		partThrottleS: tally.throttleS.part,
		dwell: cellsOf(tally).map(({gear, fromRpm, toRpm, timeS: lapS}) => ({
			gear,
			fromRpm,
			toRpm,
			lapS,
			raceS: race(lapS),
		})),
	};
}
