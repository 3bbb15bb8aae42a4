/** Takes the whole terminal, and gives it back however the process ends (all but SIGKILL). */
import {writeSync} from 'node:fs';

const alternateScreen = '\x1B[?1049h\x1B[H\x1B[2J';
const wholePastes = '\x1B[?2004h';
const enter = alternateScreen + wholePastes;
const leave = '\x1B[?2004l\x1B[?1049l\x1B[?25h';

const standardOutput = 1;
/** A shell gives 128 and the number of the signal. */
const signals = {SIGINT: 2, SIGTERM: 15, SIGHUP: 1} as const;
const signalStatus = 128;
const faultStatus = 70;

export type Taken = {
	/** Back to the terminal as it was; does nothing the second time. */
	giveBack(): void;
	/** Gives back, then tells what went wrong, and ends the process. */
	crash(error: unknown): void;
	/** Ctrl+Z: back to the shell, and here again at `fg`. */
	suspend(): void;
};

export type Leaving = {
	/** Called once, before the terminal is given back: nothing may be drawn any more. */
	stopDrawing(): void;
	/** The terminal is ours again after a stop, with nothing on it. */
	comeBack(): void;
	/** What a person should read after a crash, such as where the session was saved. */
	lastWords(): string;
};

/** A stop that was asked for comes at once; where nobody could continue us, the system passes it over. */
const stopWithinMs = 100;

export function takeTerminal({stopDrawing, comeBack, lastWords}: Leaving): Taken {
	let taken = true;
	let away = false;

	const giveBack = () => {
		if (!taken) return;
		taken = false;
		tryTo(stopDrawing);
		tryTo(() => setRawMode(false));
		// At once: the process may end right after.
		tryTo(() => writeSync(standardOutput, leave));
	};

	const crash = (error: unknown) => {
		// First the normal screen, so that the message stays readable.
		giveBack();
		const stack = error instanceof Error ? error.stack : String(error);
		tryTo(() => process.stderr.write(`droprack: a fault of the program itself. Please report it.\n${stack}\n`));
		tryTo(() => process.stderr.write(lastWords()));
		process.exit(faultStatus);
	};

	const suspend = () => {
		if (!taken || away) return;
		away = true;
		tryTo(() => writeSync(standardOutput, leave));
		setRawMode(false);
		// Without a listener the signal does what it does to every program.
		process.off('SIGTSTP', suspend);
		process.kill(process.pid, 'SIGTSTP');
		setTimeout(() => {
			if (away) goOn();
		}, stopWithinMs);
	};

	/** Also where somebody else stopped us, who may have used the terminal since. */
	const goOn = () => {
		if (!taken) return;
		if (away) process.on('SIGTSTP', suspend);
		away = false;
		setRawMode(true);
		tryTo(() => writeSync(standardOutput, enter));
		comeBack();
	};

	process.on('exit', giveBack);
	process.on('SIGTSTP', suspend);
	process.on('SIGCONT', goOn);
	for (const [name, number] of Object.entries(signals)) {
		process.on(name, () => {
			giveBack();
			process.exit(signalStatus + number);
		});
	}
	process.removeAllListeners('uncaughtException');
	process.on('uncaughtException', crash);
	process.on('unhandledRejection', crash);

	// Only now: a signal finds somebody who gives back.
	writeSync(standardOutput, enter);
	// Before anything listens to keys: what is typed meanwhile must not be echoed.
	setRawMode(true);
	return {giveBack, crash, suspend};
}

function setRawMode(raw: boolean): void {
	if (process.stdin.isTTY) process.stdin.setRawMode(raw);
}

/** The terminal may be gone: then there is nothing to give back. */
function tryTo(act: () => void): void {
	try {
		act();
	} catch {}
}
