import {readFileSync} from 'node:fs';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {fixture, makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
});
afterAll(() => program.remove());

const oval = JSON.parse(readFileSync(fixture('oval.json'), 'utf8'));
const car = JSON.parse(readFileSync(fixture('car.json'), 'utf8'));
const wrong = (change: object) => JSON.stringify({...oval, ...change});
test.each<[string, string[], string | Uint8Array, RegExp]>([
	['no track', ['rank'], '', /which TRACK\?[\s\S]*Fixture Oval/],
	['an unknown command', ['rnk'], '', /unknown command rnk\. Did you mean "rank"\?/],
	['an unknown option', ['rank', 'fixture oval', '--gearbx'], '', /unknown option --gearbx/],
	['an unknown track', ['rank', 'shrt'], '', /no track called shrt[\s\S]*Fixture Oval/],
	['an unknown car', ['rank', 'fixture oval', '--car', 'dmo'], '', /no car called dmo[\s\S]*Fixture Car/],
	['a missing file', ['rank', './none.json'], '', /none\.json: there is no such file/],
	['a directory', ['rank', './tests'], '', /is a directory/],
	['empty input', ['rank', '-'], '', /standard input: is empty/],
	['binary zeros', ['rank', '-'], new Uint8Array(1000), /holds binary zeros/],
	['50 MB of zeros', ['rank', '-'], new Uint8Array(50_000_000), /is larger than 10 MB/],
	['broken JSON', ['rank', '-'], '{\n  "kind": "track",\n  oops\n}', /standard input:3:3/],
	['a car for a track', ['rank', '-'], JSON.stringify(car), /kind: found "car"; allowed "track"/],
	['a later version', ['rank', '-'], wrong({version: 2}), /version: found 2/],
	['a number without a unit', ['rank', '-'], wrong({lap: 0.6}), /lap: found 0\.6/],
	['an unknown field', ['rank', '-'], wrong({staights: []}), /straights/],
	['no straights', ['rank', '-'], wrong({straights: []}), /straights/],
	['no engine for the type', ['rank', '-'], wrong({type: 'superspeedway'}), /superspeedway/],
	[
		'an exit above every gear',
		['rank', '-'],
		wrong({straights: [{name: 'Front', exit: '300 mph', length: '900 ft'}]}),
		/Front/,
	],
	[
		'entry without braking',
		['rank', '-'],
		wrong({straights: [{name: 'Front', exit: '80 mph', length: '900 ft', entry: '80 mph'}]}),
		/braking/,
	],
	[
		'an unknown situation',
		['rank', 'fixture oval', '--situation', 'At night'],
		'',
		/command line: .*"At night"[\s\S]*In the tow/,
	],
	['an unknown pair', ['run', 'fixture oval', '--pair', '20/50'], '', /command line: .*20\/50/],
	['an unknown gearbox', ['rpm', 'fixture oval', '--gearbox', 'Z'], '', /command line: .*"Z"[\s\S]*A, B/],
	['an unknown name to show', ['show', 'nothing'], '', /no track or car called nothing/],
	['a file to show', ['show', './tests/fixtures/car.json'], '', /a file is a document already/],
	['nothing to show', ['show'], '', /which NAME\?[\s\S]*Fixture Car/],
	['an unknown kind of schema', ['schema', 'tracks'], '', /track or car\? Found tracks/],
	['a kind of schema that would turn the line', ['schema', '\u202etrack\u001b[2J'], '', /Found \ufffdtrack␛\[2J/],
	['an unknown car to prefer', ['cars', '--prefer', 'zzz'], '', /no car called zzz/],
	['a file to prefer', ['cars', '--prefer', './car.json'], '', /not a file/],
])('%s: status 2, a reason, nothing on standard output, no stack', async (_, words, input, message) => {
	const {status, out, err} = await program.run(words, {input});
	expect({status, out}).toEqual({status: 2, out: ''});
	expect(err).toMatch(message);
	expect(err).not.toMatch(/^ +at /m);
});

test('both documents are checked at once', async () => {
	const {err} = await program.run(['rank', './none.json', '--car', './tests']);
	expect(err).toMatch(/none\.json: there is no such file\.\n\.\/tests: is a directory/);
});
