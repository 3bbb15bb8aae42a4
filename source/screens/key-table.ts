/** Every key once: handling, the line of keys, the help and the table in the README are made from this. */

/** Where a key works. The first five are places; the others lie over a place while they last. */
export const scopes = {
	ranking: 'In the ranking',
	why: 'In the reasons',
	pictures: 'In the pictures',
	edit: 'In the form',
	choose: 'Choosing a track or a car',
	field: 'Typing into a field',
	margin: 'Typing the least margin',
	help: 'In this help',
	quitting: 'When asked about unsaved changes',
	recovery: 'When an unsaved session is offered',
	everywhere: 'In every place',
} as const;
export type Scope = keyof typeof scopes;

export type Binding = {
	readonly scope: Scope;
	/** As `keyName` gives them; the first one is shown. */
	readonly keys: readonly string[];
	readonly does: ActionName;
	/** For the help. */
	readonly words: string;
	/** For the line of keys; left out there where absent. */
	readonly short?: string;
	/** Where the line of keys is too short, the highest is left out first; 5 unless given. */
	readonly rank?: number;
};

export const bindings = [
	{scope: 'ranking', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'ranking', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{
		scope: 'ranking',
		keys: ['enter'],
		does: 'why',
		words: 'see why: checks, points and straights of this row',
		short: 'why',
		rank: 2,
	},
	{scope: 'ranking', keys: ['pageup'], does: 'page up', words: 'ten rows up'},
	{scope: 'ranking', keys: ['pagedown'], does: 'page down', words: 'ten rows down'},
	{scope: 'ranking', keys: ['home'], does: 'first row', words: 'the first row'},
	{scope: 'ranking', keys: ['end'], does: 'last row', words: 'the last row'},
	{
		scope: 'ranking',
		keys: ['o'],
		does: 'next order',
		words: 'sort by place, ratio, margin, exit RPM, shifts',
		short: 'sort',
		rank: 7,
	},
	{
		scope: 'ranking',
		keys: ['h'],
		does: 'hide failing',
		words: 'hide rows that fail a check, or show them',
		short: 'hide FAIL',
		rank: 7,
	},
	{
		scope: 'ranking',
		keys: ['b'],
		does: 'next gearbox',
		words: 'one gearbox set after the other, then all',
		short: 'set',
		rank: 8,
	},
	{
		scope: 'ranking',
		keys: ['n'],
		does: 'least margin',
		words: 'hide rows with less to the limit than so many RPM',
		short: 'margin',
		rank: 8,
	},

	{scope: 'why', keys: ['up', 'k'], does: 'row up', words: 'the row above', short: 'row', rank: 1},
	{scope: 'why', keys: ['down', 'j'], does: 'row down', words: 'the row below'},
	{scope: 'why', keys: ['pageup'], does: 'scroll up', words: 'scroll up', short: 'scroll', rank: 1},
	{scope: 'why', keys: ['pagedown', 'space'], does: 'scroll down', words: 'scroll down'},
	{scope: 'why', keys: ['enter'], does: 'ranking', words: 'back to the ranking'},

	{scope: 'pictures', keys: ['tab'], does: 'next picture', words: 'the next picture', short: 'picture', rank: 1},
	{scope: 'pictures', keys: ['shift+tab'], does: 'previous picture', words: 'the picture before'},
	{scope: 'pictures', keys: ['l'], does: 'next straight', words: 'the next straight', short: 'straight', rank: 1},
	{scope: 'pictures', keys: ['L'], does: 'previous straight', words: 'the straight before'},
	{scope: 'pictures', keys: ['up', 'k'], does: 'row up', words: 'the row above'},
	{scope: 'pictures', keys: ['down', 'j'], does: 'row down', words: 'the row below'},

	{scope: 'edit', keys: ['enter'], does: 'open field', words: 'type into the field', short: 'type', rank: 1},
	{scope: 'edit', keys: ['up', 'k'], does: 'field up', words: 'the field above', short: 'field', rank: 1},
	{scope: 'edit', keys: ['down', 'j'], does: 'field down', words: 'the field below'},
	{scope: 'edit', keys: ['left'], does: 'column left', words: 'the column to the left, in a table'},
	{scope: 'edit', keys: ['right'], does: 'column right', words: 'the column to the right, in a table'},
	{scope: 'edit', keys: ['tab'], does: 'next section', words: 'the next section', short: 'section', rank: 1},
	{scope: 'edit', keys: ['shift+tab'], does: 'previous section', words: 'the section before'},
	{scope: 'edit', keys: ['pageup'], does: 'fields up', words: 'ten fields up'},
	{scope: 'edit', keys: ['pagedown'], does: 'fields down', words: 'ten fields down'},
	{
		scope: 'edit',
		keys: ['e'],
		does: 'other form',
		words: 'the form of the track, or of the car',
		short: 'track or car',
		rank: 2,
	},
	{
		scope: 'edit',
		keys: ['a'],
		does: 'add entry',
		words: 'add a copy of this entry (straight, situation, pair, set, engine, point)',
		short: 'add',
	},
	{scope: 'edit', keys: ['x'], does: 'remove entry', words: 'remove this entry', short: 'remove'},
	{scope: 'edit', keys: ['['], does: 'entry up', words: 'move this entry up'},
	{scope: 'edit', keys: [']'], does: 'entry down', words: 'move this entry down'},
	{scope: 'edit', keys: ['delete', 'backspace'], does: 'clear field', words: 'empty an optional field'},
	{
		scope: 'edit',
		keys: ['o'],
		does: 'to shipped',
		words: 'put the field back to its shipped value',
		short: 'shipped value',
	},

	{scope: 'field', keys: ['enter'], does: 'accept', words: 'take it', short: 'take it'},
	{scope: 'field', keys: ['escape'], does: 'put back', words: 'leave the field as it was', short: 'as it was'},
	{
		scope: 'field',
		keys: ['tab'],
		does: 'accept right',
		words: 'take it, and on to the next field or column',
		short: 'next',
	},
	{scope: 'field', keys: ['shift+tab'], does: 'accept left', words: 'take it, and back to the field or column before'},
	{scope: 'field', keys: ['down'], does: 'accept down', words: 'take it, and on to the field below'},
	{scope: 'field', keys: ['up'], does: 'accept up', words: 'take it, and on to the field above'},

	{scope: 'choose', keys: ['up'], does: 'choice up', words: 'the name above', short: 'choose'},
	{scope: 'choose', keys: ['down'], does: 'choice down', words: 'the name below'},
	{scope: 'choose', keys: ['enter'], does: 'take choice', words: 'take it', short: 'take it'},
	{scope: 'choose', keys: ['tab'], does: 'other choice', words: 'tracks, or cars', short: 'tracks or cars'},
	{scope: 'choose', keys: ['ctrl+n'], does: 'start new', words: 'start one from nothing', short: 'new'},
	{scope: 'choose', keys: ['escape'], does: 'ranking', words: 'back to the ranking', short: 'back'},

	{
		scope: 'margin',
		keys: ['enter'],
		does: 'accept margin',
		words: 'take it; nothing shows every row',
		short: 'take it',
	},
	{scope: 'margin', keys: ['escape'], does: 'uncover', words: 'leave it as it was', short: 'as it was'},

	{scope: 'help', keys: ['up', 'pageup', 'k'], does: 'scroll up', words: 'scroll up', short: 'scroll'},
	{scope: 'help', keys: ['down', 'pagedown', 'space', 'j'], does: 'scroll down', words: 'scroll down'},
	{
		scope: 'help',
		keys: ['escape', '?', 'q', 'enter', 'f1'],
		does: 'uncover',
		words: 'back to where you were',
		short: 'back',
	},

	{scope: 'quitting', keys: ['s'], does: 'save and leave', words: 'save, then leave', short: 'save, then leave'},
	{
		scope: 'quitting',
		keys: ['l'],
		does: 'leave',
		words: 'leave; the session is offered again at the next start',
		short: 'leave, keep for next time',
	},
	{scope: 'quitting', keys: ['d'], does: 'discard and leave', words: 'leave and forget the changes', short: 'discard'},
	{scope: 'quitting', keys: ['escape', 'n', 'q'], does: 'uncover', words: 'stay', short: 'stay'},

	{scope: 'recovery', keys: ['enter', 'y'], does: 'recover', words: 'take it up where it ended', short: 'take it up'},
	{scope: 'recovery', keys: ['d'], does: 'forget recovery', words: 'forget it', short: 'forget it'},
	{scope: 'recovery', keys: ['escape', 'n'], does: 'uncover', words: 'not now; it is offered again', short: 'not now'},

	{
		scope: 'everywhere',
		keys: ['right', '+'],
		does: 'shorter',
		words: 'one pair shorter: higher ratio, more RPM',
		short: 'shorter',
		rank: 3,
	},
	{
		scope: 'everywhere',
		keys: ['left', '-'],
		does: 'taller',
		words: 'one pair taller: lower ratio, less RPM',
		short: 'taller',
		rank: 3,
	},
	{
		scope: 'everywhere',
		keys: ['c'],
		does: 'compare',
		words: 'compare all rows with this one, or stop comparing',
		short: 'compare',
		rank: 6,
	},
	{
		scope: 'everywhere',
		keys: ['s'],
		does: 'next situation',
		words: 'the next situation, then the worst over all',
		short: 'situation',
		rank: 5,
	},
	{scope: 'everywhere', keys: ['S'], does: 'previous situation', words: 'the situation before'},
	{scope: 'everywhere', keys: ['e'], does: 'edit', words: 'change the track or the car', short: 'edit', rank: 4},
	{scope: 'everywhere', keys: ['t'], does: 'choose', words: 'choose a track or a car', short: 'track', rank: 4},
	{scope: 'everywhere', keys: ['g'], does: 'pictures', words: 'look at pictures', short: 'pictures', rank: 4},
	{scope: 'everywhere', keys: ['w'], does: 'why', words: 'see why'},
	{scope: 'everywhere', keys: ['r', 'escape'], does: 'ranking', words: 'the ranking; Esc also stops ranking'},
	{
		scope: 'everywhere',
		keys: ['p'],
		does: 'plan',
		words: 'choose this pair as the plan, or take that back',
		short: 'plan',
		rank: 6,
	},
	{scope: 'everywhere', keys: ['i'], does: 'install', words: 'this pair is in the car now'},
	{scope: 'everywhere', keys: ['u', 'ctrl+_'], does: 'undo', words: 'undo', short: 'undo', rank: 6},
	{scope: 'everywhere', keys: ['U', 'ctrl+r'], does: 'redo', words: 'redo'},
	{scope: 'everywhere', keys: ['m'], does: 'units', words: 'US or metric units'},
	{scope: 'everywhere', keys: ['ctrl+s'], does: 'save', words: 'save the track and the car'},
	{scope: 'everywhere', keys: ['?', 'f1'], does: 'help', words: 'this help', short: 'help'},
	{scope: 'everywhere', keys: ['q'], does: 'quit', words: 'leave; asks where something is not saved', short: 'quit'},
	{scope: 'everywhere', keys: ['ctrl+l'], does: 'redraw', words: 'draw the screen anew, and rank again'},
	{scope: 'everywhere', keys: ['ctrl+z'], does: 'suspend', words: 'back to the shell until fg'},
	{
		scope: 'everywhere',
		keys: ['ctrl+c'],
		does: 'leave',
		words: 'leave at once; what is not saved is offered at the next start',
	},
] as const satisfies readonly {
	scope: Scope;
	keys: readonly string[];
	does: string;
	words: string;
	short?: string;
	rank?: number;
}[];

export type ActionName = (typeof bindings)[number]['does'];

/** These work also while something is typed or asked. */
const always: readonly ActionName[] = ['leave', 'suspend', 'redraw'];

const table: readonly Binding[] = bindings;

/** What a key does where these scopes hold, the first one first; undefined where it does nothing. */
export function actionFor(key: string, held: readonly Scope[]): ActionName | undefined {
	const found = held
		.map(scope => table.find(binding => binding.scope === scope && binding.keys.includes(key)))
		.find(binding => binding !== undefined);
	if (found) return found.does;
	return table.find(({scope, keys, does}) => scope === 'everywhere' && keys.includes(key) && always.includes(does))
		?.does;
}

/** The bindings that work where these scopes hold, each without the keys that an earlier scope takes from it. */
export function workingIn(held: readonly Scope[]): Binding[] {
	const taken = new Set<string>();
	return held.flatMap(scope => {
		const working = bindingsOf(scope)
			.map(binding => ({...binding, keys: binding.keys.filter(key => !taken.has(key))}))
			.filter(({keys}) => keys.length > 0);
		for (const {keys} of bindingsOf(scope)) for (const key of keys) taken.add(key);
		return working;
	});
}

/** The bindings of a scope, in the order of the table. */
export const bindingsOf = (scope: Scope): readonly Binding[] => table.filter(binding => binding.scope === scope);

const signs: Readonly<Record<string, string>> = {
	up: '↑',
	down: '↓',
	left: '←',
	right: '→',
	enter: 'Enter',
	escape: 'Esc',
	tab: 'Tab',
	space: 'Space',
	pageup: 'PgUp',
	pagedown: 'PgDn',
	home: 'Home',
	end: 'End',
	delete: 'Del',
	backspace: 'Backspace',
	f1: 'F1',
};

/** As a person reads it: "↑", "Shift+Tab", "Ctrl+S". */
export function keyWords(key: string): string {
	if (signs[key]) return signs[key];
	const [modifier, rest] = key.split(/\+(?=.)/, 2) as [string, string | undefined];
	if (rest === undefined) return key;
	const letter = signs[rest] ?? rest.toUpperCase();
	return `${modifier.charAt(0).toUpperCase()}${modifier.slice(1)}+${letter}`;
}

/** The table of keys for the README. */
export function keyTableMarkdown(): string {
	const row = (cells: readonly string[]) => `| ${cells.map(cell => cell.replaceAll('|', '\\|')).join(' | ')} |`;
	const sections = (Object.keys(scopes) as Scope[]).map(scope => {
		const rows = bindingsOf(scope).map(({keys, words}) => row([keys.map(keyWords).join(', '), words]));
		return [row([`**${scopes[scope]}**`, '']), ...rows].join('\n');
	});
	return [row(['key', 'what it does']), row(['---', '---']), ...sections].join('\n');
}
