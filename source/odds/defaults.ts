/** How well each number is known unless a document says it. */
import {mphMps} from '../drivetrain/constants.ts';

export type Default = {readonly sd: number; readonly why: string};

/**
 * One standard deviation of each number when nobody has said it, with the reason. Where the model meets speeds measured at
 * the track, what they depend on is known better: `anchored`.
 */
export const defaults = {
	rollout: {sd: 0.0015, why: 'rolled out again, a tire differs by an eighth of an inch (3 mm); so do tires of one set'},
	growth: {
		share: 0.2,
		anchoredShare: 0.1,
		why: 'growth is seldom measured: a fifth of itself; half of that where anchored',
	},
	slip: {sd: 0.004, anchored: 0.002, why: 'full-throttle slip of such tires varies by a few tenths of a point'},
	exit: {sd: 1 * mphMps, why: 'drivers and laps differ by 1 mph (1.6 km/h) at the exit'},
	tow: {share: 0.2, why: 'the drag in a tow depends on the gap: a fifth of the change'},
	situationExit: {sd: 0.5 * mphMps, why: 'how much a situation changes the exit is a guess to 0.5 mph (0.8 km/h)'},
	drag: {sd: 0.02, anchored: 0.01, why: 'drag areas are known to 2 %, where anchored to 1 %'},
	power: {
		sd: 0.015,
		anchored: 0.0075,
		why: 'dynos and engines of one build differ by 1.5 %; half of that where anchored',
	},
	grip: {sd: 0.03, why: 'grip changes by some 3 % with rubber and temperature'},
	temperature: {sd: 2, unknown: 6, why: 'a forecast is good to 2 °C (4 °F); a day that is not given, to 6 °C (11 °F)'},
	pressure: {
		sd: 150,
		unknown: 1500,
		why: 'station pressure moves by 1.5 hPa (0.04 inHg) in hours; a day that is not given is known to 15 hPa (0.44 inHg)',
	},
	windSpeed: {sd: 1, why: 'wind at car height is known to 1 m/s (2.2 mph)'},
	windDirection: {sd: Math.PI / 9, why: 'wind turns by 20 degrees within a session'},
};
