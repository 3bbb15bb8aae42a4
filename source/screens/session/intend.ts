/** From the name of what a key does to what happens to the session, or outside of it. */
import type {Ranked} from '../../planning/rank-rack.ts';
import type {ActionName} from '../keys/key-table.ts';
import {editLine} from '../parts/edit-line.ts';
import type {Action} from './action.ts';
import {aheadBy, changedAhead, gearsPlace, loadPlace} from './ahead-place.ts';
import type {Choice} from './catalog.ts';
import {current, unsaved} from './documents.ts';
import type {Effect} from './effect.ts';
import {fileNameFor, items} from './hand-over.ts';
import {cleared, gripToo, paneBy, seenEntry} from './intend-practice.ts';
import {rowBy, stepTo} from './intend-rows.ts';
import {entryFor, next} from './intents.ts';
import {practiceOf} from './practice-of.ts';
import {marginEntry} from './reduce.ts';
import {practicePlace} from './reduce-practice.ts';
import {riskEntry} from './reduce-risk.ts';
import {takeInPlace} from './reduce-take-in.ts';
import {cursorIn, orders, type Placed} from './rows.ts';
import {type Place, pictures, type Session} from './session.ts';

/** What a key's meaning may depend on beside the session. */
export type Scene = {
	readonly ranked: Ranked | undefined;
	/** All rows, and those that are shown in their order. */
	readonly all: readonly Placed[];
	readonly shown: readonly Placed[];
	readonly situations: readonly string[];
	readonly choices: readonly Choice[];
	readonly isWorking: boolean;
	/** Lines that the cursor of the practice moves over. */
	readonly practiceLines: number;
	readonly isReadingLog: boolean;
};

const tenRows = 10;
const scrollLines = 8;

export function intend(name: ActionName, session: Session, scene: Scene): Action | Effect | undefined {
	const {place, over} = session;
	const here = scene.shown[cursorIn(scene.shown, session.row)];
	switch (name) {
		case 'row up':
			return rowBy(session, scene, -1);
		case 'row down':
			return rowBy(session, scene, 1);
		case 'page up':
			return rowBy(session, scene, -tenRows);
		case 'page down':
			return rowBy(session, scene, tenRows);
		case 'first row':
			return rowBy(session, scene, Number.NEGATIVE_INFINITY);
		case 'last row':
			return rowBy(session, scene, Number.POSITIVE_INFINITY);
		case 'shorter':
			return stepTo(scene, here, 1);
		case 'taller':
			return stepTo(scene, here, -1);
		case 'compare':
			return here && {do: 'compareWith', row: session.comparison === here.name ? undefined : here.name};
		case 'plan':
			return here && {do: 'plan', row: session.plan === here.name ? undefined : here.name};
		case 'install':
			return here && {do: 'install', pair: here.row.pair, gearbox: here.row.gearbox};
		case 'next order':
			return {do: 'order', order: next(orders, session.order, 1)};
		case 'hide failing':
			return {do: 'filter', filter: {...session.filter, hideFailing: !session.filter.hideFailing}};
		case 'next gearbox': {
			const sets = [...new Set(scene.all.map(({row}) => row.gearbox))].sort();
			return {
				do: 'filter',
				filter: {...session.filter, gearbox: next([undefined, ...sets], session.filter.gearbox, 1)},
			};
		}
		case 'least margin':
			return {do: 'cover', over: marginEntry(session)};
		case 'risk':
			return {do: 'cover', over: riskEntry(session)};
		case 'accept risk':
			return {do: 'accept risk'};
		case 'accept margin':
			return {do: 'accept margin'};
		case 'next situation':
			return {do: 'situate', situation: next([undefined, ...scene.situations], session.situation, 1)};
		case 'previous situation':
			return {do: 'situate', situation: next([undefined, ...scene.situations], session.situation, -1)};
		case 'why':
			return {do: 'go', place: {at: 'why', scroll: 0}};
		case 'life':
			return {do: 'go', place: {at: 'life', scroll: 0}};
		case 'odds':
			return {do: 'go', place: {at: 'odds', scroll: 0}};
		case 'ranking':
			return place.at === 'ranking' ? (scene.isWorking ? 'stop' : undefined) : {do: 'go', place: {at: 'ranking'}};
		case 'pictures':
			return {do: 'go', place: {at: 'pictures', picture: 'rpm', straight: 0}};
		case 'next picture':
			return pictureBy(place, 1);
		case 'previous picture':
			return pictureBy(place, -1);
		case 'next straight':
			return straightBy(place, scene, 1);
		case 'previous straight':
			return straightBy(place, scene, -1);
		case 'scroll up':
			return {do: 'scroll', by: -scrollLines};
		case 'scroll down':
			return {do: 'scroll', by: scrollLines};
		case 'item up':
			return itemBy(place, -1);
		case 'item down':
			return itemBy(place, 1);
		case 'name file':
			return place.at === 'hand over' ? entryFor('file', fileNameFor(session.history.present, place.item)) : undefined;
		case 'write notes':
			return entryFor('notes', current(session.history.present, 'track').notes ?? '');
		case 'name directory':
			return entryFor('directory', '');
		case 'accept entry':
			return accepted(over);
		case 'other name':
			return over?.is === 'overwriting' ? entryFor('file', over.file) : undefined;
		case 'take in':
			return {do: 'go', place: takeInPlace};
		case 'draft up':
			return {do: 'move in draft', by: -1};
		case 'draft down':
			return {do: 'move in draft', by: 1};
		case 'practice':
			return {do: 'go', place: practicePlace};
		case 'leave practice':
			return scene.isReadingLog ? 'stop log' : {do: 'go', place: {at: 'ranking'}};
		case 'practice up':
			return {do: 'move in practice', by: -1, count: scene.practiceLines};
		case 'practice down':
			return {do: 'move in practice', by: 1, count: scene.practiceLines};
		case 'next pane':
			return paneBy(session, 1);
		case 'previous pane':
			return paneBy(session, -1);
		case 'practice enter':
			return place.at !== 'practice' ? undefined : place.pane === 'changes' ? 'accept this' : seenEntry(session);
		case 'name log':
			return entryFor('log', '');
		case 'hold other':
			return {do: 'hold', held: practiceOf(session).held === 'speed' ? 'circumference' : 'speed'};
		case 'grip too':
			return gripToo(session);
		case 'clear number':
			return cleared(session);
		case 'differences':
			return {do: 'go', place: {at: 'differences', kind: 'track', scroll: 0}};
		case 'other document':
			return place.at === 'differences'
				? {do: 'go', place: {at: 'differences', kind: place.kind === 'track' ? 'car' : 'track', scroll: 0}}
				: undefined;
		case 'whole to shipped':
			return {do: 'whole to', which: 'shipped'};
		case 'whole to saved':
			return {do: 'whole to', which: 'saved'};
		case 'forget':
			return forget(session);
		case 'load':
			return {do: 'go', place: loadPlace};
		case 'gears':
			return {do: 'go', place: gearsPlace};
		case 'ahead up':
			return aheadBy(place, scene.choices.length, -1);
		case 'ahead down':
			return aheadBy(place, scene.choices.length, 1);
		case 'toggle ahead': {
			const choice = 'cursor' in place ? scene.choices[place.cursor] : undefined;
			return choice && {do: 'toggle ahead', id: choice.document.id};
		}
		case 'more shorter':
		case 'more taller':
		case 'each set':
		case 'one set for all':
			return changedAhead(name, place);
		case 'edit':
			return {do: 'go', place: formOf('track')};
		case 'other form':
			return {do: 'go', place: formOf(place.at === 'edit' && place.kind === 'track' ? 'car' : 'track')};
		case 'choose':
			return {do: 'go', place: {at: 'choose', kind: 'track', search: editLine(''), cursor: 0}};
		case 'other choice':
			return place.at === 'choose'
				? {do: 'go', place: {...place, kind: place.kind === 'track' ? 'car' : 'track', cursor: 0}}
				: undefined;
		case 'choice up':
			return {do: 'move choice', by: -1};
		case 'choice down':
			return place.at === 'choose' && place.cursor + 1 < scene.choices.length ? {do: 'move choice', by: 1} : undefined;
		case 'start new':
			return place.at === 'choose' ? {do: 'start new', kind: place.kind} : undefined;
		case 'field up':
			return inForm(0, -1);
		case 'field down':
			return inForm(0, 1);
		case 'fields up':
			return inForm(0, -tenRows);
		case 'fields down':
			return inForm(0, tenRows);
		case 'column left':
			return inForm(0, 0, -1);
		case 'column right':
			return inForm(0, 0, 1);
		case 'next section':
			return inForm(1, 0);
		case 'previous section':
			return inForm(-1, 0);
		case 'accept':
			return {do: 'accept field', rows: 0, columns: 0};
		case 'accept right':
			return {do: 'accept field', rows: 0, columns: 1};
		case 'accept left':
			return {do: 'accept field', rows: 0, columns: -1};
		case 'accept down':
			return {do: 'accept field', rows: 1, columns: 0};
		case 'accept up':
			return {do: 'accept field', rows: -1, columns: 0};
		case 'entry up':
			return {do: 'move entry', by: -1};
		case 'entry down':
			return {do: 'move entry', by: 1};
		case 'help':
			return {do: 'cover', over: {is: 'help', scroll: 0}};
		case 'uncover':
			return {do: 'cover', over: undefined};
		case 'recover':
			return over?.is === 'recovery' ? {do: 'recover', documents: over.documents} : undefined;
		case 'units':
			return {do: 'read in', units: session.units === 'us' ? 'metric' : 'us'};
		case 'quit':
			return unsaved(session.history.present).length > 0 ? {do: 'cover', over: {is: 'quitting'}} : 'leave';
		case 'open field':
		case 'put back':
		case 'clear field':
		case 'to shipped':
		case 'add entry':
		case 'remove entry':
		case 'undo':
		case 'redo':
		case 'read another':
		case 'take over':
		case 'leave draft':
			return {do: name};
		default:
			return name;
	}
}

const inForm = (sections: number, rows: number, columns = 0): Action => ({do: 'move in form', sections, rows, columns});
const formOf = (kind: 'track' | 'car'): Place => ({
	at: 'edit',
	kind,
	section: 0,
	row: 0,
	column: 0,
	editing: undefined,
});

function pictureBy(place: Place, by: 1 | -1): Action | undefined {
	return place.at === 'pictures'
		? {do: 'go', place: {...place, picture: next(pictures, place.picture, by)}}
		: undefined;
}

function straightBy(place: Place, {all}: Scene, by: 1 | -1): Action | undefined {
	const count = all[0]?.row.situations[0]?.straights.length ?? 0;
	if (place.at !== 'pictures' || count === 0) return undefined;
	return {do: 'go', place: {...place, straight: (place.straight + by + count) % count}};
}

function itemBy(place: Place, by: 1 | -1): Action | undefined {
	return place.at === 'hand over' ? {do: 'show item', item: next(items, place.item, by)} : undefined;
}

/** Nothing typed is no name; as notes it means none. */
function accepted(over: Session['over']): Action | Effect | undefined {
	if (over?.is !== 'entry') return undefined;
	const text = over.line.text.trim();
	if (over.asks === 'notes') return {do: 'note', text};
	if (over.asks === 'seen') return text === '' ? {do: 'cover', over: undefined} : 'see it';
	if (text === '') return {do: 'refuse', wrong: 'a name is needed; Esc goes back'};
	if (over.asks === 'log') return 'read log';
	return over.asks === 'file' ? 'write it' : 'export';
}

function forget({place, history}: Session): Action | undefined {
	if (place.at !== 'differences') return undefined;
	const {from, saved} = current(history.present, place.kind);
	return from === 'saved' && saved !== undefined
		? {do: 'cover', over: {is: 'forgetting'}}
		: {do: 'tell', notice: `This ${place.kind} is not saved: there is nothing to forget.`};
}
