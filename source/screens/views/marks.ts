/** The marks before a row, and what they mean. */
import type {Placed} from '../session/rows.ts';
import type {Session} from '../session/session.ts';

export const marks = {cursor: '▸', installed: '*', plan: 'P', comparison: 'c'} as const;

/** Of fixed width: cursor, then what the row is. */
export function marksOf({name, row}: Placed, session: Session, isCursor: boolean): string {
	const at = (holds: boolean, mark: string) => (holds ? mark : ' ');
	return [
		at(isCursor, marks.cursor),
		at(row.installed, marks.installed),
		at(session.plan === name, marks.plan),
		at(session.comparison === name, marks.comparison),
	]
		.join('')
		.replace(/^(.)(.*)$/, (_, cursor: string, rest: string) => `${cursor}${rest.replaceAll(' ', '').padEnd(3)}`);
}
