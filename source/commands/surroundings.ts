/** The outer world as the commands see it, so that a test can stand in for it. */
import type {ProgressTerminal} from './progress-line.ts';

export type Surroundings = {
	/** The directory of the shipped tracks; the shipped cars are in `cars/` below it. */
	shipped: URL;
	environment: Readonly<Record<string, string | undefined>>;
	now: Date;
	/** Width of the text output. */
	columns: number;
	/** Height of the terminal; undefined without one. */
	rows?: number | undefined;
	color: boolean;
	standardInput: () => AsyncIterable<Uint8Array>;
	/** Where a long reading says how far it is; undefined where no terminal looks on. */
	progress?: () => ProgressTerminal | undefined;
};

const columnsThroughPipe = 80;

/** Whether to color, by the usual two variables and otherwise by whether a terminal is looking. */
export const wantsColor = (environment: Surroundings['environment'], isTerminal: boolean): boolean => {
	if (environment.NO_COLOR) return false;
	const forced = environment.FORCE_COLOR;
	if (forced !== undefined) return forced !== '0' && forced !== 'false';
	return isTerminal && environment.TERM !== 'dumb';
};

/** Whether a screen can be drawn: a terminal at both ends, one that moves its cursor. */
export const canDraw = (environment: Surroundings['environment'], isTerminal: boolean): boolean =>
	isTerminal && environment.TERM !== 'dumb';

const progressOn = (
	stream: NodeJS.WriteStream,
	environment: Surroundings['environment'],
): ProgressTerminal | undefined =>
	stream.isTTY === true && environment.TERM !== 'dumb'
		? {write: text => void stream.write(text), columns: stream.columns || columnsThroughPipe}
		: undefined;

export const processSurroundings = (shipped: URL): Surroundings => ({
	shipped,
	environment: process.env,
	now: new Date(),
	columns: process.stdout.columns || columnsThroughPipe,
	rows: process.stdout.rows,
	color: wantsColor(process.env, process.stdout.isTTY === true),
	standardInput: () => process.stdin,
	// A stream is made when it is first asked for, and few commands read for long.
	progress: () => progressOn(process.stderr, process.env),
});
