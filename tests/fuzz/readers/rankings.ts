/** A track and a car together: what is accepted ranks, or says what stands in the way, in numbers that are numbers. */
import {readCar, readTrack} from '../../../source/documents/read.ts';
import {visible} from '../../../source/documents/visible.ts';
import type {Car} from '../../../source/drivetrain/car.ts';
import type {Track} from '../../../source/drivetrain/track.ts';
import {rankRack} from '../../../source/planning/rank-rack.ts';
import {headingOf} from '../../../source/text/heading-view.ts';
import {layOut} from '../../../source/text/layout.ts';
import {paint} from '../../../source/text/paint.ts';
import {rankView} from '../../../source/text/rank-view.ts';
import {unitsOf} from '../../../source/text/units.ts';
import {nudged} from '../mutate.ts';
import {inJson} from '../mutate-json.ts';
import type {Answer, Reader} from '../reader.ts';
import {cars, fixtureText, tracks} from './documents.ts';

/** A larger ranking takes its time, rightly. */
const mostRuns = 300;

const runsIn = (track: Track, car: Car): number =>
	track.straights.length *
	(track.situations.length + 1) *
	car.rack.pairs.length *
	car.gearboxes.reduce((sum, {ratios}) => sum + ratios.length, 0);

async function read(text: string): Promise<Answer> {
	const {track: trackPart, car: carPart} = partsOf(text) ?? {};
	if (trackPart === undefined || carPart === undefined) return {accepted: false};
	const [track, car] = [await readTrack(JSON.stringify(trackPart)), await readCar(JSON.stringify(carPart))];
	if (!track.ok || !car.ok || runsIn(track.value, car.value) > mostRuns) return {accepted: false};
	const ranking = rankRack(car.value, track.value);
	if (!ranking.ok) {
		const {faults} = ranking;
		return {
			accepted: false,
			said: faults.map(({path, found, allowed}) => visible(path + found + allowed)).join('\n'),
			problems: faults,
		};
	}
	const wrong = numberless(ranking.value, []);
	const view = rankView(
		{heading: headingOf(car.value, track.value, new Date(0)), ranking: ranking.value, top: 20},
		unitsOf('us'),
	);
	const said = paint(layOut(view, 100), {color: false, ascii: false});
	return {
		accepted: true,
		said,
		broken:
			wrong !== undefined
				? `every number of a ranking is one: ${wrong}`
				: /\bNaN\b|\bundefined\b|Infinity/.test(said) && !/NaN|undefined|Infinity/.test(text)
					? `a ranking is said in words: ${/.*(?:NaN|undefined|Infinity).*/.exec(said)?.[0]}`
					: undefined,
	};
}

/** Where in the answer a number is none. */
function numberless(value: unknown, path: readonly string[]): string | undefined {
	if (typeof value === 'number') return Number.isFinite(value) ? undefined : `${path.join('.')} is ${value}`;
	if (typeof value !== 'object' || value === null) return undefined;
	for (const [key, inner] of Object.entries(value)) {
		const found = numberless(inner, [...path, key]);
		if (found !== undefined) return found;
	}
	return undefined;
}

function partsOf(text: string): {track?: unknown; car?: unknown} | undefined {
	try {
		const parts: unknown = JSON.parse(text);
		return typeof parts === 'object' && parts !== null ? parts : undefined;
	} catch {
		return undefined;
	}
}

/** A tooth less and a straight more change the ranking; a comma less only ends the reading. */
const short = (text: string, keep: (document: {rack?: {pairs: unknown[]}; gearboxes?: unknown[]}) => void): unknown => {
	const document = JSON.parse(text);
	keep(document);
	return document;
};

export const rankings: Reader = {
	name: 'rankings',
	examples: () => [
		JSON.stringify({
			track: short(fixtureText('oval'), () => {}),
			car: short(fixtureText('car'), car => {
				car.rack?.pairs.splice(2);
				car.gearboxes?.splice(1);
				Object.assign(car, {installed: undefined});
			}),
		}),
	],
	words: [...tracks.words, ...cars.words],
	mutators: [nudged, nudged, inJson],
	longest: 12_000,
	work: {start: 4_000_000, perCharacter: 0},
	read,
};
