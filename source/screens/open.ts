/** Opens the screen, and ends when a person leaves it. */
import type {UnitSystem} from '../text/units.ts';
import type {Keeper} from './keeper.ts';
import {painted, type Theme} from './parts/theme.ts';
import type {Documents, OpenDocument} from './session/documents.ts';
import {LiveSession} from './session/live.ts';
import {startSession} from './session/session.ts';
import {Screen} from './terminal/screen.ts';
import {takeTerminal} from './terminal/take-terminal.ts';
import {frameLines, frameOf} from './views/frame.ts';

export type Opening = {
	readonly documents: Documents;
	readonly catalog: readonly OpenDocument[];
	readonly units: UnitSystem;
	readonly theme: Theme;
	readonly keeper: Keeper;
	/** Whether the screen is read aloud. */
	readonly reader: boolean;
	/** Something that a person should know at the start. */
	readonly notice: string | undefined;
};

/** The documents as they stood when the screen was left. */
export async function openScreen(opening: Opening): Promise<Documents> {
	const live = await (opening.reader ? openForReader(opening) : openOnScreen(opening));
	return live.state().session.history.present;
}

/** Nothing is drawn at a place: Ink writes text, and Ctrl+Z and signals do what they do to every program. */
async function openForReader(opening: Opening): Promise<LiveSession> {
	let unmount = () => {};
	const outside = {leave: () => unmount(), suspend() {}, redraw() {}};
	const live = new LiveSession(sessionOf(opening), opening.catalog, opening.keeper, outside, clock);
	const {readAloud} = await import('./draw-reader.tsx');
	const ink = readAloud(live);
	unmount = ink.unmount;
	await ink.left;
	return live;
}

async function openOnScreen(opening: Opening): Promise<LiveSession> {
	const {keeper, theme} = opening;
	const screen = new Screen(process.stdout);
	let unmount = () => {};
	const terminal = takeTerminal({
		stopDrawing: () => {
			screen.close();
			unmount();
		},
		comeBack: () => screen.redraw(),
		lastWords: () => {
			const where = keeper.where();
			return where === undefined ? '' : `The unsaved session is in ${where}; the next start offers it.\n`;
		},
	});
	process.on('SIGWINCH', () => screen.windowChanged());
	const outside = {
		leave: () => unmount(),
		suspend: () => terminal.suspend(),
		redraw: () => screen.redraw(),
	};
	const live = new LiveSession(sessionOf(opening), opening.catalog, keeper, outside, clock);
	const stopDrawing = drawUntilInkIsThere(live, screen, theme);
	try {
		await rankedOr(live, patienceMs);
		const {drawWithInk} = await import('./draw.tsx');
		stopDrawing();
		const ink = drawWithInk(live, theme, screen);
		unmount = ink.unmount;
		await ink.left;
	} catch (error) {
		terminal.crash(error);
	}
	terminal.giveBack();
	return live;
}

function sessionOf({documents, units, notice, keeper}: Opening) {
	const session = {...startSession(documents, units), notice};
	return keeper.earlier === undefined
		? session
		: {...session, over: {is: 'recovery' as const, documents: keeper.earlier}};
}

/** Ink takes as long to load as everything else: what is known already is on the screen meanwhile, and looks the same. */
function drawUntilInkIsThere(live: LiveSession, screen: Screen, theme: Theme): () => void {
	const draw = () => {
		const frame = frameOf(live.state(), {...screen.size, ascii: theme.ascii}, 0);
		screen.write(
			frameLines(frame)
				.map(pieces => painted(pieces, theme))
				.join('\n'),
		);
	};
	draw();
	screen.on('resize', draw);
	const stop = live.subscribe(draw);
	return () => {
		screen.off('resize', draw);
		stop();
	};
}

/** Nobody presses a key sooner; a long rack is then ranked beside the loading. */
const patienceMs = 150;

/** When the rack has been ranked, or after so many milliseconds. */
function rankedOr(live: LiveSession, limitMs: number): Promise<void> {
	return new Promise(resolve => {
		const timer = setTimeout(done, limitMs);
		const stop = live.subscribe(check);
		function done() {
			clearTimeout(timer);
			stop();
			resolve();
		}
		function check() {
			if (live.state().answer.is !== 'working') done();
		}
		check();
	});
}

const clock = {
	now: () => performance.now(),
	later: (act: () => void) => {
		const waiting = setImmediate(act);
		return () => clearImmediate(waiting);
	},
};
