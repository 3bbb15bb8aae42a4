/** Keys pressed in a session that runs, in memory: whatever they are, there is a frame of the window's size. */

import type {JsonObject} from '../../../source/documents/json.ts';
import type {Keeper} from '../../../source/screens/keeper.ts';
import {bindingsOf} from '../../../source/screens/keys/key-table.ts';
import {painted} from '../../../source/screens/parts/theme.ts';
import type {Documents} from '../../../source/screens/session/documents.ts';
import {LiveSession} from '../../../source/screens/session/live.ts';
import {startSession} from '../../../source/screens/session/session.ts';
import {KeyDecoder} from '../../../source/screens/terminal/key-decoder.ts';
import {frameLines, frameOf} from '../../../source/screens/views/frame.ts';
import {displayWidth} from '../../../source/text/width.ts';
import {completeCar, completeTrack} from '../../documents/complete.ts';
import {errandsInMemory} from '../../screens/errands.ts';
import {catalog, documents, fixture} from '../../screens/session/documents.ts';
import {inJson} from '../mutate-json.ts';
import type {Answer, Reader} from '../reader.ts';
import {cars, tracks} from './documents.ts';
// What the session loads when it is first needed: loaded here, so that no load outlives a text.
import '../../../source/screens/session/ahead.ts';
import '../../../source/screens/session/handing.ts';
import '../../../source/screens/session/incoming.ts';
import '../../../source/screens/session/odds-work.ts';
import '../../../source/screens/session/teaching.ts';

const [down, up, right, left, esc] = ['\x1B[B', '\x1B[A', '\x1B[C', '\x1B[D', '\x1B\n'];
const sizes = [
	{width: 80, height: 24},
	{width: 140, height: 45},
	{width: 20, height: 5},
] as const;

/** Nobody waits between two keys until odds have drawn their last. */
const mostSlices = 30;

function started(opened: Documents): {live: LiveSession; settle: () => void} {
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
	let ticks = 0;
	const clock = {
		// Every look at it takes a millisecond: what works in slices rests.
		now: () => ticks++,
		later: (act: () => void) => {
			waiting.push(act);
			return () => void waiting.splice(waiting.indexOf(act), 1);
		},
	};
	const outside = {leave() {}, suspend() {}, redraw() {}};
	const live = new LiveSession(startSession(opened, 'us'), catalog, keeper, outside, clock);
	return {
		live,
		settle: () => {
			for (let slices = 0; waiting.length > 0 && slices < mostSlices; slices++) waiting.shift()!();
		},
	};
}

/** What is shown after each of the keys, or how a frame of it is not of the window's size. */
async function pressed(opened: Documents, keys: string): Promise<Answer> {
	const {live, settle} = started(opened);
	settle();
	const decoder = new KeyDecoder();
	let said = '';
	// A line end stands for a moment in which nothing comes, after which Esc is the key.
	const events = keys.split('\n').flatMap(part => [...decoder.push(part), ...decoder.flush()]);
	for (const event of events) {
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
	work: {start: 60_000_000, perCharacter: 0},
	read: text => pressed(documents, text),
};

/** Every key of one character that works everywhere: it leads to a place, or does something in one. */
const everywhere = bindingsOf('everywhere').flatMap(({keys}) => keys.filter(key => key.length === 1));
/** To every place and along what is there, and through the form. */
const tour = [
	...everywhere.map(key => `${key}${down}${right}\r${down}${esc}${esc}`),
	`e\t${down}${down}5${esc}\t\t${down}\t\t\t\t${esc}ee\t\t${down}${esc}${esc}`,
].join('');

/** Documents as the store hands them over: with a name, and otherwise as anybody has left them. */
async function readDocuments(text: string): Promise<Answer> {
	const {track, car} = partsOf(text) ?? {};
	if (typeof track?.name !== 'string' || typeof car?.name !== 'string') return {accepted: false};
	const open = {
		'track:oval': {...documents.open['track:oval']!, json: track, saved: track, shipped: undefined},
		'car:car': {...documents.open['car:car']!, json: car, saved: car, shipped: undefined},
	};
	return pressed({...documents, open}, tour);
}

function partsOf(text: string): {track?: JsonObject; car?: JsonObject} | undefined {
	try {
		const parts = JSON.parse(text);
		return typeof parts === 'object' && parts !== null ? parts : undefined;
	} catch {
		return undefined;
	}
}

export const openedDocuments: Reader = {
	name: 'opened',
	examples: () => [
		JSON.stringify({track: completeTrack(), car: completeCar()}),
		JSON.stringify({track: fixture('oval'), car: fixture('car')}),
	],
	words: [...tracks.words, ...cars.words],
	mutators: [inJson, inJson, inJson],
	longest: 12_000,
	work: {start: 250_000_000, perCharacter: 0},
	read: readDocuments,
};
