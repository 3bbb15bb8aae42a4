/** Earlier and later states, without limit. States share what they have in common. */

export type History<T> = {
	readonly past: readonly T[];
	readonly present: T;
	readonly future: readonly T[];
};

export const startHistory = <T>(present: T): History<T> => ({past: [], present, future: []});

/** A new state; what had been undone is gone. The same state again changes nothing. */
export const recorded = <T>(history: History<T>, next: T): History<T> =>
	next === history.present ? history : {past: [...history.past, history.present], present: next, future: []};

/** The present state put in place of itself: for what is not an edit, such as having been saved. */
export const amended = <T>(history: History<T>, change: (state: T) => T): History<T> => ({
	past: history.past.map(change),
	present: change(history.present),
	future: history.future.map(change),
});

export function undone<T>({past, present, future}: History<T>): History<T> | undefined {
	const before = past.at(-1);
	return before === undefined ? undefined : {past: past.slice(0, -1), present: before, future: [present, ...future]};
}

export function redone<T>({past, present, future}: History<T>): History<T> | undefined {
	const [next, ...rest] = future;
	return next === undefined ? undefined : {past: [...past, present], present: next, future: rest};
}
