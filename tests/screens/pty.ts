/** Runs a program in a pseudo-terminal and keeps the screen that it draws, read through a terminal emulator. */
import {spawn} from '@lydell/node-pty';
import headless from '@xterm/headless';

export type Size = {readonly columns: number; readonly rows: number};
type Options = Partial<Size> & {readonly environment?: Record<string, string | undefined>};
type Exit = {readonly exitCode: number; readonly signal?: number | undefined};

export class Pty {
	readonly emulator: InstanceType<typeof headless.Terminal>;
	/** Everything that was written, in order. */
	written = '';
	exit: Exit | undefined;
	readonly #process: ReturnType<typeof spawn>;
	readonly #listeners = new Set<() => void>();
	#pending = 0;

	constructor(file: string, words: readonly string[], {columns = 80, rows = 24, environment = {}}: Options = {}) {
		this.emulator = new headless.Terminal({cols: columns, rows, allowProposedApi: true, scrollback: 1000});
		// Ink draws nothing where CI is set, whatever its value.
		const {CI: _, CONTINUOUS_INTEGRATION: __, ...inherited} = process.env;
		const env = {...inherited, TERM: 'xterm-256color', ...environment} as Record<string, string>;
		this.#process = spawn(file, [...words], {cols: columns, rows, name: env.TERM!, env});
		this.#process.onData(data => {
			this.written += data;
			this.#pending++;
			this.emulator.write(data, () => {
				this.#pending--;
				this.#tell();
			});
		});
		this.#process.onExit(exit => {
			this.exit = exit;
			this.#tell();
		});
	}

	get pid(): number {
		return this.#process.pid;
	}

	lines(): string[] {
		const {active} = this.emulator.buffer;
		return Array.from(
			{length: this.emulator.rows},
			(_, y) => active.getLine(active.viewportY + y)?.translateToString(true) ?? '',
		);
	}

	screen(): string {
		return this.lines().join('\n').trimEnd();
	}

	press(keys: string): void {
		this.#process.write(keys);
	}

	resize({columns, rows}: Size): void {
		this.emulator.resize(columns, rows);
		this.#process.resize(columns, rows);
	}

	/** The screen once it shows what is waited for. */
	waitFor(what: string | RegExp | (() => boolean), limitMs = 15_000): Promise<string> {
		const holds = (): boolean => {
			if (this.#pending > 0) return false;
			if (typeof what === 'function') return what();
			return typeof what === 'string' ? this.screen().includes(what) : what.test(this.screen());
		};
		return new Promise((resolve, reject) => {
			const done = (end: () => void) => {
				clearTimeout(timer);
				this.#listeners.delete(check);
				end();
			};
			const check = () => {
				if (holds()) done(() => resolve(this.screen()));
			};
			const timer = setTimeout(
				() =>
					done(() => reject(new Error(`waited ${limitMs} ms for ${String(what)}; the screen is:\n${this.screen()}`))),
				limitMs,
			);
			this.#listeners.add(check);
			check();
		});
	}

	async ended(): Promise<Exit> {
		await this.waitFor(() => this.exit !== undefined);
		return this.exit!;
	}

	signal(name: string): void {
		process.kill(this.pid, name);
	}

	/** A terminal that takes nothing more for now, as on a slow line. */
	pause(): void {
		this.#process.pause();
	}

	resume(): void {
		this.#process.resume();
	}

	/** The window is closed, or the line is cut. */
	hangUp(): void {
		(this.#process as unknown as {destroy(): void}).destroy();
	}

	/** For the end of a test: whatever is left. */
	close(): void {
		if (this.exit === undefined) this.#process.kill('SIGKILL');
		this.emulator.dispose();
	}

	#tell(): void {
		for (const listener of this.#listeners) listener();
	}
}
