/** Numbers inside sentences: reasons, remarks and faults. Speeds in mph, lengths in ft, as they are read at the track. */
import {footM, mileM, mphMps} from '../drivetrain/constants.ts';

/** "8820", "12,400": no decimals; thousands are set apart from five digits on, as a tachometer has four. */
export function grouped(value: number): string {
	const digits = Math.round(value).toString();
	return digits.length < 5 ? digits : digits.replace(/\B(?=(\d{3})+$)/g, ',');
}

/** An RPM that was turned into a speed and back is the same to within this. */
export const roundingRpm = 1e-6;

/** A highest RPM: rounded up, so that no one reads less than the engine turns. */
export function highestText(rpm: number): string {
	return grouped(Math.ceil(rpm - roundingRpm));
}

/** A margin in rpm: rounded down. */
export function marginText(rpm: number): string {
	return grouped(Math.floor(rpm + roundingRpm));
}

/** "9310 rpm" */
export function rpmText(rpm: number): string {
	return `${grouped(rpm)} rpm`;
}

/** "116.0 mph" */
export function mphText(speedMps: number): string {
	return `${(speedMps / mphMps).toFixed(1)} mph`;
}

/** "650 ft" */
export function feetText(lengthM: number): string {
	return `${grouped(lengthM / footM)} ft`;
}

/** "1200 miles" */
export function milesText(lengthM: number): string {
	return `${grouped(lengthM / mileM)} miles`;
}

/** "0.021 s" */
export function secondsText(timeS: number): string {
	if (timeS < 0.0005) return 'under 0.001 s';
	return `${timeS.toFixed(3)} s`;
}

/** "1 shift", "2 shifts" */
export function counted(count: number, singular: string, plural = `${singular}s`): string {
	return `${grouped(count)} ${count === 1 ? singular : plural}`;
}

/** "a", "a and b", "a, b and c" */
export function listed(names: readonly string[]): string {
	if (names.length < 2) return names.join('');
	return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

/** A place with the situation where it is not the track as it stands: "Front end (In the tow)". */
export function placeText(at: string, situation: string): string {
	return situation === '' || situation === baseName ? at : `${at} (${situation})`;
}

/** The track as it stands. */
export const baseName = 'Base';
