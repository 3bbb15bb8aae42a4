/** What all cards have in common: whose numbers they are, for which day, and the caution. */
import {visible} from '../../documents/visible.ts';
import type {Car} from '../../drivetrain/car.ts';
import type {Air, Track} from '../../drivetrain/track.ts';
import type {Row, RpmTable, Setting} from '../../planning/results.ts';

export type UnitSystem = 'us' | 'metric';

export type CardSource = {
	/** As its document says, with the whole rack. */
	car: Car;
	track: Track;
	/** The row chosen, run in every situation, with its setting and its RPM table. */
	row: Row;
	setting: Setting;
	table: Pick<RpmTable, 'points'>;
	/** YYYY-MM-DD. */
	day: string;
	units: UnitSystem;
};

/** At most so many columns, as for the plan's text. */
const columns = 60;

export const estimate =
	"An estimate, to be checked against practice. The engine builder's limit, the rule book and the track's officials decide.";

/** The lines of a card: title, car, day, anchor and what the plan fails above, the caution below. No character in it moves the cursor. */
export function cardOf(title: string, source: CardSource, body: readonly string[], caution: string): string[] {
	const {car, track, row, setting, day, units} = source;
	const heading = [
		title,
		`${car.name} at ${track.name}`,
		`Day ${day}: ${airText(track.air, units)}`,
		`Pair ${row.pair}, gearbox ${row.gearbox}, engine ${setting.engine}`,
		setting.anchored
			? 'Anchored to speeds measured here.'
			: 'Not anchored: no measured speed here that the model meets.',
		...(row.verdict === 'fail' ? [`FAILS A CHECK. ${row.reason}`] : []),
	];
	return [...heading, '', ...body, '', caution].flatMap(line => wrap(visible(line)));
}

/** Broken at blanks; later lines as far in as the first and two more. */
function wrap(text: string): string[] {
	const inset = /^ */.exec(text)![0];
	const lines: string[] = [];
	let line = '';
	for (const word of text.split(/(?<=\S)(?= )/)) {
		if (line !== '' && line.length + word.length > columns) {
			lines.push(line);
			line = `${inset}  ${word.trimStart()}`;
		} else line += word;
	}
	return [...lines, line];
}

/** The reference day of SAE J1349 where a track has no air: 25 °C, 990 hPa, dry. */
const reference = {temperatureC: 25, pressurePa: 99_000};
const inchOfMercuryPa = 3386.388640341;

function airText(air: Air | undefined, units: UnitSystem): string {
	const {temperatureC = reference.temperatureC, pressurePa = reference.pressurePa} = air ?? {};
	const metric = units === 'metric';
	const temperature = metric ? `${temperatureC.toFixed(0)}°C` : `${(temperatureC * 1.8 + 32).toFixed(0)}°F`;
	const pressure = metric
		? `${(pressurePa / 100).toFixed(0)} hPa`
		: `${(pressurePa / inchOfMercuryPa).toFixed(2)} inHg`;
	return `${temperature}, ${pressure}`;
}

const mphMps = 0.44704;
const kmhMps = 1 / 3.6;
export function speedText(speedMps: number, units: UnitSystem): string {
	return units === 'metric' ? `${(speedMps / kmhMps).toFixed(1)} km/h` : `${(speedMps / mphMps).toFixed(1)} mph`;
}

const mileM = 1609.344;
export function distanceText(lengthM: number, units: UnitSystem): string {
	return units === 'metric' ? `${(lengthM / 1000).toFixed(0)} km` : `${(lengthM / mileM).toFixed(0)} miles`;
}

/** A label and a number in columns. */
export function item(label: string, value: string | number, width = 28): string {
	return `  ${label.padEnd(width)} ${String(value).padStart(7)}`;
}

/** Rounded down to a step: what is driven by is never above what was computed. */
export function downTo(step: number, value: number): number {
	return Math.floor((value + noiseRpm) / step) * step;
}

/** Floating-point noise of a speed turned into RPM and back. */
const noiseRpm = 1e-6;
