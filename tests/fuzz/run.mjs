/** Each file of the source stays a file of its own, so that the coverage is known by file. */
import {runBundled} from '../../.config/run-bundled.mjs';

process.env.DROPRACK_FULL = '1';
await runBundled('tests/fuzz/main.ts', process.argv.slice(2), {
	output: {preserveModules: true, preserveModulesRoot: '.'},
	beside: ['tests/fixtures'],
});
