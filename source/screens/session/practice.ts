/** What was seen in practice: numbers typed straight by straight, or a log. */
import type {LoggedRun} from '../../logs/logged-run.ts';
import type {Findings} from '../../practice/find/findings.ts';
import type {RatioPicture} from '../../practice/learn/pictures.ts';
import type {Held} from '../../practice/learn/seen.ts';

export type PracticeLog = {
	/** What messages call the file. */
	readonly label: string;
	readonly run: LoggedRun;
	readonly findings: Findings;
	readonly ratio: RatioPicture;
	/** What reading it had to say. */
	readonly remarks: readonly string[];
};

export type Practice = {
	/** Id of the track's document. */
	readonly track: string;
	/** As typed behind the name of the straight: "8420 gear 4 185 mph". */
	readonly seen: readonly {readonly straight: string; readonly text: string}[];
	readonly held: Held;
	/** Whether grip is learned from a log too. */
	readonly grip: boolean;
	/** In place of the numbers, where one was read. */
	readonly log: PracticeLog | undefined;
};

/** What is looked at: the numbers with the model beside them, what would change, what the log shows, its two pictures. */
export const panes = ['numbers', 'changes', 'log', 'gears', 'lap'] as const;
export type Pane = (typeof panes)[number];
