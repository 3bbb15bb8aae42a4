/** What may happen at the form: moving in it, typing into a field, and changes of the document. */

import type {JsonObject, Path} from '../../documents/json.ts';
import {pathText} from '../../documents/problem.ts';
import {editLine} from '../parts/edit-line.ts';
import type {Action} from './action.ts';
import {current, withJson} from './documents.ts';
import {curveFrom, entryAt, isCurve, withCopy, withCurve, withMoved, withoutEntry} from './edit-entries.ts';
import {asShipped, type Change, cleared, withTyped} from './edit-field.ts';
import {fieldAt, formFor, inside, sectionAt} from './forms.ts';
import {recorded} from './history.ts';
import type {Place, Session} from './session.ts';
import {valueText} from './understand.ts';

type Edit = Place & {at: 'edit'};

export function reduceForm(session: Session, edit: Edit, action: Action): Session {
	const document = current(session.history.present, edit.kind);
	const form = formFor(edit.kind, document.json);
	const here = {...edit, ...inside(form, edit)};
	const section = sectionAt(form, here);
	const field = fieldAt(form, here);
	const entry = entryAt(section, here.row);
	const told = (notice: string): Session => ({...session, notice});
	const at = (place: Edit): Session => ({...session, place});

	switch (action.do) {
		case 'move in form':
			return at(moved(here, action));
		case 'open field':
			return field === undefined
				? session
				: at({...here, editing: {line: editLine(action.text ?? valueText(field.value)), wrong: undefined}});
		case 'put back':
			return at({...here, editing: undefined});
		case 'accept field': {
			if (field === undefined || here.editing === undefined) return session;
			const change = withTyped(edit.kind, document.json, field, here.editing.line.text, session.units);
			if (!change.ok) return at({...here, editing: {...here.editing, wrong: change.words}});
			return withContent(session, {...moved(here, {...action, sections: 0}), editing: undefined}, change.json);
		}
		case 'clear field':
			return field === undefined ? session : changed(session, here, cleared(document.json, field));
		case 'to shipped':
			return field === undefined ? session : changed(session, here, asShipped(document.json, document.shipped, field));
		case 'add entry':
			if (entry === undefined)
				return told('Entries are added to the lists below: straights, situations, pairs and so on.');
			return atEntry(session, here, withCopy(document.json, entry), entry.list, entry.index + 1);
		case 'remove entry':
			if (entry === undefined) return told('This is no entry of a list.');
			return {...withContent(session, here, withoutEntry(document.json, entry)), notice: 'Removed. u undoes it.'};
		case 'move entry':
			if (entry === undefined) return told('This is no entry of a list.');
			return atEntry(session, here, withMoved(document.json, entry, action.by), entry.list, entry.index + action.by);
		case 'paste curve':
			return entry !== undefined && isCurve(entry.list)
				? pasted(session, here, document.json, entry.list, action.text)
				: told('A paste goes into a field, or two columns of RPM and torque into a curve.');
		default:
			return session;
	}
}

type Steps = {readonly sections: number; readonly rows: number; readonly columns: number};

/** A new section starts at its top. What is not there is set right by `inside`. */
function moved(edit: Edit, {sections, rows, columns}: Steps): Edit {
	if (sections !== 0) return {...edit, section: Math.max(0, edit.section + sections), row: 0, column: 0};
	return {...edit, row: Math.max(0, edit.row + rows), column: Math.max(0, edit.column + columns)};
}

function withContent(session: Session, edit: Edit, json: JsonObject): Session {
	const documents = withJson(session.history.present, edit.kind, json);
	const place = {...edit, ...inside(formFor(edit.kind, json), edit)};
	return {...session, history: recorded(session.history, documents), place};
}

function changed(session: Session, edit: Edit, change: Change): Session {
	return change.ok ? withContent(session, edit, change.json) : {...session, notice: change.words};
}

/** The cursor goes along with the entry: to its row of a table, or to its own section. */
function atEntry(session: Session, edit: Edit, json: JsonObject, list: Path, index: number): Session {
	const own = formFor(edit.kind, json).findIndex(
		section => section.list?.entry === index && pathText(section.list.path) === pathText(list),
	);
	return withContent(session, own < 0 ? {...edit, row: index} : {...edit, section: own}, json);
}

function pasted(session: Session, edit: Edit, json: JsonObject, list: Path, text: string): Session {
	const curve = curveFrom(text, session.units === 'us' ? 'lbf ft' : 'N m');
	if (!curve.ok) return {...session, notice: `Not taken: ${curve.words}.`};
	const notice = `${curve.points.length} points taken, torque in ${curve.unit}. u undoes it.`;
	return {...withContent(session, edit, withCurve(json, list, curve.points)), notice};
}
