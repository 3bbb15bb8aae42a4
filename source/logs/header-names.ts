/** What people call the channels in the headers of their logs. */
import type {ChannelName} from './channels.ts';

/**
 * Spellings as `nameKey` leaves them. A channel is looked for among the first ones; only where none of them is in the log,
 * among the next. Two of the same rank are a choice that only a person can make.
 */
const spellings: Record<ChannelName, readonly string[]> = {
	time: [
		'time, elapsed, elapsedtime, sessiontime, logtime, logtimer, runtime, runningtime, totaltime, recordtime, timesincestart, seconds, milliseconds',
		'timestamp, utctime, utc, gpstime, timeofday, clock, clocktime, datetime, unixtime, epoch, localtime',
		't',
	],
	distance: [
		'distance, dist, totaldistance, totaldist, sessiondistance, distancetraveled, distancetravelled, odometer, odo, cumulativedistance, runningdistance, gpsdistance, distancegps',
		'lapdistance, lapdist, distanceonlap, distanceinlap, distancelap, trackdistance, trackposition',
		's',
	],
	speed: [
		'speed, spd, carspeed, vehiclespeed, vehspeed, gpsspeed, speedgps, groundspeed, gpsgroundspeed, speedoverground, roadspeed, wheelspeed, speedwheel, drivenwheelspeed, rearwheelspeed, frontwheelspeed, rearspeed, frontspeed, driveshaftspeed, velocity, vel, gpsvelocity, ecuspeed, radarspeed, opticalspeed, averagespeed, correctedspeed',
		'wheelspeedfl, wheelspeedfr, wheelspeedrl, wheelspeedrr, wheelspeedlf, wheelspeedrf, wheelspeedlr, flwheelspeed, frwheelspeed, rlwheelspeed, rrwheelspeed, lfwheelspeed, rfwheelspeed, lrwheelspeed, speedfl, speedfr, speedrl, speedrr, speedlf, speedrf, speedlr, wheelspeedfrontleft, wheelspeedfrontright, wheelspeedrearleft, wheelspeedrearright, leftfrontwheelspeed, rightfrontwheelspeed, leftrearwheelspeed, rightrearwheelspeed',
		'v',
	],
	rpm: [
		'rpm, rpms, enginerpm, rpmengine, engrpm, enginespeed, engspeed, enginerevs, revs, crankrpm, crankspeed, crankshaftspeed, motorrpm, motorspeed, ecurpm, tach, tachometer, nengine, nmot',
		'n',
	],
	throttle: [
		'throttle, throttleposition, throttlepos, throttleangle, throttlepedal, throttlepct, throttlepercent, thr, thrpos, tps, tpspct, accelerator, acceleratorposition, acceleratorpedal, acceleratorpedalposition, accelpedal, accelpedalpos, pedal, pedalposition, pedalpos, gas, gaspedal',
	],
	gear: [
		'gear, gearposition, gearpos, currentgear, gearnumber, gearno, gearnum, gearselected, selectedgear, gearengaged, gearactual, actualgear',
		'calculatedgear, gearcalculated, calcgear, gearcalc, estimatedgear, gearestimated',
	],
	lap: ['lap, laps, lapnumber, lapno, lapnum, lapnr, lapcount, lapcounter, currentlap, lapindex'],
	brake: [
		'brake, brakes, brakepressure, brakepress, brakepres, brakeposition, brakepos, brakepedal, brakepedalposition, brakepct, brakepercent, brakeforce',
		'brakepressurefront, brakepressurerear, frontbrakepressure, rearbrakepressure, brakepressfront, brakepressrear, brakepressf, brakepressr, brakefront, brakerear, frontbrake, rearbrake, fbrake, rbrake',
		'brakeswitch, brakelight, brakeon',
	],
	steering: [
		'steering, steer, steeringangle, steerangle, steeringwheel, steeringwheelangle, steeringwheelposition, steeringposition, steeringpos, steeredangle, handwheelangle, wheelangle',
	],
};

type Meaning = {readonly channel: ChannelName; readonly rank: number};

const meanings = new Map<string, Meaning>(
	(Object.entries(spellings) as [ChannelName, readonly string[]][]).flatMap(([channel, ranks]) =>
		ranks.flatMap((list, rank) => list.split(', ').map(key => [key, {channel, rank}] as const)),
	),
);

/** One spelling for `Engine RPM`, `engine_rpm` and `EngineRPM`. */
export function nameKey(name: string): string {
	return name
		.normalize('NFKC')
		.toLowerCase()
		.replace(/[^\p{L}\p{N}]+/gu, '');
}

/** The channel that a name means, and how surely: 0 is the first choice. */
export function meaningOf(name: string): Meaning | undefined {
	return meanings.get(nameKey(name));
}

/** A few names as people would write them, for messages. */
export const usualNames: Record<ChannelName, string> = {
	time: 'Time, Elapsed time',
	distance: 'Distance, Odometer',
	speed: 'Speed, GPS speed, Wheel speed',
	rpm: 'RPM, Engine speed',
	throttle: 'Throttle, TPS',
	gear: 'Gear',
	lap: 'Lap, Lap number',
	brake: 'Brake, Brake pressure',
	steering: 'Steering, Steering angle',
};
