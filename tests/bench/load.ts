/** A load list for twenty tracks and eighty pairs: what the choice costs beside the rankings that it stands on. */
import {readCar, readTrack} from '../../source/documents/read.ts';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {loadList} from '../../source/loading/load-list.ts';
import {type RankedTrack, rankedTrack} from '../../source/loading/load-needs.ts';
import {defaultStepRatio, type LoadList, type LoadOptions} from '../../source/loading/load-results.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Figures} from './budgets.ts';
import {carDocument, everyPair, spread} from './documents.ts';
import {line, seeded, timedInTurns, told} from './harness.ts';

const trackCount = 20;
const pairCount = 80;

const options: LoadOptions = {
	shorter: 1,
	taller: 1,
	withinS: undefined,
	stepRatio: defaultStepRatio,
	gearbox: undefined,
	eachSet: false,
};

export async function benchLoad(figures: Figures, seed: number): Promise<void> {
	const {car, tracks} = await readSeason(seed);
	const rankings = rankAll(car, tracks);
	const list = loadList(car, rankings, options);
	line(
		`Load list: ${trackCount} ovals × ${pairCount} pairs × ${car.gearboxes.length} sets: ${list.pairs.length} pairs`,
	);
	const {rank, choose} = timedInTurns(
		{rank: () => rankAll(car, tracks).length, choose: () => carried(loadList(car, rankings, options))},
		7,
	);
	line(`  ranking every track: ${told(rank)}`);
	line(`  the choice alone: ${told(choose)}`);
	figures.hold('load', (rank.minMs + choose.minMs) / rank.minMs);
}

const carried = ({pairs}: LoadList) => pairs.length;

async function readSeason(seed: number): Promise<{car: Car; tracks: readonly Track[]}> {
	const car = await readCar(JSON.stringify(carDocument(spread(everyPair(), pairCount))));
	if (!car.ok) throw new Error(JSON.stringify(car.problems));
	const random = seeded(seed);
	const tracks: Track[] = [];
	for (let i = 0; i < trackCount; i++) {
		const track = await readTrack(JSON.stringify(ovalDocument(i, random)));
		if (!track.ok) throw new Error(JSON.stringify(track.problems));
		tracks.push(track.value);
	}
	return {car: car.value, tracks};
}

/** Few gears set the tracks apart: with all of them many pairs are level. */
const allowedGears = [[4], [3, 4], [4, 5], [5]];

/** Two straights and the situations of a race weekend, from a short oval to one with long straights. */
function ovalDocument(i: number, random: () => number) {
	const between = (low: number, high: number) => low + (high - low) * random();
	const exitMps = between(34, 58);
	const lengthM = between(180, 420);
	return {
		kind: 'track',
		version: 1,
		name: `Oval ${i + 1}`,
		type: 'road',
		air: {temperature: '24 degC', pressure: '985 hPa', humidity: '45 %'},
		gears: allowedGears[i % allowedGears.length],
		pitRoad: {limit: '45 mph', tolerance: '5 mph'},
		restart: {speed: '55 mph', distance: '700 ft'},
		straights: ['Front', 'Back'].map(name => ({
			name,
			exit: `${exitMps * between(0.98, 1.02)} m/s`,
			length: `${lengthM * between(0.9, 1.1)} m`,
		})),
		situations: [
			{name: 'Qualifying', exit: '+1 m/s', share: 0.5},
			{name: 'In the tow', drag: '-12 %'},
			{name: 'Long run', exit: '-1.5 m/s', rollout: '-0.5 cm'},
		],
	};
}

function rankAll(car: Car, tracks: readonly Track[]): RankedTrack[] {
	return tracks.map(track => {
		const ranking = rankRack(car, track);
		if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
		return rankedTrack(track.name, track, ranking.value);
	});
}
