/** Before a test run: builds `dist` if anything that it is made from is newer, so that no test meets an old program. */
import {existsSync, readdirSync, statSync} from 'node:fs';
import {join} from 'node:path';
import {fileURLToPath} from 'node:url';
import {build} from 'vite';

const root = fileURLToPath(new URL('..', import.meta.url));
const madeFrom = ['source', '.config', 'package.json', 'package-lock.json'];

/** The latest change of a file, or of anything in a directory. A deleted file changes its directory. */
function changedMs(path: string): number {
	const inside = statSync(path).isDirectory() ? readdirSync(path).map(name => changedMs(join(path, name))) : [];
	return Math.max(statSync(path).mtimeMs, ...inside);
}

function isStale(): boolean {
	const built = join(root, 'dist', 'droprack.js');
	if (!existsSync(built)) return true;
	return madeFrom.some(path => changedMs(join(root, path)) > statSync(built).mtimeMs);
}

export async function setup(): Promise<void> {
	if (isStale())
		await build({configFile: join(root, '.config', 'vite.config.ts'), mode: 'production', logLevel: 'warn'});
}
