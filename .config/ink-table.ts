import type {Plugin} from 'vite';

/**
 * ink-table is CommonJS, and its `require('ink')` cannot load a module with a top-level await: its body is handed the
 * imported modules instead. Nothing of what it does is changed.
 */
export const inkTable = (): Plugin => ({
	name: 'ink-table',
	enforce: 'pre',
	transform(code, id) {
		if (!/[\\/]ink-table[\\/]dist[\\/]index\.js$/.test(id)) return undefined;
		return {
			map: null,
			code: `import * as ink from 'ink';
import react from 'react';
import objectHash from 'object-hash';
const modules = {ink, react, 'object-hash': objectHash};
const exported = {};
((exports, require) => {${code}
})(exported, name => modules[name]);
export const {Header, Cell, Skeleton} = exported;
export default exported.default;
`,
		};
	},
});
