/** Keys pressed in a session that runs, in memory: whatever they are, there is a frame of the window's size. */
import type {Keeper} from '../../../source/screens/keeper.ts';
import {painted} from '../../../source/screens/parts/theme.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import {startSession} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {frameLines, frameOf} from '../../../source/screens/views/frame.ts';
import {displayWidth} from '../../../source/text/width.ts';
import {errandsInMemory} from '../../screens/errands.ts';
import {catalog, documents} from '../../screens/session/documents.ts';
import type {Answer, Reader} from '../reader.ts';
// What the session loads when it is first needed: loaded here, so that no load outlives a text.
import '../../../source/screens/session/handing.ts';
import '../../../source/screens/session/incoming.ts';

const sizes = [
	{width: 80, height: 24},
	{width: 140, height: 45},
	{width: 20, height: 5},
] as const;

function started(): {live: LiveSession; settle: () => void} {
	const waiting: (() => void)[] = [];
	const keeper: Keeper = {
		keep() {},
		drop() {},
		earlier: undefined,
		dropEarlier() {},
		save: () => ({ok: true, words: 'Saved.'}),
		where: () => undefined,
		errands: errandsInMemory().errands,
	};
	const clock = {
		now: () => 0,
		later: (act: () => void) => {
			waiting.push(act);
			return () => void waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const outside = {leave() {}, suspend() {}, redraw() {}};
	const live = new LiveSession(startSession(documents, 'us'), catalog, keeper, outside, clock);
	return {
		live,
		settle: () => {
			while (waiting.length > 0) waiting.shift()!();
		},
	};
}

async function read(text: string): Promise<Answer> {
	const {live, settle} = started();
	settle();
	const decoder = new KeyDecoder();
	let said = '';
	for (const event of [...decoder.push(text), ...decoder.flush()]) {
		live.press(event);
		settle();
		// What is read or loaded on the way arrives.
		await Promise.resolve();
		for (const size of sizes) {
			const lines = frameLines(frameOf(live.state(), {...size, ascii: false}, 0)).map(pieces =>
				painted(pieces, {color: false, ascii: false}).replace(inverted, ''),
			);
			const tooWide = lines.find(line => displayWidth(line) > size.width);
			if (lines.length !== size.height || tooWide !== undefined) {
				const broken = `a frame has the size of the window: ${size.width} × ${size.height}, ${lines.length} lines, ${tooWide}`;
				return {accepted: true, said, broken};
			}
			said += `${lines.join('\n')}\n`;
		}
	}
	return {accepted: true, said};
}

// biome-ignore lint/suspicious/noControlCharactersInRegex: what makes text bold or inverted
const inverted = /\x1B\[[\d;]*m/g;

const [down, up, right, left, esc] = ['\x1B[B', '\x1B[A', '\x1B[C', '\x1B[D', '\x1B'];

export const screen: Reader = {
	name: 'screen',
	examples: () => [
		'jjk',
		`e\t${down}61\r`,
		`t\r${esc}c?`,
		`g${right}${esc}w`,
		`xjjc${esc}`,
		`a\x1B[200~nothing\x1B[201~${esc}`,
		'snbdh',
	],
	words: [
		down,
		up,
		right,
		left,
		`${esc}`,
		'\r',
		'\t',
		'\x7F',
		'\x1B[Z',
		'\x1B[6~',
		'\x1B[5~',
		'\x1B[H',
		'\x1B[F',
		'\x13',
		'\x12',
		'\x1B[200~',
		'\x1B[201~',
		...'abcdefghijklmnopqrstuvwxyzUGNP?[]/0123456789+-.% ',
	],
	longest: 60,
	work: {start: 20_000_000, perCharacter: 0},
	read,
};
