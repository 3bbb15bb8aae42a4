/** Plans from strangers, in every form that they are sent in. */
import {isDeepStrictEqual} from 'node:util';
import {checkCode, entryCheck} from '../../../source/sharing/check-code.ts';
import {densePlan, readDensePlan} from '../../../source/sharing/dense.ts';
import {printPlan} from '../../../source/sharing/print-plan.ts';
import {readPlan} from '../../../source/sharing/read-plan.ts';
import {readShared} from '../../../source/sharing/read-shared.ts';
import {readShortForm, shortForm} from '../../../source/sharing/short-form.ts';
import {manglings} from '../../sharing/mangle.ts';
import {samplePlan} from '../../sharing/sample.ts';
import type {Random} from '../random.ts';
import type {Answer, Mutator, Reader} from '../reader.ts';
import {rejected, tracks} from './documents.ts';

async function read(text: string): Promise<Answer> {
	const reading = await readShared(text);
	if (!reading.ok) return rejected(reading.problems);
	if (reading.form === 'short') {
		const numbers = [reading.fields.limitRpm, reading.fields.highestRpm, ...reading.fields.shifts.map(({rpm}) => rpm)];
		return {
			accepted: true,
			broken: numbers.every(Number.isFinite) ? undefined : `numbers of a line are numbers: ${numbers}`,
		};
	}
	const {plan} = reading;
	const [printed, dense] = [await readPlan(printPlan(plan)), await readDensePlan(densePlan(plan))];
	const {line, fields} = shortForm(plan);
	const short = readShortForm(line);
	return {
		accepted: true,
		broken:
			!printed.ok || !isDeepStrictEqual(printed.plan, plan)
				? `printed and read again it is the same: ${JSON.stringify(printed.ok ? printed.plan : printed.problems)}`
				: !dense.ok || !isDeepStrictEqual(dense.plan, plan)
					? `made dense and read again it is the same: ${JSON.stringify(dense.ok ? dense.plan : dense.problems)}`
					: !short.ok || !isSameLine(short.fields, fields)
						? `as one line and read again it is the same: ${line} ${JSON.stringify(short)}`
						: undefined,
	};
}

/** The line may be in capitals. */
const isSameLine = (one: object, other: object): boolean =>
	JSON.stringify(one).toUpperCase() === JSON.stringify(other).toUpperCase();

/** A stranger can make checks that agree: the entries as they are now, with theirs. */
const withChecks: Mutator = text => {
	if (!text.includes('DROPRACK PLAN')) return undefined;
	const entries = text
		.replace(/\s+/g, ' ')
		.split(/ \[[^\]]{0,9}\] ?/)
		.filter(entry => entry !== '' && !entry.startsWith('Check:'));
	const closing = `Check: ${entries.length} entries, code ${checkCode(entries.join('\n'))}`;
	return `${entries.map(entry => `${entry} [${entryCheck(entry)}]`).join('\n')}\n${closing}\n`;
};

const withLineCheck: Mutator = text => {
	const body = /^DR1 [\s\S]*(?=: [0-9a-f]{8}\s*$)/i.exec(text)?.[0];
	return body === undefined ? undefined : `${body}: ${checkCode(body)}`;
};

const byMail: Mutator = (text, random: Random) =>
	text.includes('DROPRACK') ? random.of(Object.values(manglings))(text) : undefined;

export const plans: Reader = {
	name: 'plans',
	examples: async () => {
		const plan = await samplePlan(undefined, 'Loose off turn two. Watch the oil, all day.');
		return [printPlan(plan), densePlan(plan), shortForm(plan).line, JSON.stringify(plan, null, 1)];
	},
	words: [
		...tracks.words.filter(word => !word.startsWith('"')),
		...[
			'DROPRACK PLAN 1:',
			'DRP1:',
			'DR1 ',
			'Check:',
			'{none}',
			'{}',
			'{-}',
			'{1f600}',
			'{202e}',
			'{1b}',
			'; ',
			', ',
			': ',
		],
		...['Straight', 'Situation', 'Rack pair', 'Engine', 'Gearbox', 'Highest', 'Shift', 'Notes: ', 'Margins: '],
	],
	mutators: [withChecks, withChecks, withLineCheck, byMail],
	longest: 16_000,
	work: {start: 150_000, perCharacter: 150},
	read,
};
