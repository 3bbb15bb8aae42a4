import {readFileSync} from 'node:fs';
import {afterAll, beforeAll, expect, test} from 'vitest';
import {makeProgram} from './program.ts';

let program: ReturnType<typeof makeProgram>;
beforeAll(() => {
	program = makeProgram();
});
afterAll(() => program.remove());

/** Sentences that stay in a library's code when it is made small. */
const marks = {
	mathjs: 'Units do not match',
	conf: 'Config schema violation',
	zod: 'Invalid element in',
	ink: 'ink-root',
	react: 'react.transitional.element',
};
const marksIn = (files: readonly string[]) => {
	const code = files.map(file => readFileSync(file, 'utf8')).join('');
	return Object.entries(marks).flatMap(([name, mark]) => (code.includes(mark) ? [name] : []));
};
const hook = `export const load = (url, context, next) => { process._rawDebug("LOADED " + url); return next(url, context); };`;
const register = `import {register} from 'node:module'; register('data:text/javascript,${encodeURIComponent(hook)}');`;
const loadedBy = async (words: string[]): Promise<string[]> => {
	const {err} = await program.run(words, {node: ['--import', `data:text/javascript,${encodeURIComponent(register)}`]});
	return [...err.matchAll(/^LOADED file:\/\/(.*)$/gm)].map(match => match[1] ?? '');
};

test('plain commands load only what they need', async () => {
	const all = marksIn(program.chunks());
	for (const name of ['mathjs', 'conf']) expect(all).toContain(name);
	expect(
		marksIn(await loadedBy(['cars', '--prefer', 'none'])).concat(marksIn(await loadedBy(['cars', '--prefer', 'demo']))),
	).toContain('conf');
	for (const words of [['tracks'], ['cars'], ['show', 'fixture oval'], ['--help'], ['--version']]) {
		const loaded = await loadedBy(words);
		expect(loaded.length).toBeGreaterThan(0);
		expect(marksIn(loaded)).toEqual([]);
		expect(loaded.map(file => readFileSync(file).length).reduce((sum, size) => sum + size)).toBeLessThan(64_000);
	}
	for (const words of [
		['rank', 'fixture oval'],
		['rpm', 'fixture oval'],
		['run', 'fixture oval'],
		['schema', 'car'],
	]) {
		const loaded = marksIn(await loadedBy(words));
		for (const name of ['mathjs', 'conf', 'ink', 'react']) expect(loaded).not.toContain(name);
	}
});

test('ranking stays under 80 MB', async () => {
	const report = `data:text/javascript,process.on('exit', () => process._rawDebug('RSS ' + process.resourceUsage().maxRSS));`;
	const {err} = await program.run(['rank', 'fixture oval'], {node: ['--import', report]});
	const kilobytes = Number(/RSS (\d+)/.exec(err)?.[1]);
	expect(kilobytes).toBeGreaterThan(10_000);
	expect(kilobytes).toBeLessThan(80_000);
});
