import {existsSync, readdirSync, readFileSync} from 'node:fs';
import {fileURLToPath} from 'node:url';
import {expect, test} from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
const text = readFileSync(`${root}DEVELOPERS.md`, 'utf8');
const quoted = [...text.matchAll(/`([^`\n]+)`/g)].map(match => match[1]!);

test('every path that DEVELOPERS.md names is there', () => {
	const paths = quoted.filter(word => /^(source|tests|tracks|\.config|\.ci)(\/[\w.-]+)*$/.test(word));
	expect(paths.length).toBeGreaterThan(40);
	expect(paths.filter(path => !existsSync(root + path))).toEqual([]);
});

test('its map names every folder of the source', () => {
	const folders = readdirSync(`${root}source`, {recursive: true, withFileTypes: true}).filter(entry =>
		entry.isDirectory(),
	);
	const paths = folders.map(entry => `${entry.parentPath}/${entry.name}`.slice(root.length).replace('//', '/'));
	expect(paths.filter(path => !quoted.includes(path))).toEqual([]);
});

test('it says of every package what it is for', () => {
	const {devDependencies} = JSON.parse(readFileSync(`${root}package.json`, 'utf8')) as {
		devDependencies: Record<string, string>;
	};
	const named = Object.keys(devDependencies).filter(name => !name.startsWith('@types/') && name !== 'vitest');
	const rows = text
		.split('\n')
		.filter(line => line.startsWith('| '))
		.map(line => line.split('|')[1]!.trim());
	const told = rows.flatMap(cell => cell.split(', '));
	expect(named.filter(name => !told.includes(name))).toEqual([]);
});
