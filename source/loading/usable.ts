/** Which rows of a ranking could be mounted at all, and which of the others are only out of stock or out of miles. */
import type {CheckName, Row} from '../planning/results.ts';

const lasting: readonly CheckName[] = ['housing', 'permitted'];
const supply: readonly CheckName[] = ['stock', 'mileage'];

const fails = ({checks}: Row, names: readonly CheckName[]): boolean =>
	checks.some(({check, verdict}) => verdict === 'fail' && names.includes(check));

/** Fits the housing, is permitted, on hand and has miles left. What the engine says of it is another matter. */
export const isUsable = (row: Row): boolean => !fails(row, lasting) && !fails(row, supply);

/** Would be usable with a new set. */
export const lacksSupply = (row: Row): boolean => !fails(row, lasting) && fails(row, supply);

/** Fails nothing but its supply. */
export const wouldPass = (row: Row): boolean =>
	row.checks.every(({check, verdict}) => verdict !== 'fail' || supply.includes(check));
