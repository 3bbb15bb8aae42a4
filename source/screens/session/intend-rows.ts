/** From one row to another: up and down the list, and along the ratios of the rack. */
import type {Action} from './action.ts';
import {cursorIn, type Placed, stepped} from './rows.ts';
import type {Session} from './session.ts';

/** All rows, and those that are shown in their order. */
type Rows = {readonly all: readonly Placed[]; readonly shown: readonly Placed[]};

export function rowBy(session: Session, {shown}: Rows, by: number): Action | undefined {
	const cursor = cursorIn(shown, session.row);
	const target = Math.max(0, Math.min(shown.length - 1, cursor + by));
	// At the end of the list nothing is chosen that was not chosen before.
	return target === cursor ? undefined : {do: 'selectRow', row: shown[target]!.name};
}

export function stepTo({all, shown}: Rows, here: Placed | undefined, by: 1 | -1): Action | undefined {
	if (here === undefined) return undefined;
	const row = stepped(all, here, by);
	if (row === undefined)
		return {do: 'tell', notice: `No ${by > 0 ? 'shorter' : 'taller'} pair on the rack for this set.`};
	if (!shown.includes(row)) return {do: 'tell', notice: `${row.name} is next, but hidden by the filter.`};
	return {do: 'selectRow', row: row.name};
}
