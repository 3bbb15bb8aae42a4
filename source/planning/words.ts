/**
 * Numbers inside sentences: reasons, remarks and faults. A sentence is the same in every answer, so it says speeds and lengths
 * in the units of the track and in metric ones.
 */
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

const kilometerM = 1000;
const hourS = 3600;

/** "116.0 mph (186.7 km/h)" */
export function speedText(speedMps: number): string {
	return `${(speedMps / mphMps).toFixed(1)} mph (${((speedMps * hourS) / kilometerM).toFixed(1)} km/h)`;
}

/** "650 ft (198 m)" */
export function lengthText(lengthM: number): string {
	return `${grouped(lengthM / footM)} ft (${grouped(lengthM)} m)`;
}

/** Below it a tenth counts. */
const shortTo = 10;

/** "1200 miles (1931 km)", "0.9 miles (1.5 km)" */
export function longLengthText(lengthM: number): string {
	const text = (value: number) => (value < shortTo ? value.toFixed(1) : grouped(value));
	return `${text(lengthM / mileM)} miles (${text(lengthM / kilometerM)} km)`;
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
