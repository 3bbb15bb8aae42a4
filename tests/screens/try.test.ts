import {test} from 'vitest';
import {Pty} from './pty.ts';
test('x', async () => {
		const p = new Pty('node', ['--cpu-prof', '--cpu-prof-dir=/tmp/prof', '--cpu-prof-interval', '200', 'dist/droprack.js'], {columns: 100, rows: 35}); await p.waitFor('111 rows'); await p.waitFor('34/35  C');
		p.press('q'); await p.ended(); p.close();
}, 60000);
