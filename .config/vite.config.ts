import {defineConfig} from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

export default defineConfig({
	root,
	ssr: {noExternal: true},
	build: {ssr: 'source/droprack.ts', target: 'node20', minify: true, outDir: 'dist', emptyOutDir: true},
	test: {include: ['tests/**/*.test.ts'], testTimeout: 30_000},
});
