/** `npm run fuzz`: the readers in turn until the time is up, then what was reached and what was found. */
import {parseArgs} from 'node:util';
import {Campaign, type Finding} from './campaign.ts';
import {Coverage} from './coverage.ts';
import {judge} from './judge.ts';
import {readers} from './readers.ts';

const {values} = parseArgs({
	options: {
		minutes: {type: 'string', default: '1'},
		seed: {type: 'string', default: String(Date.now() % 1_000_000)},
		reader: {type: 'string'},
		input: {type: 'string'},
	},
});
const chosen = readers.filter(({name}) => values.reader === undefined || name === values.reader);
if (chosen.length === 0) {
	console.error(`There is no reader ${values.reader}. There are: ${readers.map(({name}) => name).join(', ')}.`);
	process.exit(2);
}

if (values.input === undefined) await fuzz(Number(values.minutes), Number(values.seed));
else await repeat(values.input);
process.exit();

async function fuzz(minutes: number, seed: number): Promise<void> {
	console.log(`Seed ${seed}, ${minutes} minutes, ${chosen.length} readers.`);
	const coverage = new Coverage();
	const campaigns = chosen.map(reader => new Campaign(reader, seed, coverage));
	for (const campaign of campaigns) await campaign.start();
	const until = performance.now() + minutes * 60_000;
	for (let turn = 0; performance.now() < until; turn++) {
		const campaign = campaigns[turn % campaigns.length]!;
		const end = Math.min(until, performance.now() + 1000);
		const known = campaign.findings.length;
		while (performance.now() < end) await campaign.batch();
		for (const finding of campaign.findings.slice(known)) console.log(`\n${described(finding)}\n`);
	}
	coverage.stop();
	console.log(['reader', 'executions', 'accepted', 'corpus', 'work', 'findings'].join('\t'));
	for (const {reader, executions, accepted, corpus, dearest, findings} of campaigns)
		console.log(
			[reader.name, executions, accepted, corpus.length, `${(100 * dearest).toFixed(0)} %`, findings.length].join('\t'),
		);
	const {reached, known} = coverage.branches();
	console.log(`${reached} of ${known} branches of the functions that were called.`);
	const findings = campaigns.flatMap(campaign => campaign.findings);
	console.log(`${findings.length} findings.`);
	for (const finding of findings) console.log(`\n${described(finding)}`);
	if (findings.length > 0) process.exitCode = 1;
}

function described({reader, promise, detail, input, seed, execution}: Finding): string {
	return [
		`${reader}: broken: ${promise} (seed ${seed}, text ${execution})`,
		`  ${detail.replaceAll('\n', '\n  ')}`,
		`  npm run fuzz -- --reader ${reader} --input '${JSON.stringify(input).replaceAll("'", '\\u0027')}'`,
	].join('\n');
}

/** One text, as JSON, to each of the chosen readers. */
async function repeat(input: string): Promise<void> {
	for (const reader of chosen) {
		const {accepted, broken} = await judge(reader, JSON.parse(input));
		console.log(`${reader.name}: ${accepted ? 'accepted' : 'rejected'}`, broken ?? '');
		if (broken) process.exitCode = 1;
	}
}
