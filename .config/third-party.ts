/** Writes beside the bundle whose code it holds: name, version and license of every package that ends in it. */
import {readdirSync, readFileSync} from 'node:fs';
import {join} from 'node:path';
import {fileURLToPath} from 'node:url';
import type {Plugin} from 'vite';

type Manifest = {name: string; version: string; license?: string; author?: string | {name: string}};

const packages = fileURLToPath(new URL('../node_modules', import.meta.url));

/** The directory of the package that a module belongs to; undefined for our own. The bundler adds a little of itself. */
function packageOf(id: string): string | undefined {
	if (id.startsWith('\0rolldown/')) return join(packages, 'rolldown');
	return /^\0?(.*\/node_modules\/(?:@[^/]+\/)?[^/]+)\//.exec(id)?.[1];
}

/** The words of the MIT license without the holder: as in our own. */
const mitWords = readFileSync(new URL('../LICENSE', import.meta.url), 'utf8')
	.split(/^Copyright.*$/m)[1]!
	.trim();

/** For a package that comes without the text: the holder it names, with the words of the license it names. */
function standardText({license, author}: Manifest): string {
	const holder = typeof author === 'object' ? author.name : author;
	const words = license === 'MIT' ? mitWords : '(The package comes without the text of its license.)';
	return `Copyright (c) ${holder ?? 'its authors'}\n\n${words}`;
}

function licenseText(directory: string, manifest: Manifest): string {
	const files = readdirSync(directory).filter(name => /^(licen[cs]e|copying|notice)/i.test(name));
	if (files.length > 0) return files.map(name => readFileSync(join(directory, name), 'utf8').trim()).join('\n\n');
	const readme = readdirSync(directory).find(name => /^readme/i.test(name));
	const section = /^#+ *licen[cs]e\b.*$([\s\S]*)/im.exec(
		readme === undefined ? '' : readFileSync(join(directory, readme), 'utf8'),
	);
	return section?.[1]?.trim() ?? standardText(manifest);
}

function notice(directory: string): string {
	const manifest = JSON.parse(readFileSync(join(directory, 'package.json'), 'utf8')) as Manifest;
	const {name, version, license} = manifest;
	return `${name} ${version}\nLicense: ${license ?? 'see below'}\n\n${licenseText(directory, manifest)}\n`;
}

export function thirdParty(): Plugin {
	return {
		name: 'third-party',
		generateBundle(_, bundle) {
			const modules = Object.values(bundle).flatMap(part => (part.type === 'chunk' ? part.moduleIds : []));
			const directories = new Set(modules.map(packageOf).filter(directory => directory !== undefined));
			const notices = [...directories].map(notice).sort();
			const head = 'Droprack holds code of these packages, each under the license given with it.\n';
			this.emitFile({
				type: 'asset',
				fileName: 'THIRD-PARTY.txt',
				source: [head, ...notices].join(`\n${'-'.repeat(80)}\n\n`),
			});
		},
	};
}
