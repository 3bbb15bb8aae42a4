/** Errands in memory: what a test wrote, copied and added. */
import {readLog} from '../../source/logs/read-log.ts';
import type {Errands} from '../../source/screens/errands.ts';
import type {HistoryEntry} from '../../source/store/kept-documents.ts';

export type Done = {
	copied: string[];
	files: Map<string, string>;
	entries: HistoryEntry[];
	forgotten: string[];
	exported: string[];
};

export function errandsInMemory(): {errands: Errands; done: Done} {
	const done: Done = {copied: [], files: new Map(), entries: [], forgotten: [], exported: []};
	const errands: Errands = {
		now: () => '2026-05-31T18:05:00Z',
		today: () => '2026-05-31',
		copy: text => {
			done.copied.push(text);
			return 'sent.';
		},
		write: (file, text, replace) => {
			if (file.startsWith('/full/')) return {ok: false, words: 'the disk is full (ENOSPC).'};
			if (done.files.has(file) && !replace) return 'exists';
			done.files.set(file, text);
			return {ok: true, words: `Written to ${file}.`};
		},
		read: async file => {
			const text = done.files.get(file);
			return text === undefined ? {ok: false, words: `${file}: there is no such file.`} : {ok: true, label: file, text};
		},
		readLog: async (file, _columns, _car, onProgress) => {
			const text = done.files.get(file);
			if (text === undefined) return {ok: false, words: `${file}: there is no such file.`};
			onProgress(0.5);
			const bytes = async function* () {
				yield new TextEncoder().encode(text);
			};
			const reading = await readLog(bytes());
			if (reading.ok) return {ok: true, label: file, reading};
			const {found, choice} = reading.problems[0]!;
			return {ok: false, words: found, ...(choice && {channel: choice.channel})};
		},
		history: () => done.entries,
		addToHistory: (track, entry) => {
			done.entries.push(entry);
			return {ok: true, words: `Added to the history of ${track}.`};
		},
		forget: (kind, name) => {
			done.forgotten.push(`${kind} ${name}`);
			return {ok: true, words: `${name} is forgotten.`};
		},
		exportTo: directory => {
			done.exported.push(directory);
			return {ok: true, words: '2 written.'};
		},
	};
	return {errands, done};
}
