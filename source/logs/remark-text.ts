/** The sentence of each remark. */
import {shortened} from '../documents/problem.ts';
import {footM, mphMps} from '../drivetrain/constants.ts';
import {columnOption} from './column-option.ts';
import type {RemarkData} from './reading.ts';

const kmhPerMps = 3.6;

type Data<Kind extends RemarkData['kind']> = Extract<RemarkData, {kind: Kind}>;

const count = (number: number, one: string, several = `${one}s`): string =>
	`${number.toLocaleString('en-US')} ${number === 1 ? one : several}`;
const seconds = (value: number): string => `${value.toFixed(value < 100 ? 2 : 0)} s`;
const whole = (value: number): string => Math.round(value).toLocaleString('en-US');
/** In both kinds of units, since a sentence does not know which its reader takes. */
const speed = (mps: number): string => `${whole(mps / mphMps)} mph, ${whole(mps * kmhPerMps)} km/h`;
const length = (m: number): string => `${whole(m / footM)} ft, ${whole(m)} m`;
const quoted = (texts: readonly string[]): string => texts.map(text => `"${shortened(text)}"`).join(', ');
/** As many moments as a sentence lists. */
const mostListed = 5;

const sentences: {[Kind in RemarkData['kind']]: (data: Data<Kind>) => string} = {
	preamble: ({lines}) =>
		`${count(lines, 'line')} around the header ${lines === 1 ? 'is' : 'are'} no part of the table.`,
	encoding: ({encoding}) => `The text is ${encoding}, not UTF-8; it was read as that.`,
	notRemembered: ({headers}) =>
		`The columns remembered from an earlier log were not used: ${quoted(headers)} ${headers.length === 1 ? 'is' : 'are'} not in this one, or more than once.`,
	unitFromNumbers: ({channel, header, unit}) =>
		`The log does not say the unit of ${channel} ("${shortened(header)}"); by its numbers it is ${unit}${channel === 'time' ? `. If not: ${columnOption('time', 'HEADER [unit]')}` : ''}.`,
	leftOut: ({channel, headers, why}) => leftOut(channel, headers, why),
	workedOut: ({channel}) =>
		channel === 'time'
			? 'The log has no time; it was worked out from distance and speed, and a standstill is not seen.'
			: 'The distance was worked out from time and speed.',
	textCells: ({channel, cells, firstLine, first}) =>
		`${count(cells, 'cell')} of ${channel} ${cells === 1 ? 'is' : 'are'} no number${cells === 1 ? '' : 's'} with a known unit and ${cells === 1 ? 'was' : 'were'} left out, the first on line ${firstLine}: "${shortened(first)}".`,
	cellUnits: ({channel, units}) =>
		`Cells of ${channel} state their own units (${units.map(shortened).join(', ')}); each was read in its own.`,
	sparse: ({channel, share}) => `The column of ${channel} is empty in ${Math.round(100 * share)} % of the rows.`,
	wrongCells: ({rows, firstLine}) =>
		`${count(rows, 'row')} with more or fewer cells than headers ${rows === 1 ? 'was' : 'were'} left out, the first on line ${firstLine}.`,
	longLines: ({lines, firstLine}) =>
		`${count(lines, 'line')} too long for a row ${lines === 1 ? 'was' : 'were'} left out, the first is line ${firstLine}.`,
	cutRow: ({line}) => `The file ends in the middle of a row, on line ${line}; that row was left out.`,
	unplaced: ({rows}) => `${count(rows, 'row')} without time or distance ${rows === 1 ? 'was' : 'were'} left out.`,
	outOfOrder: ({channel, rows}) =>
		`${count(rows, 'single row')} with a ${channel} out of order ${rows === 1 ? 'was' : 'were'} left out.`,
	restart: ({channel, atS}) =>
		`The ${channel} begins anew${atS.length > 0 ? ` ${count(atS.length, 'time')} (at ${moments(atS)})` : ''}; what follows was joined to what was before${channel === 'time' ? ', as another stint' : ''}.`,
	gap: ({gaps, longestS, atS}) =>
		`${count(gaps, 'gap')} in the samples, the longest ${seconds(longestS)} from ${seconds(atS)} on; nothing is known of what happened in ${gaps === 1 ? 'it' : 'them'}.`,
	stuck: ({channel, times, totalS, atS}) =>
		`The ${channel} stands still while the other of speed and rpm moves, ${count(times, 'time')}, ${seconds(totalS)} in all, first at ${seconds(atS)}: a stuck sensor; left out there.`,
	slowSampling: ({samplesPerS}) =>
		`About ${samplesPerS.toFixed(1)} samples a second: exits, lift points and shifts fall between samples, and so may the highest RPM and speed.`,
	coarseClock: ({share}) =>
		`${Math.round(100 * share)} % of the samples have the same time as the one before: the clock is too coarse for exits and shifts.`,
	implausible: ({channel, highest}) =>
		channel === 'speed'
			? `The highest speed would be ${speed(highest)}: its unit may be wrong. If so: ${columnOption(channel, 'HEADER [unit]')}.`
			: `The highest rpm would be ${whole(highest)}: the column or its unit may be wrong.`,
	disagree: ({loggedM, bySpeedM}) =>
		`The distance of the log (${length(loggedM)}) is ${(loggedM / bySpeedM).toFixed(2)} × what its speed and time make: the unit of one of them may be wrong.`,
};

function leftOut(channel: string, headers: readonly string[], why: Data<'leftOut'>['why']): string {
	const reasons = {
		several: `several columns may be ${channel} (${quoted(headers)}) and none was taken. To take one: --column ${channel}=HEADER.`,
		unit: `${channel} (${quoted(headers)}) was not used: its unit is not known. To say it: --column ${channel}="HEADER [unit]".`,
		numbers: `${channel} (${quoted(headers)}) was not used: its numbers are no share of anything.`,
	};
	const text = reasons[why];
	return text[0]!.toUpperCase() + text.slice(1);
}

function moments(atS: readonly number[]): string {
	const left = atS.length - mostListed;
	return `${atS.slice(0, mostListed).map(seconds).join(', ')}${left > 0 ? ` and ${left} more` : ''}`;
}

export function sentenceOf<Kind extends RemarkData['kind']>(data: Data<Kind>): string {
	const sentence = sentences[data.kind] as unknown as (data: Data<Kind>) => string;
	return sentence(data);
}
