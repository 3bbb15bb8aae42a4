/** What must not be passed, or must be reached, each as a ratio within one run, so that it holds on any machine. */
import {line} from './harness.ts';

export type Budget = {
	/** As the README says it. */
	readonly what: string;
	readonly kind: 'most' | 'least';
	readonly bound: number;
	readonly unit: '×' | 'MB' | 'bytes' | 'frames';
};

/** Growth in proportion is 10 × for 10 × as much; a tenth of it is left for what else the machine does. */
const linear = 11;

export const budgets = {
	rank: {
		what: 'A whole rack ranked, against a plain loop over its straights',
		kind: 'most',
		bound: 0.25,
		unit: '×',
	},
	odex: {what: 'odex over our solver, all sequences of a straight', kind: 'least', bound: 200, unit: '×'},
	mathjs: {
		what: 'mathjs solveODE over our solver, all sequences of a straight',
		kind: 'least',
		bound: 5000,
		unit: '×',
	},
	pairs: {what: 'Ranking 10 × as many pairs', kind: 'most', bound: linear, unit: '×'},
	straights: {what: 'Ranking 10 × as many straights', kind: 'most', bound: linear, unit: '×'},
	situations: {what: 'Ranking 10 × as many situations', kind: 'most', bound: linear, unit: '×'},
	load: {
		what: 'A load list of 20 tracks and 80 pairs, against ranking the same tracks',
		kind: 'most',
		bound: 1.5,
		unit: '×',
	},
	odds: {
		what: 'Odds of the rows that matter, 512 draws, against a plain loop over rankings of them',
		kind: 'most',
		bound: 0.6,
		unit: '×',
	},
	// At most 2 s where Node itself takes 45 ms to start.
	oddsTime: {what: 'Odds of the rows that matter, 512 draws, against `node -e 1`', kind: 'most', bound: 45, unit: '×'},
	oddsFirst: {what: 'Odds: the first answer, against `node -e 1`', kind: 'most', bound: 1.25, unit: '×'},
	oddsSlice: {what: 'Odds: the longest that a key waits, against `node -e 1`', kind: 'most', bound: 1.25, unit: '×'},
	rankProcess: {what: '`droprack rank` as a process, against `node -e 1`', kind: 'most', bound: 3, unit: '×'},
	tracksProcess: {what: '`droprack tracks` as a process, against `node -e 1`', kind: 'most', bound: 1.5, unit: '×'},
	rankMemory: {what: 'Peak memory of `droprack rank`', kind: 'most', bound: 80, unit: 'MB'},
	firstFrame: {what: 'The first frame of the screen, against `node -e 1`', kind: 'most', bound: 3, unit: '×'},
	wholeRanking: {what: 'A whole ranking on the screen, against `node -e 1`', kind: 'most', bound: 5, unit: '×'},
	firstFrameMemory: {what: 'Memory at the first frame', kind: 'most', bound: 95, unit: 'MB'},
	key: {what: 'A key, against a plain Ink table', kind: 'most', bound: 1, unit: '×'},
	keyBytes: {what: 'What a key sends to the terminal', kind: 'most', bound: 2000, unit: 'bytes'},
	edit: {what: 'An accepted edit, ranked anew, against a key of a plain Ink table', kind: 'most', bound: 2, unit: '×'},
	editBytes: {what: 'What an edit sends to the terminal', kind: 'most', bound: 6000, unit: 'bytes'},
	heldKeys: {what: 'Frames for a key held down, 100 repeats', kind: 'least', bound: 100, unit: 'frames'},
	manyKeysMemory: {what: 'Memory after 2000 keys', kind: 'most', bound: 140, unit: 'MB'},
	logSpeed: {
		what: 'Speed of reading a log of 1.4 million rows and 20 columns, against udsv alone on the same file',
		kind: 'least',
		bound: 1 / 3,
		unit: '×',
	},
	logMemory: {what: 'Peak memory of reading it', kind: 'most', bound: 200, unit: 'MB'},
} as const satisfies Record<string, Budget>;

export type BudgetName = keyof typeof budgets;

export type Measured = ReadonlyMap<BudgetName, number>;

/** Three digits, and no more decimals than they need. */
export const figure = (value: number): string =>
	value >= 1000 ? String(Math.round(value / 10) * 10) : String(Number(value.toPrecision(3)));

export const boundText = ({kind, bound, unit}: Budget): string => `at ${kind} ${figure(bound)} ${unit}`;

/** The figures of one run. */
export class Figures {
	readonly #measured = new Map<BudgetName, number>();

	get measured(): Measured {
		return this.#measured;
	}

	/** Prints a figure beside its budget. */
	hold(name: BudgetName, value: number): void {
		this.#measured.set(name, value);
		const budget: Budget = budgets[name];
		line(
			`  ${name}: ${figure(value)} ${budget.unit}, budget ${boundText(budget)}: ${isMet(budget, value) ? 'met' : 'MISSED'}`,
		);
	}

	/** Says how it ended; whether every budget was met. */
	conclude(): boolean {
		const missed = [...this.#measured].filter(([name, value]) => !isMet(budgets[name], value)).map(([name]) => name);
		line(missed.length === 0 ? 'All budgets met.' : `Missed: ${missed.join(', ')}.`);
		return missed.length === 0;
	}
}

function isMet({kind, bound}: Budget, value: number): boolean {
	return kind === 'most' ? value <= bound : value >= bound;
}
