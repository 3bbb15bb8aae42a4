/** The built program opened in a pseudo-terminal, and how it should leave it. */
import {expect} from 'vitest';
import type {makeProgram} from '../commands/program.ts';
import {Pty} from './pty.ts';

export type Opening = {
	columns?: number;
	rows?: number;
	environment?: Record<string, string | undefined>;
	words?: string[];
	/** For Node, before the program. */
	node?: string[];
};

export function openProgram(
	program: ReturnType<typeof makeProgram>,
	{columns = 80, rows = 24, environment = {}, words = [], node = []}: Opening = {},
): Pty {
	const env = {DROPRACK_HOME: program.home, NO_COLOR: undefined, FORCE_COLOR: undefined, ...environment};
	return new Pty(process.execPath, [...node, program.entry, ...words], {columns, rows, environment: env});
}

/** The fixtures, ranked, with the cursor on the first row. */
export const ranked = /10 rows[\s\S]*▸ +1 /;

/** The terminal as a shell expects it, and nothing of ours left on it. */
export function expectGivenBack(pty: Pty): void {
	expect(pty.emulator.buffer.active.type).toBe('normal');
	expect(pty.written).not.toContain('\x1B[3J');
	expect(pty.written.lastIndexOf('\x1B[?25h')).toBeGreaterThanOrEqual(pty.written.lastIndexOf('\x1B[?25l'));
	expect(pty.written.lastIndexOf('\x1B[?2004l')).toBeGreaterThanOrEqual(pty.written.lastIndexOf('\x1B[?2004h'));
}
