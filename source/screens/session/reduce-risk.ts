/** The risk that is accepted: typed as a percentage. */
import {quantityOf} from '../../documents/quantity.ts';
import {editLine} from '../parts/edit-line.ts';
import type {Session} from './session.ts';

/** The entry of the risk, with what holds now. */
export const riskEntry = ({risk}: Session) =>
	({
		is: 'risk',
		line: editLine(risk === undefined ? '' : `${Number((100 * risk).toPrecision(6))} %`),
		wrong: undefined,
	}) as const;

const allowed = 'a percentage from 0 to below 100, like 5 %';

/** Nothing typed lets the ranking go by the numbers as they are again. A number alone is a percentage. */
export function acceptedRisk(session: Session): Session {
	const {over} = session;
	if (over?.is !== 'risk') return session;
	const text = over.line.text.trim();
	if (text === '') return {...session, over: undefined, risk: undefined};
	const reading = quantityOf(text.endsWith('%') ? text : `${text} %`, 'share');
	const found = reading.ok ? text : reading.found;
	if (!reading.ok || reading.value < 0 || reading.value >= 1)
		return {...session, over: {...over, wrong: `found ${found}; allowed ${allowed}`}};
	return {...session, over: undefined, risk: reading.value};
}
