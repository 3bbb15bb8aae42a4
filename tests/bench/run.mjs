/** Builds the program, bundles the benchmarks and runs them with plain Node, so that nothing but the code itself is timed. */
import {fileURLToPath} from 'node:url';
import {build} from 'vite';
import {runBundled} from '../../.config/run-bundled.mjs';

const config = fileURLToPath(new URL('../../.config/vite.config.ts', import.meta.url));
await build({configFile: config, mode: 'production', logLevel: 'warn'});
// The other one runs as a process of its own.
await runBundled('tests/bench/main.ts', process.argv.slice(2), {also: ['tests/bench/read-log.ts']});
