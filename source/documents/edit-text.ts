/** Edits of a document's text that leave all the rest as it was written: order, indents, line breaks. */
import {applyEdits, type FormattingOptions, findNodeAtLocation, modify, parseTree} from 'jsonc-parser';
import {type Edit, withEdits} from './edits.ts';
import {type Json, type JsonObject, type Path, valueAt} from './json.ts';

/** The text of a document, which must be JSON, with the same edits made. */
export function editText(text: string, edits: readonly Edit[]): string {
	const mark = text.startsWith('\uFEFF') ? '\uFEFF' : '';
	let [edited, json] = [text.slice(mark.length), JSON.parse(text.slice(mark.length)) as JsonObject];
	const formattingOptions = formatOf(edited);
	for (const edit of edits) {
		const next = withEdits(json, [edit]);
		const path = edit.value === undefined ? emptiedBy(edit.path, next) : edit.path;
		if (edit.value !== undefined || valueAt(json, path) !== undefined)
			edited =
				onOneLine(edited, path, edit.value) ??
				applyEdits(edited, modify(edited, [...path], edit.value, {formattingOptions}));
		json = next;
	}
	return mark + edited;
}

/** A group that is written on one line stays on one line; undefined where the field does not stand in one. */
function onOneLine(text: string, path: Path, value: Json | undefined): string | undefined {
	const group = findNodeAtLocation(parseTree(text)!, [...path.slice(0, -1)]);
	if (group?.type !== 'object' || !group.children || group.children.length === 0) return undefined;
	if (text.slice(group.offset, group.offset + group.length).includes('\n')) return undefined;
	const isThere = findNodeAtLocation(group, [path.at(-1)!]) !== undefined;
	if (isThere || value === undefined) return applyEdits(text, modify(text, [...path], value, {}));
	const last = group.children.at(-1)!;
	const end = last.offset + last.length;
	return `${text.slice(0, end)}, ${JSON.stringify(path.at(-1))}: ${JSON.stringify(value)}${text.slice(end)}`;
}

/** The outermost group that is gone with the field. */
function emptiedBy(path: Path, after: JsonObject): Path {
	let gone = path;
	while (gone.length > 1 && valueAt(after, gone.slice(0, -1)) === undefined) gone = gone.slice(0, -1);
	return gone;
}

/** As the text is indented. */
function formatOf(text: string): FormattingOptions {
	const indent = /\n([ \t]+)"/.exec(text)?.[1] ?? '\t';
	const insertSpaces = !indent.startsWith('\t');
	return {insertSpaces, tabSize: insertSpaces ? indent.length : 1, eol: text.includes('\r\n') ? '\r\n' : '\n'};
}
