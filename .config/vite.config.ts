import {defineConfig} from 'vitest/config';
import {inkTable} from './ink-table.ts';
import {keepPaint} from './keep-paint.ts';
import {noDevtools} from './no-devtools.ts';
import {thirdParty} from './third-party.ts';

const root = new URL('..', import.meta.url).pathname;
/** What every listing loads, and what every answer about a track loads: few files, since opening one costs more than reading it. */
const groups = [
	{
		name: 'common',
		test: /source\/store\/|source\/text\/(?!.*(?:-view|chart|canvas|ticks|learned|practice))|source\/text\/list-view|source\/commands\/(print|reply|shelf|find-document)|source\/documents\/(visible|nearest)|picocolors|fast-string|fastest-lev/,
	},
	{
		name: 'plan',
		test: /source\/(planning|drivetrain)\/|source\/text\/(heading|rank|run|rpm|check)-view|source\/commands\/(load-documents|read-input|faults)/,
	},
];
const hashBang = '#!/usr/bin/env node';

export default defineConfig(({command}) => ({
	root,
	plugins: [inkTable(), keepPaint(), noDevtools(), thirdParty()],
	// Only for the build: in tests it would send every library through the transformer.
	...(command === 'build' && {
		ssr: {noExternal: true as const},
		define: {'process.env.NODE_ENV': '"production"', fetch: 'undefined'},
		// Also where NODE_ENV says otherwise, as in a build that a test asks for.
		oxc: {jsx: {development: false}},
		resolve: {
			alias: {
				// The same widths at a fraction of the start: the other's patterns take 45 ms to be made ready.
				'string-width': 'fast-string-width',
			},
		},
	}),
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
		setupFiles: ['tests/seed.ts'],
		include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
		// With the full counts one property may take minutes, on two cores that others use too.
		testTimeout: process.env.DROPRACK_FULL === '1' ? 900_000 : 30_000,
		server: {deps: {inline: ['ink-table']}},
		globalSetup: '.config/build-when-stale.ts',
		reporters: ['default', './.config/tally-reporter.ts'],
	},
}));
