import {defineConfig} from 'vitest/config';
import {thirdParty} from './third-party.ts';

const root = new URL('..', import.meta.url).pathname;
/** What every listing loads, and what every answer about a track loads: few files, since opening one costs more than reading it. */
const groups = [
	{
		name: 'common',
		test: /source\/store\/|source\/commands\/(text\/|print|reply|shelf|find-document)|source\/documents\/(visible|nearest)|picocolors|fast-string|fastest-lev/,
	},
	{name: 'plan', test: /source\/(planning|drivetrain)\/|source\/commands\/(load-documents|read-input|faults)/},
];
const hashBang = '#!/usr/bin/env node';

export default defineConfig(({command}) => ({
	root,
	// Only for the build: in tests it would send every library through the transformer.
	...(command === 'build' && {ssr: {noExternal: true as const}, define: {'process.env.NODE_ENV': '"production"'}}),
	plugins: [thirdParty()],
	build: {
		ssr: 'source/droprack.ts',
		target: 'node20',
		minify: true,
		outDir: 'dist',
		emptyOutDir: true,
		rolldownOptions: {
			output: {
				entryFileNames: 'droprack.js',
				codeSplitting: {groups},
				chunkFileNames: 'chunks/[name].js',
				banner: (chunk: {isEntry: boolean}) => (chunk.isEntry ? hashBang : ''),
			},
		},
	},
	test: {
		include: ['tests/**/*.test.ts'],
		testTimeout: 30_000,
		globalSetup: '.config/build-when-stale.ts',
		reporters: ['default', './.config/tally-reporter.ts'],
	},
}));
