/** A second copy of the program for the tests of the store: does what its words say and prints what came of it. */
import {writeSync} from 'node:fs';
import {addToHistory} from '../../source/store/history.ts';
import {keptNamed} from '../../source/store/list-kept.ts';
import {withLock} from '../../source/store/lock.ts';
import {saveKept} from '../../source/store/save-kept.ts';
import {keepSession, unsavedSessions} from '../../source/store/session.ts';
import {preset} from './documents.ts';

const [verb, home = '', ...rest] = process.argv.slice(2);
const count = Number(rest[0] ?? 1);
const say = (value: unknown) => writeSync(1, `${JSON.stringify(value)}\n`);

/** Adds one to the number in the notes, as often as others were first. */
const countUp = (name: string): number => {
	for (;;) {
		const present = keptNamed(home, 'preset', name);
		const next = Number(present?.document.notes ?? 0) + 1;
		const answer = saveKept(home, preset(name, {notes: String(next)}), present?.revision);
		// On a slow disk others may have the lock for long.
		if (answer.kind === 'failed' && answer.problem.reason !== 'locked') throw new Error(JSON.stringify(answer.problem));
		if (answer.kind === 'saved') return next;
	}
};

/** A preset whose text shows whether it is whole: the number, a long filling, the number again. */
const longPreset = (number: number) =>
	preset('Long', {notes: `${number} ${'x'.repeat(200_000)} ${number}`, gearbox: String(number)});

const verbs: Record<string, () => void> = {
	/** Saves for ever, and says each number once it is saved. */
	saveOn: () => {
		let revision = keptNamed(home, 'preset', 'Long')?.revision;
		for (let number = count; ; number++) {
			const answer = saveKept(home, longPreset(number), revision);
			if (answer.kind !== 'saved') throw new Error(JSON.stringify(answer));
			revision = answer.kept.revision;
			say(number);
		}
	},
	saveOnce: () => {
		const {kind, ...answer} = saveKept(home, longPreset(count), keptNamed(home, 'preset', 'Long')?.revision);
		say({kind, problem: 'problem' in answer ? answer.problem : undefined});
	},
	countUp: () => {
		for (let i = 0; i < count; i++) countUp('Counter');
	},
	addEntries: () => {
		for (let i = 0; i < count; ) {
			const answer = addToHistory(home, 'Track', [{date: '2026-01-01', remark: `${process.pid} ${i}`}]);
			if (answer.ok) i++;
			else if (answer.problem.reason !== 'locked') throw new Error(JSON.stringify(answer));
		}
	},
	/** Holds the lock until it is killed. */
	hold: () => {
		withLock(home, () => {
			say('held');
			Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 60_000);
		});
	},
	/** Waits for the lock no longer than a moment. */
	tryLock: () => say(withLock(home, () => 'mine', 20)),
	/** The unsaved work that is offered to it. */
	unsaved: () => say(unsavedSessions(home).sessions.map(({document}) => document)),
	keepSession: () => say(keepSession(home, {work: rest[0]}, `2026-01-0${rest[1]}`) ?? 'kept'),
};
verbs[verb ?? '']?.();
