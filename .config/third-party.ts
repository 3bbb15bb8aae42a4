/** Writes beside the bundle whose code it holds: name, version and license of every package that ends in it. */
import {readdirSync, readFileSync} from 'node:fs';
import {join} from 'node:path';
import type {Plugin} from 'vite';

type Manifest = {name: string; version: string; license?: string};

/** The directory of the package that a module belongs to; undefined for our own. */
function packageOf(id: string): string | undefined {
	return /^\0?(.*\/node_modules\/(?:@[^/]+\/)?[^/]+)\//.exec(id)?.[1];
}

function licenseText(directory: string, modules: readonly string[]): string {
	const files = readdirSync(directory).filter(name => /^(licen[cs]e|copying|notice)/i.test(name));
	if (files.length > 0) return files.map(name => readFileSync(join(directory, name), 'utf8').trim()).join('\n\n');
	const readme = readdirSync(directory).find(name => /^readme/i.test(name));
	const section = /^#+ *licen[cs]e\b.*$([\s\S]*)/im.exec(
		readme === undefined ? '' : readFileSync(join(directory, readme), 'utf8'),
	);
	return section?.[1]?.trim() ?? sourceNotice(modules) ?? '(The package comes without the text of its license.)';
}

/** What the head of a source file says, where a package has nothing else. */
function sourceNotice(modules: readonly string[]): string | undefined {
	const heads = modules.map(id => /^\s*\/\*[\s\S]*?\*\//.exec(readFileSync(id.replace(/^\0/, ''), 'utf8'))?.[0]);
	const head = heads.find(text => text !== undefined && /copyright/i.test(text));
	return head?.replace(/^[ \t]*\/?\*+\/?[ \t]?/gm, '').trim();
}

function notice(directory: string, modules: readonly string[]): string {
	const {name, version, license} = JSON.parse(readFileSync(join(directory, 'package.json'), 'utf8')) as Manifest;
	return `${name} ${version}\nLicense: ${license ?? 'see below'}\n\n${licenseText(directory, modules)}\n`;
}

export function thirdParty(): Plugin {
	return {
		name: 'third-party',
		generateBundle(_, bundle) {
			const modules = Object.values(bundle).flatMap(part => (part.type === 'chunk' ? part.moduleIds : []));
			const packages = new Set(modules.map(packageOf).filter(directory => directory !== undefined));
			const own = (directory: string) => modules.filter(id => packageOf(id) === directory && !id.includes('?'));
			const notices = [...packages].map(directory => notice(directory, own(directory))).sort();
			const head = 'Droprack holds code of these packages, each under the license given with it.\n';
			this.emitFile({
				type: 'asset',
				fileName: 'THIRD-PARTY.txt',
				source: [head, ...notices].join(`\n${'-'.repeat(80)}\n\n`),
			});
		},
	};
}
