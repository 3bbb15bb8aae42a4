/** The ranking in the order of an accepted risk: the fastest row whose chance of passing the RPM limit is within it first. */
import type {Row} from '../planning/results.ts';
import type {Odds, OddsRow} from './results.ts';

/** A row of the ranking with its odds; null for a row that cannot be mounted. */
export type RiskRow = {readonly row: Row; readonly odds: OddsRow | null; readonly isWithin: boolean};

/**
 * Rows within the risk that fail no check but the limit's, by their mean time; then the others as the ranking has them. The
 * limit is judged by the chance alone; touching the limiter counts with it, for without the limiter that is past it.
 */
export function riskOrder(rows: readonly Row[], odds: Odds, risk: number): RiskRow[] {
	const byName = new Map(odds.rows.map(row => [`${row.pair} ${row.gearbox}`, row]));
	const told = rows.map(row => {
		const found = byName.get(`${row.pair} ${row.gearbox}`);
		const known = found === undefined || found.over === null ? null : found;
		const fails = row.checks.some(({check, verdict}) => verdict === 'fail' && check !== 'limit' && check !== 'limiter');
		return {
			row,
			odds: known,
			isWithin: known?.over != null && known.timeS !== null && known.over.value <= risk && !fails,
		};
	});
	const within = told.filter(({isWithin}) => isWithin);
	return [
		...within.sort((one, other) => one.odds!.timeS!.mean - other.odds!.timeS!.mean),
		...told.filter(({isWithin}) => !isWithin),
	];
}
