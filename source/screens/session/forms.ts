/** The form of a document, and what its reader says of it; each made once a content. */

import type {JsonObject} from '../../documents/json.ts';
import {checkCar, checkTrack, type Problem, type Reading} from '../../documents/read.ts';
import {carSchema, trackSchema} from '../../documents/schema.ts';
import type {Car} from '../../drivetrain/car.ts';
import type {Track} from '../../drivetrain/track.ts';
import type {Kind} from './documents.ts';
import type {Schema} from './field-kind.ts';
import {type Field, type Form, formOf, type Section} from './form.ts';
import type {FieldPlace} from './session.ts';

/** What was made of the latest documents: the history holds every earlier state, and what is made of one is larger than it. */
const keptResults = 4;

const once = <T>(make: (json: JsonObject) => T) => {
	const made: {readonly json: JsonObject; readonly result: T}[] = [];
	return (json: JsonObject): T => {
		const known = made.find(one => one.json === json);
		if (known !== undefined) return known.result;
		const result = make(json);
		made.unshift({json, result});
		made.length = Math.min(made.length, keptResults);
		return result;
	};
};

export const readTrackOf: (json: JsonObject) => Reading<Track> = once(json => checkTrack({...json}));
export const readCarOf: (json: JsonObject) => Reading<Car> = once(json => checkCar({...json}));

export function problemsOf(kind: Kind, json: JsonObject): readonly Problem[] {
	const reading = kind === 'track' ? readTrackOf(json) : readCarOf(json);
	return reading.ok ? [] : reading.problems;
}

let schemas: Record<Kind, Schema> | undefined;
const schemaOf = (kind: Kind): Schema => {
	schemas ??= {track: trackSchema() as Schema, car: carSchema() as Schema};
	return schemas[kind];
};

const forms: Record<Kind, (json: JsonObject) => Form> = {
	track: once(json => formOf(schemaOf('track'), json, 'track')),
	car: once(json => formOf(schemaOf('car'), json, 'car')),
};
export const formFor = (kind: Kind, json: JsonObject): Form => forms[kind](json);

/** The nearest place that the form has. */
export function inside(form: Form, {section, row, column}: FieldPlace): FieldPlace {
	const within = (value: number, count: number) => Math.max(0, Math.min(value, count - 1));
	const atSection = within(section, form.length);
	const rows = form[atSection]?.rows ?? [];
	const atRow = within(row, rows.length);
	return {section: atSection, row: atRow, column: within(column, rows[atRow]?.length ?? 0)};
}

export const sectionAt = (form: Form, {section}: FieldPlace): Section | undefined => form[section];
export const fieldAt = (form: Form, {section, row, column}: FieldPlace): Field | undefined =>
	form[section]?.rows[row]?.[column];
