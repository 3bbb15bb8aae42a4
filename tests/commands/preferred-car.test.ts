import {mkdirSync, readFileSync, writeFileSync} from 'node:fs';
import {join} from 'node:path';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {asNobody, fixture, makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
}, 120_000);
afterAll(() => program.remove());

const car = JSON.parse(readFileSync(fixture('car.json'), 'utf8'));

test('the preferred car is used where none is named, until it is cleared', async () => {
	const environment = {DROPRACK_HOME: join(program.place, 'preferring')};
	const other = join(program.place, 'tracks', 'cars', 'other.json');
	writeFileSync(other, JSON.stringify({...car, name: 'Other Car'}));
	expect(await program.run(['cars', '--prefer', 'other car'], {environment})).toMatchObject({
		status: 0,
		out: '',
		err: 'droprack: Other Car is used where no car is named.\n',
	});
	expect((await program.run(['cars'], {environment})).out).toMatch(/^Other Car\* /m);
	expect((await program.run([], {environment})).out).toMatch(/^Other Car · /);
	expect((await program.run(['rank', 'fixture oval', '--car', 'demo'], {environment})).out).toMatch(/^Fixture Car · /);
	expect((await program.run(['cars', '--prefer', 'none'], {environment})).status).toBe(0);
	expect((await program.run([], {environment})).out).toMatch(/^Fixture Car · /);
});

test('a preferred car that is gone is an error, not another car', async () => {
	const home = join(program.place, 'gone');
	mkdirSync(home);
	writeFileSync(join(home, 'preferences.json'), '{"version": 1, "car": "Sold Car"}');
	const {status, out, err} = await program.run([], {environment: {DROPRACK_HOME: home}});
	expect({status, out}).toEqual({status: 2, out: ''});
	expect(err).toMatch(/no car called Sold Car[\s\S]*--prefer none/);
});

test('broken preferences are named, left as they are, and stop nothing', async () => {
	const home = join(program.place, 'broken');
	mkdirSync(home);
	const file = join(home, 'preferences.json');
	writeFileSync(file, '{"car": ');
	const environment = {DROPRACK_HOME: home};
	const {status, out, err} = await program.run([], {environment});
	expect(status).toBe(0);
	expect(out).toMatch(/^Fixture Car · /);
	expect(err).toMatch(/preferences\.json: the preferences are not valid JSON; left as it is.*The demo car is used/);
	expect((await program.run(['cars', '--prefer', 'demo'], {environment})).status).toBe(2);
	expect(readFileSync(file, 'utf8')).toBe('{"car": ');
});

test('a home that cannot be written is status 3', async () => {
	const home = join(program.place, 'locked');
	mkdirSync(home, {mode: 0o555});
	const {status, err} = await program.run(['cars', '--prefer', 'demo'], {
		environment: {DROPRACK_HOME: home},
		spawn: asNobody,
	});
	expect(status).toBe(3);
	expect(err).toMatch(/preferences\.json: cannot be written \(EACCES\)/);
});
