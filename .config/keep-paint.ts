import type {Plugin} from 'vite';

/** More lines than a session shows in a while; then the memory is let go. */
const most = {styledChars: 2000, widths: 5000, blockWidths: 2000};

/**
 * Ink takes every line apart into styled characters for every frame, and forgets them after it: a third of what a frame
 * costs. Here it remembers them. The build fails when Ink's own text is no longer what is changed here.
 */
export const keepPaint = (): Plugin => ({
	name: 'keep-paint',
	apply: 'build',
	enforce: 'pre',
	transform(code, id) {
		if (!/[\\/]ink[\\/]build[\\/]output\.js$/.test(id)) return undefined;
		const fresh = 'caches = new OutputCaches();';
		if (!code.includes(fresh)) this.error(`${id} no longer has ${fresh}`);
		const isSmall = Object.entries(most)
			.map(([name, count]) => `kept.${name}.size < ${count}`)
			.join(' && ');
		const kept = `caches = Output.kept(); static #kept; static kept() {
			const kept = Output.#kept;
			return kept && ${isSmall} ? kept : (Output.#kept = new OutputCaches());
		}`;
		return {code: code.replace(fresh, () => kept), map: null};
	},
});
