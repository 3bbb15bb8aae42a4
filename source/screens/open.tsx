/** Opens the screen, and ends when a person leaves it. */
import {render} from 'ink';
import type {UnitSystem} from '../commands/text/units.ts';
import {App} from './app.tsx';
import type {Keeper} from './keeper.ts';
import type {Theme} from './parts/theme.ts';
import type {Documents, OpenDocument} from './session/documents.ts';
import {LiveSession} from './session/live.ts';
import {startSession} from './session/session.ts';
import {Screen} from './terminal/screen.ts';
import {takeTerminal} from './terminal/take-terminal.ts';

export type Opening = {
	readonly documents: Documents;
	readonly catalog: readonly OpenDocument[];
	readonly units: UnitSystem;
	readonly theme: Theme;
	readonly keeper: Keeper;
	/** Something that a person should know at the start. */
	readonly notice: string | undefined;
};

export async function openScreen({documents, catalog, units, theme, keeper, notice}: Opening): Promise<void> {
	const screen = new Screen(process.stdout);
	let unmount = () => {};
	const terminal = takeTerminal({
		stopDrawing: () => {
			screen.close();
			unmount();
		},
		lastWords: () => {
			const where = keeper.where();
			return where === undefined ? '' : `The unsaved session is in ${where}; the next start offers it.\n`;
		},
	});
	const outside = {
		leave: () => unmount(),
		suspend: () => terminal.suspend(() => screen.redraw()),
		redraw: () => screen.redraw(),
	};
	const clock = {
		now: () => performance.now(),
		later: (act: () => void) => {
			const waiting = setImmediate(act);
			return () => clearImmediate(waiting);
		},
	};
	const session = {...startSession(documents, units), notice};
	const offered = keeper.earlier ? {...session, over: {is: 'recovery' as const, documents: keeper.earlier}} : session;
	const live = new LiveSession(offered, catalog, keeper, outside, clock);
	const app = render(<App live={live} theme={theme} screen={screen} />, {
		stdout: screen as unknown as NodeJS.WriteStream,
		debug: true,
		exitOnCtrlC: false,
		patchConsole: false,
	});
	unmount = app.unmount;
	try {
		await app.waitUntilExit();
	} catch (error) {
		terminal.crash(error);
	}
	terminal.giveBack();
}
