import {readdirSync, readFileSync} from 'node:fs';
import {dirname, join, normalize, relative} from 'node:path';
import {expect, test} from 'vitest';

const source = new URL('../../source', import.meta.url).pathname;

/** What views, commands and screens all show. */
const belowText = [
	'drivetrain',
	'planning',
	'documents',
	'store',
	'sharing',
	'logs',
	'practice',
	'odds',
	'life',
	'loading',
] as const;

/** What each layer may import of the others; a layer may always import itself. */
const layers: Record<string, readonly string[]> = {
	drivetrain: [],
	planning: ['drivetrain'],
	documents: ['drivetrain'],
	store: ['drivetrain', 'documents'],
	sharing: ['drivetrain', 'planning', 'documents'],
	logs: ['drivetrain', 'documents'],
	practice: ['drivetrain', 'planning', 'documents', 'logs'],
	odds: ['drivetrain', 'planning'],
	life: ['drivetrain', 'planning'],
	loading: ['drivetrain', 'planning'],
	text: [...belowText],
	commands: [...belowText, 'text', 'screens'],
	screens: [...belowText, 'text'],
};

/** Packages and built-in modules that only some layers may know. */
const outside: Record<string, readonly string[]> = {
	ink: ['screens'],
	react: ['screens'],
	'ink-table': ['screens'],
	conf: ['store'],
	mathjs: ['documents', 'practice', 'odds'],
	'ml-matrix': ['practice'],
	zod: ['documents', 'sharing'],
};

type Import = {file: string; layer: string; target: string};

const files = readdirSync(source, {recursive: true, encoding: 'utf8'}).filter(name => /\.tsx?$/.test(name));

function importsOf(file: string): Import[] {
	const text = readFileSync(join(source, file), 'utf8');
	const targets = [...text.matchAll(/(?:\bfrom\s*|\bimport\s*\(?\s*)'([^']+)'/g)].map(match => match[1]!);
	return targets.map(target => ({file, layer: file.split('/')[0]!, target}));
}

const imports = files.flatMap(importsOf);

const within = ({file, target}: Import) => normalize(join(dirname(file), target));

function goesTheRightWay(one: Import): boolean {
	const allowed = layers[one.layer];
	if (!one.target.startsWith('.') || one.target.endsWith('/package.json') || allowed === undefined) return true;
	const path = within(one);
	return [one.layer, ...allowed].some(layer => path.startsWith(`${layer}/`));
}

function knowsThePackage({layer, target}: Import): boolean {
	if (target.startsWith('.')) return true;
	const name = target.startsWith('@') ? target.split('/').slice(0, 2).join('/') : target.split('/')[0]!;
	return outside[name]?.includes(layer) ?? true;
}

const told = (one: Import) => `${one.file} imports ${one.target}`;

test('every folder of the source is a layer with a rule', () => {
	const folders = files.filter(file => file.includes('/')).map(file => file.split('/')[0]!);
	expect([...new Set(folders)].filter(folder => !(folder in layers))).toEqual([]);
});

test('imports go one way', () => {
	expect(imports.filter(one => !goesTheRightWay(one)).map(told)).toEqual([]);
});

test('a package is known only where it belongs', () => {
	expect(imports.filter(one => !knowsThePackage(one)).map(told)).toEqual([]);
});

test('the arithmetic, planning and what stands on them touch nothing outside: no built-in module, no clock, no chance', () => {
	const pure = files.filter(file => /^(drivetrain|planning|practice|odds|life|loading)\//.test(file));
	const reaching = pure.filter(file => {
		const text = readFileSync(join(source, file), 'utf8').replace(/\/\*[\s\S]*?\*\/|\/\/.*/g, '');
		return /from 'node:|\bprocess\.|Date\.now|new Date|Math\.random|performance\./.test(text);
	});
	expect(reaching).toEqual([]);
});

test('no file imports itself in a circle', () => {
	const next = new Map<string, string[]>();
	for (const one of imports) {
		if (one.target.startsWith('.')) next.set(one.file, [...(next.get(one.file) ?? []), within(one)]);
	}
	const circles: string[] = [];
	const done = new Set<string>();
	const walk = (file: string, path: readonly string[]): void => {
		if (path.includes(file)) circles.push([...path.slice(path.indexOf(file)), file].join(' > '));
		if (path.includes(file) || done.has(file)) return;
		for (const target of next.get(file) ?? []) walk(target, [...path, file]);
		done.add(file);
	};
	for (const file of files) walk(relative('', file), []);
	expect(circles).toEqual([]);
});
