import {describe, expect, test} from 'vitest';
import {editLine} from '../../../source/screens/parts/edit-line.ts';
import {painted} from '../../../source/screens/parts/theme.ts';
import {gearsPlace, loadPlace} from '../../../source/screens/session/ahead-place.ts';
import {withJson} from '../../../source/screens/session/documents.ts';
import {startHistory} from '../../../source/screens/session/history.ts';
import type {Practice} from '../../../source/screens/session/practice.ts';
import {marginEntry} from '../../../source/screens/session/reduce.ts';
import {riskEntry} from '../../../source/screens/session/reduce-risk.ts';
import {takeInPlace} from '../../../source/screens/session/reduce-take-in.ts';
import type {Place, Session} from '../../../source/screens/session/session.ts';
import {startDraft} from '../../../source/screens/session/track-history.ts';
import {frameLines, frameOf} from '../../../source/screens/views/frame.ts';
import {after, car, documents, oval, session, typed, withGears} from '../session/documents.ts';
import {linesOf, stateOf, widest} from './states.ts';

const sizes = [
	[80, 24],
	[100, 30],
	[140, 45],
	[200, 60],
] as const;
const edit: Place = {at: 'edit', kind: 'track', section: 1, row: 1, column: 0, editing: undefined};
const handOver = {
	at: 'hand over',
	item: 'plan as text',
	scroll: 0,
	date: '2026-05-31T18:05:00Z',
	day: '2026-05-31',
} as const;
const practicePlace = {at: 'practice', pane: 'numbers', cursor: 1, scroll: 0} as const;
const seenPractice: Practice = {
	track: oval.id,
	seen: [{straight: 'Back', text: '8420 gear 4'}],
	held: 'circumference',
	grip: false,
	log: undefined,
};
const places: Record<string, Partial<Session>> = {
	ranking: {},
	comparing: {comparison: '36/36 A'},
	why: {place: {at: 'why', scroll: 0}},
	'why, compared': {place: {at: 'why', scroll: 8}, comparison: '36/36 A'},
	life: {place: {at: 'life', scroll: 0}},
	'life, compared': {place: {at: 'life', scroll: 8}, comparison: '36/36 A'},
	odds: {place: {at: 'odds', scroll: 0}},
	'typing the risk': {place: {at: 'odds', scroll: 0}, over: riskEntry(session({risk: 0.05}))},
	'picture of RPM': {place: {at: 'pictures', picture: 'rpm', straight: 0}},
	'picture of thrust': {place: {at: 'pictures', picture: 'thrust', straight: 0}},
	'picture of speed': {place: {at: 'pictures', picture: 'speed', straight: 1}, comparison: '34/37 A'},
	form: {place: edit},
	'form, typing': {place: {...edit, editing: {line: editLine('118 mhp'), wrong: undefined}}},
	'form of the car, a table': {place: {at: 'edit', kind: 'car', section: 8, row: 2, column: 1, editing: undefined}},
	choosing: {place: {at: 'choose', kind: 'track', search: editLine('ov'), cursor: 0}},
	help: {over: {is: 'help', scroll: 0}},
	'least margin': {over: marginEntry(session())},
	quitting: {over: {is: 'quitting'}},
	'handing over': {place: handOver},
	'handing over a card': {place: {...handOver, item: 'swap sheet', scroll: 8}},
	'handing over a QR code': {place: {...handOver, item: 'QR of plan'}},
	'handing over the small QR code': {place: {...handOver, item: 'QR of line'}},
	'typing a file name': {
		place: handOver,
		over: {is: 'entry', asks: 'file', line: editLine('a'.repeat(150)), wrong: undefined},
	},
	overwriting: {place: handOver, over: {is: 'overwriting', file: 'plan.txt'}},
	'taking in': {place: {...takeInPlace, line: editLine('plan.txt'), wrong: 'plan.txt: there is no such file.'}},
	history: {place: {at: 'history', entries: [{date: '2026-05-31', remark: 'loose'}], adding: false, scroll: 0}},
	'adding to the history': {
		place: {at: 'history', entries: [], adding: true, scroll: 0},
		draft: startDraft('Fixture Oval', '2026-05-31', '36/36 A'),
	},
	'load list': {place: loadPlace},
	'load list, nothing ahead': {place: loadPlace, ahead: []},
	'gears to build, without any': {place: gearsPlace},
	'gears to build, one set for all': {
		place: {...gearsPlace, together: true},
		ahead: ['track:oval', 'track:other'],
		history: startHistory(withJson(documents, 'car', withGears(car.json))),
	},
	differences: {
		place: {at: 'differences', kind: 'track', scroll: 0},
		history: startHistory(withJson(documents, 'track', {...oval.json, lap: '0.7 mi'})),
	},
	forgetting: {place: {at: 'differences', kind: 'car', scroll: 0}, over: {is: 'forgetting'}},
	practice: {place: practicePlace},
	'practice, a number': {place: practicePlace, practice: seenPractice},
	'practice, what would change': {place: {...practicePlace, pane: 'changes'}, practice: seenPractice},
	'practice, typing': {
		place: practicePlace,
		over: {is: 'entry', asks: 'seen', line: editLine('8420 gear 4 118 mph'), wrong: 'x'.repeat(90)},
	},
	'no row left': {filter: {hideFailing: true, gearbox: 'C', leastMarginRpm: 5000}},
};

describe.each(Object.entries(places))('%s', (_, change) => {
	test.each(sizes)('fills %d × %d exactly, and no more', (width, height) => {
		for (const ascii of [false, true]) {
			const lines = linesOf(stateOf(session(change)), {width, height, ascii});
			expect(lines).toHaveLength(height);
			expect(widest(lines)).toBeLessThanOrEqual(width);
		}
	});
	test('in ASCII there is nothing else', () => {
		expect(linesOf(stateOf(session(change)), {width: 100, height: 30, ascii: true}).join('')).toMatch(/^[\x20-\x7e]*$/);
	});
});

const smallCode = () => stateOf(session({place: {...handOver, item: 'QR of line'}}));

test('the QR code of the one line fits 80 × 24, whole, and black on white whatever the theme', () => {
	const frame = frameLines(frameOf(smallCode(), {width: 80, height: 24, ascii: false}, 0));
	const code = frame.filter(pieces => pieces[0]?.tone === 'code');
	expect(code.length).toBeGreaterThanOrEqual(21);
	expect(new Set(code.map(pieces => pieces[0]!.text.length))).toEqual(new Set([code[0]![0]!.text.length]));
	const theme = {color: false, ascii: false};
	expect(painted(code[0]!, theme)).toMatch(/^.\[38;5;16;48;5;231m +.\[39;49m/);
	const {draw} = smallCode().scene.handed!;
	const drawn = draw!({columns: 80, rows: 24});
	expect(drawn.ok && drawn.lines).toEqual(code.map(pieces => pieces[0]!.text));
});

test('a QR code that does not fit says which window it needs; in ASCII none is drawn', () => {
	const large = stateOf(session({place: {...handOver, item: 'QR of plan'}}));
	const told = linesOf(large, {width: 80, height: 24, ascii: false}).join('\n');
	expect(told).toMatch(/needs a window of \d+ × \d+; this one has 80 × 24/);
	expect(told).toContain('one line');
	expect(linesOf(smallCode(), {width: 80, height: 24, ascii: true}).join('\n')).toContain('--ascii, or read aloud.');
});

test('a long notice, and what is wrong with a name, are told whole', () => {
	const words =
		'The disk is full, and this is a long path to say where: /home/somebody/with/a/long/name/plans/plan.txt.';
	const told = linesOf(stateOf(session({notice: words})), {width: 80, height: 24, ascii: false});
	expect(told.slice(21, 23).join(' ')).toBe(words);
	const over = {is: 'entry', asks: 'file', line: editLine('plan.txt'), wrong: words} as const;
	const asked = linesOf(stateOf(session({place: handOver, over})), {width: 80, height: 24, ascii: false});
	expect(asked.slice(20, 23).join(' ')).toBe(`Write it to the file: plan.txt ${words}`);
});

test('in ASCII the keys of the arrows are named, since "v" and ">" are other keys', () => {
	const size = {width: 80, height: 24, ascii: true};
	const foot = linesOf(stateOf(session()), size).at(-1);
	expect(foot).toMatch(/^Up Dn row .* Right shorter {2}Left taller/);
	const help = linesOf(stateOf(session({over: {is: 'help', scroll: 0}})), size).join('\n');
	expect(help).toMatch(/\n {2}Up k +the row above/);
});

test('a card is whole: scrolled to its end, its caution is there', () => {
	const card = stateOf(session({place: {...handOver, item: 'swap sheet', scroll: 999}}));
	const text = linesOf(card, {width: 80, height: 24, ascii: false}).join('\n');
	expect(text).toContain('Counted by');
	expect(text).toContain('and a flipped pair');
});

test('the row that is handed over is named, and whether it is the plan', () => {
	const words = (change: Partial<Session>) =>
		linesOf(stateOf(session({place: handOver, ...change})), {width: 80, height: 24, ascii: false})[3];
	expect(words({row: '35/36 A'})).toBe('35/36 A, the row under the cursor; p makes it the plan · no notes');
	expect(words({row: '35/36 A', plan: '36/36 A'})).toBe('36/36 A, the plan · no notes');
	expect(words({plan: '99/11 A'})).toContain('the plan 99/11 A is not on the rack');
});

test('what differs from the shipped one is shown, and nothing else', () => {
	const lines = linesOf(stateOf(session(places.differences!)), {width: 80, height: 24, ascii: false});
	expect(lines.slice(3, 9)).toEqual([
		'The track Fixture Oval',
		'',
		'It differs from the shipped one:',
		'       shipped  now',
		expect.stringMatching(/^ {2}lap +\S+ \S+ +0\.7 mi$/),
		'',
	]);
});

test('where the room is, the place of the highest RPM is told whole', () => {
	const text = linesOf(stateOf(session()), {width: 140, height: 45, ascii: false}).join('\n');
	expect(text).toContain('restart shift');
	expect(text).not.toMatch(/(Fron|resta|shi|Back)\S*… +\d/);
});

test('a type of track that fills its column does not touch what follows', () => {
	const wide = {...oval, json: {...oval.json, type: 'superspeedway'}};
	const history = startHistory({...documents, open: {...documents.open, [oval.id]: wide}});
	const place: Place = {at: 'choose', kind: 'track', search: editLine(''), cursor: 0};
	for (const width of [80, 140]) {
		const text = linesOf(stateOf(session({place, history})), {width, height: 24, ascii: false}).join('\n');
		expect(text).toContain('superspeedway shipped');
	}
});

test('the ranking at 80 × 24', () => {
	expect(linesOf(stateOf(session()), {width: 80, height: 24, ascii: false}).join('\n')).toMatchInlineSnapshot(`
		"Fixture Oval · short · limit 9200 · band 7254-9200 · 68°F, 28.94 in… Fixture Car
		worst over all situations · 10 rows
		────────────────────────────────────────────────────────────────────────────────
		       #  pair   set  verdict  highest  margin  where       exit  shifts  gain s
		▸      1  34/37  A    near        9100     100  Front shi…  6587       2  +0.051
		       2  35/36  A    near        9100     100  Front shi…  6226       2  +0.020
		       3  34/37  B    near        9100     100  Front shi…  6135       2  +0.011
		 *     4  36/36  A    near        9100     100  restart s…  6053       2   0.000
		       5  36/35  A    near        9157      43  restart e…  5885       2  -0.023
		       6  37/34  B    near        9116      84  Back end    7362       2  -0.031
		       7  35/36  B    near        9100     100  restart s…  5799       2  -0.036
		       8  36/35  B    near        9100     100  Front shi…  5664       3  -0.050
		       9  37/34  A    near        9100     100  Back shif…  5711       2  -0.055
		      10  36/36  B    near        9108      92  Front end   5637       1  -0.056
		────────────────────────────────────────────────────────────────────────────────
		34/37 A near Fastest of 10 that fail no check: 0.031 s a lap ahead of 35/36 A;
		highest RPM 9100 at Front shift 2-3, 100 under the limit. Near: after a shift,
		downshift.
		after shift near -220 (Front shift 2-3, Base)
		downshift near -1916 (Back entry 3-2, In the tow)
		limit pass +100 (Front shift 2-3, Base)  limiter pass  band pass
		settled pass +1.4 s  pit road pass +3125  restart pass  housing pass  stock pass

		↑↓ row  Enter why  → shorter  ← taller  e edit  t track  ? help  q quit"
	`);
});

test('the reasons stand beside the ranking where there is room', () => {
	const lines = linesOf(stateOf(session()), {width: 140, height: 45, ascii: false});
	expect(lines.find(line => line.includes('▸'))).toMatch(/▸.*│/);
	expect(lines.join('\n')).toContain('RPM limit');
});

test('below 80 × 24 it says what it needs, at any size', () => {
	const state = stateOf(session());
	expect(linesOf(state, {width: 60, height: 10, ascii: false})).toEqual([
		'Droprack needs 80 columns and 24 lines.',
		'This window has 60 and 10.',
		'Nothing is lost: make it larger. Ctrl+C leaves.',
	]);
	for (const [width, height] of [
		[1, 1],
		[2, 2],
		[10, 3],
		[79, 24],
		[80, 23],
	] as const) {
		const lines = linesOf(state, {width, height, ascii: false});
		expect(lines.length).toBeLessThanOrEqual(height);
		expect(widest(lines)).toBeLessThanOrEqual(width);
	}
});

test('the field being typed shows what was understood, or what is wrong', () => {
	const typing = (text: string) =>
		linesOf(stateOf(session({place: {...edit, editing: {line: editLine(text), wrong: undefined}}})), {
			width: 100,
			height: 30,
			ascii: false,
		}).join('\n');
	expect(typing('190 km/h')).toContain('Understood 190 km/h = 118.06 mph');
	expect(typing('118 mhp')).toContain('Did you mean "mph"?');
	expect(typing('')).toContain('This field is needed.');
});

test('a field that is not as shipped is marked, and one that does not read', () => {
	const json = {...oval.json, lap: '7'};
	const changed = session({
		history: startHistory(withJson(documents, 'track', json)),
		place: {...edit, section: 0, row: 2},
	});
	const lines = linesOf(stateOf(changed), {width: 100, height: 30, ascii: false});
	expect(lines.find(line => line.includes('lap'))).toMatch(/▸!lap +~7/);
	expect(lines.join('\n')).toContain('Wrong: found "7"');
});

test('documents that do not rank say what is wrong, with its place', () => {
	const json = {...oval.json, type: 'superspeedway'};
	const lines = linesOf(stateOf(session({history: startHistory(withJson(documents, 'track', json))})), {
		width: 80,
		height: 24,
		ascii: false,
	});
	expect(lines.join('\n')).toContain('! car: engines: found no engine for the track type superspeedway');
});

test('long names, wide characters and what a terminal would act on break no column', () => {
	const json = {...oval.json, name: `漢字トラック${'長い名前'.repeat(20)}\x1B[31m\u202E`};
	const sets = [{name: 'ギア一式とても長い名前のセット', ratios: [2.9, 2.04, 1.58, 1.24, 1]}];
	const strange = withJson(withJson(documents, 'track', json), 'car', {
		...car.json,
		gearboxes: sets,
		installed: {pair: '36/36', gearbox: sets[0]!.name},
	});
	for (const [width, height] of sizes) {
		const lines = linesOf(stateOf(session({history: startHistory(strange)})), {width, height, ascii: false});
		expect(lines).toHaveLength(height);
		expect(widest(lines)).toBeLessThanOrEqual(width);
		expect(lines.join('')).not.toMatch(/[\p{Cc}\u202E]/u);
	}
});

test('two hundred pairs fit, and the one in the car and the one compared with stay in view', () => {
	const pairs = Array.from({length: 200}, (_, i) => ({driving: 60 + i, driven: 100}));
	const many = withJson(documents, 'car', {...car.json, rack: {pairs}, installed: {pair: '259/100', gearbox: 'A'}});
	const state = stateOf(session({history: startHistory(many), comparison: '60/100 B'}));
	const text = linesOf(state, {width: 100, height: 30, ascii: false}).join('\n');
	expect(text).toContain('259/100');
	expect(text).toContain(' c ');
	expect(text).toContain('400 rows');
});

test('the question about unsaved changes names them', () => {
	const changed = after(session({place: edit}), {do: 'open field', text: ''}, ...typed('80 mph'), {
		do: 'accept field',
		rows: 0,
		columns: 0,
	});
	const lines = linesOf(stateOf({...changed, over: {is: 'quitting'}}), {width: 80, height: 24, ascii: false});
	expect(lines.slice(-2)).toEqual([
		' Not saved: Fixture Oval.  Leave?',
		's save, then leave  l leave, keep for next time  d discard  Esc stay',
	]);
});
