/** The form: its sections on the left, the fields of one of them beside it, and below what the field takes and what was understood. */

import {type JsonObject, valueAt} from '../../documents/json.ts';
import type {UnitSystem} from '../../text/units.ts';
import {displayWidth, wrap} from '../../text/width.ts';
import {listWindow} from '../parts/list-window.ts';
import {beside, blank, line, type Piece, type Pieces, padded, piece, tall} from '../parts/pieces.ts';
import {current} from '../session/documents.ts';
import {wrongAt} from '../session/edit-field.ts';
import type {Field, Section} from '../session/form.ts';
import {fieldAt, formFor, inside, problemsOf} from '../session/forms.ts';
import type {Place, Session} from '../session/session.ts';
import {inOtherUnits, understand, valueText} from '../session/understand.ts';
import {caretPieces} from './caret.ts';

type Edit = Place & {at: 'edit'};

const widestSections = 30;
const footHeight = 3;

type Given = {
	readonly edit: Edit;
	readonly json: JsonObject;
	readonly shipped: JsonObject | undefined;
	readonly units: UnitSystem;
};

export function editView(session: Session, place: Edit, width: number, height: number): Pieces[] {
	const document = current(session.history.present, place.kind);
	const form = formFor(place.kind, document.json);
	const edit = {...place, ...inside(form, place)};
	const given = {edit, json: document.json, shipped: document.shipped, units: session.units};
	const section = form[edit.section];
	const sectionsWidth = Math.min(widestSections, Math.max(...form.map(({title}) => displayWidth(title))) + 4);
	const fieldsWidth = width - sectionsWidth - 3;
	const body = height - footHeight - 1;
	const left = sectionLines(form, edit, given, body, sectionsWidth);
	const right = section === undefined ? [] : fieldLines(section, given, fieldsWidth, body);
	return [
		...tall(beside(left, sectionsWidth, right, '│'), body),
		line('─'.repeat(width), 'muted'),
		...tall(footLines(fieldAt(form, edit), given, width), footHeight),
	];
}

function sectionLines(form: readonly Section[], edit: Edit, {json}: Given, height: number, width: number): Pieces[] {
	const problems = problemsOf(edit.kind, json);
	const {start, end} = listWindow(form.length, edit.section, height);
	return form.slice(start, end).map(({title, rows}, i): Pieces => {
		const isHere = start + i === edit.section;
		const wrong = rows.some(row => row.some(field => wrongAt(edit.kind, json, field) !== undefined));
		const mark = problems.length > 0 && wrong ? '!' : ' ';
		return [piece(isHere ? '▸' : ' '), piece(mark, 'fail'), padded(title, width - 2, isHere ? 'strong' : 'plain')];
	});
}

function fieldLines(section: Section, given: Given, width: number, height: number): Pieces[] {
	if (section.rows.length === 0) return [line('None yet; a adds one.', 'muted')];
	const head = section.heads === undefined ? [] : [tableHead(section, width)];
	const {start, end} = listWindow(section.rows.length, given.edit.row, height - head.length);
	const lines = section.rows
		.slice(start, end)
		.map((row, i) =>
			section.heads === undefined
				? fieldLine(row[0]!, given, start + i === given.edit.row, section)
				: tableLine(section, row, given, start + i, width),
		);
	return [...head, ...lines];
}

function fieldLine(field: Field, given: Given, isHere: boolean, section: Section): Pieces {
	const labelWidth = Math.min(24, Math.max(...section.rows.map(row => displayWidth(row[0]!.label))));
	const wrong = wrongAt(given.edit.kind, given.json, field);
	const head: Piece[] = [
		piece(isHere ? '▸' : ' '),
		piece(wrong === undefined ? ' ' : '!', 'fail'),
		padded(field.label, labelWidth, isHere ? 'strong' : 'plain'),
		piece(isShipped(field, given) ? '  ' : ' ~', 'strong'),
	];
	if (isHere && given.edit.editing) return [...head, ...caretPieces(given.edit.editing.line)];
	const other = inOtherUnits(field.value, field.kind, given.units);
	const value =
		field.value === undefined ? absentPiece(field) : piece(valueText(field.value), isHere ? 'chosen' : 'plain');
	return [...head, value, piece(other === '' ? '' : `  ${other}`, 'muted')];
}

function absentPiece({needed, unlessGiven}: Field): Piece {
	if (needed) return piece('needed', 'near');
	return piece(unlessGiven === undefined ? '-' : valueText(unlessGiven), 'muted');
}

/** Whether the field stands as the program ships it; a document that is not shipped has nothing to differ from. */
function isShipped({path, value}: Field, {shipped}: Given): boolean {
	return shipped === undefined || JSON.stringify(valueAt(shipped, path)) === JSON.stringify(value);
}

const cellWidth = (section: Section, column: number, width: number): number => {
	const texts = section.rows.map(row => displayWidth(valueText(row[column]?.value)));
	const natural = Math.max(displayWidth(section.heads?.[column] ?? ''), 8, ...texts);
	const most =
		Math.floor((width - 4) / (section.heads?.length ?? 1)) * (column === (section.heads?.length ?? 1) - 1 ? 2 : 1);
	return Math.min(natural, Math.max(8, most));
};

const tableHead = (section: Section, width: number): Pieces => [
	piece('  '),
	...section.heads!.flatMap((head, i) => [padded(head, cellWidth(section, i, width), 'muted'), piece('  ')]),
];

function tableLine(section: Section, row: readonly Field[], {edit, json}: Given, index: number, width: number): Pieces {
	const isHere = index === edit.row;
	const wrong = row.some(field => wrongAt(edit.kind, json, field) !== undefined);
	const cells = row.flatMap((field, column): Piece[] => {
		const size = cellWidth(section, column, width);
		if (isHere && column === edit.column && edit.editing) return [...caretPieces(edit.editing.line), piece('  ')];
		const tone = isHere && column === edit.column ? 'chosen' : 'plain';
		const text = field.value === undefined ? absentPiece(field).text : valueText(field.value);
		return [padded(text, size, field.value === undefined && tone === 'plain' ? 'muted' : tone), piece('  ')];
	});
	return [piece(isHere ? '▸' : ' '), piece(wrong ? '!' : ' ', 'fail'), ...cells];
}

/** What the field takes; while it is typed into, what was understood or what is wrong. */
function footLines(field: Field | undefined, given: Given, width: number): Pieces[] {
	if (field === undefined) return [];
	const help = line(`${field.label}: ${field.help}`, 'muted');
	const {editing} = given.edit;
	if (editing === undefined) {
		const wrong = wrongAt(given.edit.kind, given.json, field);
		return wrong === undefined ? [help] : [...wrapped(wrong, width, 'Wrong'), help];
	}
	if (editing.wrong !== undefined) return wrapped(editing.wrong, width, 'Not taken');
	if (editing.line.text.trim() === '')
		return [line(field.needed ? 'This field is needed.' : 'Enter empties the field.'), help];
	const understood = understand(editing.line.text, field.kind, field.value ?? field.unlessGiven, given.units);
	if (!understood.ok) return wrapped(understood.words, width, 'Not yet');
	return [understood.words === '' ? blank : [piece('Understood ', 'pass'), piece(understood.words)], help];
}

const wrapped = (text: string, width: number, head: string): Pieces[] =>
	wrap(text, width - head.length - 1, 0).map((part, i) =>
		i === 0 ? [piece(head, 'fail'), piece(` ${part}`)] : line(`${' '.repeat(head.length)} ${part}`),
	);
