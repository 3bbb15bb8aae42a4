import {expect, test} from 'vitest';
import {valueAt} from '../../../source/documents/json.ts';
import {current, isChanged, unsaved} from '../../../source/screens/session/documents.ts';
import {marginEntry} from '../../../source/screens/session/reduce.ts';
import type {Place, Session} from '../../../source/screens/session/session.ts';
import {keyEvent} from '../../../source/screens/terminal/key-event.ts';
import {after, car, documents, other, oval, session, typed} from './documents.ts';

/** The exit of the front straight. */
const exit: Place = {at: 'edit', kind: 'track', section: 1, row: 1, column: 0, editing: undefined};
const exitOf = ({history}: Session) => valueAt(current(history.present, 'track').json, ['straights', 0, 'exit']);
const editing = ({place}: Session) => (place.at === 'edit' ? place.editing : undefined);
const accept = {do: 'accept field', rows: 0, columns: 0} as const;

test('a field is opened with what stands there, and accepted', () => {
	const opened = after(session({place: exit}), {do: 'open field'});
	expect(editing(opened)?.line).toEqual({text: '76 mph', caret: 6});
	const changed = after(opened, {do: 'type', event: keyEvent('u', {ctrl: true})}, ...typed('80 mph'), accept);
	expect(exitOf(changed)).toBe('80 mph');
	expect(editing(changed)).toBeUndefined();
	expect(isChanged(current(changed.history.present, 'track'))).toBe(true);
});

test('a number typed on a field gets the unit that stood there', () => {
	expect(exitOf(after(session({place: exit}), {do: 'open field', text: '8'}, ...typed('1'), accept))).toBe('81 mph');
});

test('what is wrong is not taken: the field stays open and says why', () => {
	const refused = after(session({place: exit}), {do: 'open field', text: '8'}, ...typed('000 mph'), accept);
	expect(editing(refused)).toEqual({
		line: {text: '8000 mph', caret: 8},
		wrong: 'found "8000 mph"; allowed more than 0 mph and at most 447.4 mph',
	});
	expect(refused.history.past).toEqual([]);
	expect(editing(after(refused, {do: 'type', event: keyEvent('backspace')}))?.wrong).toBeUndefined();
});

test('putting back leaves the field as it was', () => {
	const back = after(session({place: exit}), {do: 'open field', text: '9'}, {do: 'put back'});
	expect(exitOf(back)).toBe('76 mph');
	expect(editing(back)).toBeUndefined();
});

test('accepting can go on to the next field', () => {
	const next = after(session({place: exit}), {do: 'open field', text: '8'}, ...typed('0'), {
		do: 'accept field',
		rows: 1,
		columns: 0,
	});
	expect(next.place).toMatchObject({section: 1, row: 2});
});

test('the same value is no change', () => {
	const same = after(session({place: exit}), {do: 'open field'}, accept);
	expect(same.history.past).toEqual([]);
	expect(unsaved(same.history.present)).toEqual([]);
});

test('an optional field is emptied, one that is needed is not', () => {
	const lap: Place = {...exit, section: 0, row: 2};
	const emptied = after(session({place: lap}), {do: 'clear field'});
	expect(current(emptied.history.present, 'track').json).not.toHaveProperty('lap');
	expect(after(session({place: exit}), {do: 'clear field'}).notice).toBe('exit is needed');
	const typedNothing = after(session({place: exit}), {do: 'open field', text: ''}, accept);
	expect(editing(typedNothing)?.wrong).toBe('exit is needed');
});

test('half of two fields that come together is taken, and the other half is what is then wrong', () => {
	const entry: Place = {...exit, section: 2, row: 5};
	const half = after(session({place: entry}), {do: 'open field', text: '7'}, ...typed('8 mph'), accept);
	expect(valueAt(current(half.history.present, 'track').json, ['straights', 1, 'entry'])).toBe('78 mph');
});

test('undo and redo go back and forth without limit, and a new change ends redoing', () => {
	let now = session({place: exit});
	for (let speed = 60; speed < 100; speed++)
		now = after(now, {do: 'open field', text: ''}, ...typed(`${speed} mph`), accept);
	expect(exitOf(now)).toBe('99 mph');
	for (let i = 0; i < 40; i++) now = after(now, {do: 'undo'});
	expect(exitOf(now)).toBe('76 mph');
	expect(after(now, {do: 'undo'}).notice).toBe('Nothing to undo.');
	now = after(now, {do: 'redo'}, {do: 'redo'});
	expect(exitOf(now)).toBe('61 mph');
	const changed = after(now, {do: 'open field', text: ''}, ...typed('70 mph'), accept);
	expect(after(changed, {do: 'redo'}).notice).toBe('Nothing to redo.');
});

test('undone to what was saved there is nothing unsaved', () => {
	const changed = after(session({place: exit}), {do: 'open field', text: ''}, ...typed('80 mph'), accept);
	expect(unsaved(changed.history.present).map(({id}) => id)).toEqual(['track:oval']);
	expect(unsaved(after(changed, {do: 'undo'}).history.present)).toEqual([]);
});

test('a field goes back to its shipped value', () => {
	const changed = after(session({place: exit}), {do: 'open field', text: ''}, ...typed('80 mph'), accept);
	expect(exitOf(after(changed, {do: 'to shipped'}))).toBe('76 mph');
});

test('an entry is added as a copy with a name of its own, moved and removed; the cursor goes with it', () => {
	const added = after(session({place: exit}), {do: 'add entry'});
	const names = (now: Session) =>
		(current(now.history.present, 'track').json.straights as {name: string}[]).map(({name}) => name);
	expect(names(added)).toEqual(['Front', 'Front 2', 'Back']);
	expect(added.place).toMatchObject({section: 2});
	const moved = after(added, {do: 'move entry', by: 1});
	expect(names(moved)).toEqual(['Front', 'Back', 'Front 2']);
	expect(moved.place).toMatchObject({section: 3});
	expect(names(after(moved, {do: 'remove entry'}))).toEqual(['Front', 'Back']);
});

test('pairs are added to the rack row by row', () => {
	const pairs: Place = {at: 'edit', kind: 'car', section: 0, row: 0, column: 0, editing: undefined};
	const at = after(session({place: pairs}), {do: 'move in form', sections: 8, rows: 0, columns: 0});
	const added = after(at, {do: 'add entry'});
	expect(valueAt(current(added.history.present, 'car').json, ['rack', 'pairs', 1])).toEqual({driving: 37, driven: 34});
	expect(added.place).toMatchObject({row: 1});
});

test('two columns from a dyno sheet become the curve', () => {
	const curve: Place = {at: 'edit', kind: 'car', section: 2, row: 0, column: 0, editing: undefined};
	const pasted = after(session({place: curve}), {
		do: 'paste curve',
		text: 'rpm\tN m\r\n5000\t560\r\n4000\t540\r\n6000\t575\r\n',
	});
	expect(valueAt(current(pasted.history.present, 'car').json, ['engines', 0, 'curve'])).toEqual([
		{rpm: 4000, torque: '540 N m'},
		{rpm: 5000, torque: '560 N m'},
		{rpm: 6000, torque: '575 N m'},
	]);
	expect(pasted.notice).toBe('3 points taken, torque in N m. u undoes it.');
	expect(after(session({place: curve}), {do: 'paste curve', text: 'one two'}).notice).toBe(
		'Not taken: 0 lines of RPM and torque; at least 3 are needed.',
	);
	expect(after(session({place: exit}), {do: 'paste curve', text: '1 2'}).history.past).toEqual([]);
});

test('the pair under the cursor is put in the car, and that can be undone', () => {
	const installed = after(session(), {do: 'install', pair: '35/36', gearbox: 'B'});
	expect(current(installed.history.present, 'car').json.installed).toEqual({pair: '35/36', gearbox: 'B'});
	expect(current(after(installed, {do: 'undo'}).history.present, 'car').json).toBe(car.json);
});

test('another track keeps what was changed in this one', () => {
	const changed = after(session({place: exit}), {do: 'open field', text: ''}, ...typed('80 mph'), accept);
	const elsewhere = after(changed, {do: 'take', document: other});
	expect(current(elsewhere.history.present, 'track').id).toBe('track:other');
	expect(unsaved(elsewhere.history.present).map(({id}) => id)).toEqual(['track:oval']);
	expect(exitOf(after(elsewhere, {do: 'take', document: oval}))).toBe('80 mph');
});

test('a plan and a situation do not carry over to another track', () => {
	const there = after(session({plan: '36/36 A', situation: 'In the tow'}), {do: 'take', document: other});
	expect(there).toMatchObject({plan: undefined, situation: undefined, place: {at: 'ranking'}});
});

test('a document from nothing opens at its form', () => {
	const started = after(session(), {do: 'start new', kind: 'track'});
	expect(started.place).toMatchObject({at: 'edit', kind: 'track', section: 0});
	expect(current(started.history.present, 'track')).toMatchObject({from: 'new', saved: undefined});
	expect(current(after(started, {do: 'start new', kind: 'track'}).history.present, 'track').id).toBe('track:new 2');
});

test('what was saved is what changes are counted from, also after undoing', () => {
	const changed = after(session({place: exit}), {do: 'open field', text: ''}, ...typed('80 mph'), accept);
	const saved = after(changed, {do: 'saved', document: current(changed.history.present, 'track'), plan: undefined});
	expect(unsaved(saved.history.present)).toEqual([]);
	expect(unsaved(after(saved, {do: 'undo'}).history.present).map(({id}) => id)).toEqual(['track:oval']);
});

test('the least margin is typed, worked out, refused or emptied', () => {
	const asked = session({over: marginEntry(session())});
	expect(after(asked, ...typed('100+50'), {do: 'accept margin'}).filter.leastMarginRpm).toBe(150);
	expect(after(asked, ...typed('much'), {do: 'accept margin'}).over).toMatchObject({
		wrong: expect.stringContaining('allowed RPM'),
	});
	expect(after(asked, {do: 'accept margin'})).toMatchObject({over: undefined, filter: {leastMarginRpm: undefined}});
});

test('a notice lasts until the next key', () => {
	expect(after(session(), {do: 'tell', notice: 'Saved.'}, {do: 'read in', units: 'metric'}).notice).toBeUndefined();
});

test('recovering an earlier session is a change like any other', () => {
	const earlier = after(session({place: exit}), {do: 'open field', text: ''}, ...typed('80 mph'), accept).history
		.present;
	const recovered = after(session(), {do: 'recover', documents: earlier});
	expect(exitOf(recovered)).toBe('80 mph');
	expect(after(recovered, {do: 'undo'}).history.present).toBe(documents);
});
