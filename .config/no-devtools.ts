import type {Plugin} from 'vite';

const asked = "process.env['DEV'] === 'true'";

/**
 * Where DEV is set, Ink would connect to React's developer tools, which are not installed, by a web socket, and read a
 * file that the bundle does not have. Here it never does. The build fails when Ink's own text is no longer what is changed.
 */
export const noDevtools = (): Plugin => ({
	name: 'no-devtools',
	apply: 'build',
	enforce: 'pre',
	load: id => (/[\\/]ink[\\/]build[\\/]devtools\.js$/.test(id) ? 'export {};' : undefined),
	transform(code, id) {
		if (!/[\\/]ink[\\/]build[\\/]utils\.js$/.test(id)) return undefined;
		if (!code.includes(asked)) this.error(`${id} no longer has ${asked}`);
		return {code: code.replace(asked, 'false'), map: null};
	},
});
