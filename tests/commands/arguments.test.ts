import {expect, test} from 'vitest';
import {type CommandLine, readCommandLine} from '../../source/commands/arguments.ts';

const requestOf = (...words: string[]) => {
	const line = readCommandLine(words);
	if (line.kind !== 'run') throw new Error(JSON.stringify(line));
	return line.request;
};
const messageOf = (...words: string[]) => {
	const line: CommandLine = readCommandLine(words);
	return line.kind === 'bad' ? line.message : `no message but ${line.kind}`;
};

test('a track and its options become a request, wherever the options stand', () => {
	const expected = {
		argument: 'my.json',
		car: 'b',
		top: 3,
		situation: 'In the tow',
		json: true,
		units: 'metric',
		strict: true,
		ascii: true,
	};
	expect(
		requestOf(
			'rank',
			'my.json',
			'--car',
			'b',
			'--top=3',
			'--situation',
			'In the tow',
			'--json',
			'--units',
			'metric',
			'--strict',
			'--ascii',
		),
	).toEqual(expected);
	expect(
		requestOf(
			'--json',
			'--ascii',
			'--units=metric',
			'--strict',
			'--top',
			'3',
			'rank',
			'--car=b',
			'--situation=In the tow',
			'my.json',
		),
	).toEqual(expected);
});

test('units are US and switches off unless given', () => {
	expect(requestOf('tracks')).toEqual({argument: undefined, json: false, units: 'us', strict: false, ascii: false});
});

test('a pair is two tooth counts', () => {
	expect(requestOf('run', 'x', '--pair', '33/38').pair).toEqual({driving: 33, driven: 38});
	expect(requestOf('run', 'x', '--pair', ' 33 / 38 ').pair).toEqual({driving: 33, driven: 38});
	for (const pair of ['33', '33-38', '0/38', '33/', 'a/b', '33.5/38', '33/38/2'])
		expect(messageOf('run', 'x', '--pair', pair)).toMatch(/--pair is driving\/driven, such as 33\/38, found/);
});

test('without a command the request is for the demo', () => {
	const line = readCommandLine([]);
	expect(line).toMatchObject({kind: 'run', command: undefined});
	expect(readCommandLine(['--json', '--units', 'metric'])).toMatchObject({
		kind: 'run',
		command: undefined,
		request: {json: true},
	});
});

test('a dash is an argument, and only one of track and car can be it', () => {
	expect(requestOf('rank', '-').argument).toBe('-');
	expect(requestOf('rank', 'x', '--car', '-').car).toBe('-');
	expect(messageOf('rank', '-', '--car', '-')).toMatch(/only one of TRACK and --car/);
});

test('help and version come before what is wrong with the rest', () => {
	expect(readCommandLine(['--help'])).toEqual({kind: 'help', command: undefined});
	expect(readCommandLine(['rank', '--top', 'x', '-h'])).toMatchObject({kind: 'help', command: {name: 'rank'}});
	expect(readCommandLine(['help', 'rpm'])).toMatchObject({kind: 'help', command: {name: 'rpm'}});
	expect(readCommandLine(['--version'])).toEqual({kind: 'version'});
});

test('an unknown command or option names the nearest', () => {
	expect(messageOf('rnk')).toMatch(/unknown command rnk\. Did you mean "?rank"?\?/);
	expect(messageOf('zzzzzz')).toMatch(
		/^unknown command zzzzzz\.\nCommands: rank, rpm, run, tracks, cars, show, schema, /,
	);
	expect(messageOf('my/short.json')).toMatch(/droprack rank my\/short\.json/);
	expect(messageOf('rank', 'x', '--gearbx', 'A')).toMatch(/unknown option --gearbx\./);
	expect(messageOf('rank', 'x', '--situaton', 'A')).toMatch(/Did you mean "?--situation"?\?/);
	expect(messageOf('rank', 'x', '-q')).toMatch(/unknown option -q\./);
});

test('an option that the command does not take is refused', () => {
	expect(messageOf('tracks', '--car', 'x')).toMatch(/droprack tracks takes no --car/);
	expect(messageOf('rank', 'x', '--pair', '33/38')).toMatch(/droprack rank takes no --pair/);
});

test('a missing value, a value too many and a word too many are named', () => {
	expect(messageOf('rank', 'x', '--car')).toBe('--car needs a value: --car CAR.');
	expect(messageOf('rank', 'x', '--car', '--json')).toBe('--car needs a value: --car CAR.');
	expect(messageOf('rank', 'x', '--car=')).toBe('--car needs a value: --car CAR.');
	expect(messageOf('rank', 'x', '--json=yes')).toBe('--json takes no value, found yes.');
	expect(messageOf('rank', 'Demo', 'Short')).toMatch(
		/takes one TRACK, found also: Short\. A name with blanks needs quotes/,
	);
	expect(messageOf('tracks', 'short')).toMatch(/takes no argument, found also: short/);
});

test('rows are counted from one, and units are us or metric', () => {
	for (const top of ['0', '-1', '1.5', 'all', '1e3'])
		expect(messageOf('rank', 'x', `--top=${top}`)).toMatch(/--top is a whole number from 1/);
	expect(messageOf('rank', 'x', '--units', 'imperial')).toBe('--units is us or metric, found imperial.');
});
