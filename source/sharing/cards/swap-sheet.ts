import type {Pair, RackPair} from '../../drivetrain/car.ts';
import {isHunting, turnsUntilMeeting} from '../../drivetrain/gear-mesh.ts';
import {flipped, handTurns, pairName, pairRatio, parsePair, samePair} from '../../drivetrain/gear-pair.ts';
import {type CardSource, cardOf, distanceText, downTo, item} from './card.ts';

const wheelTurns = 10;
/** Fewer turns apart are not told apart by hand. */
const clearTurns = 0.5;

const caution =
	"An estimate. The rule book and the track's officials decide; the engine builder's RPM limit rules, and a flipped pair can pass it.";

const cautions = [
	'- Car on stands, wheels chocked, ignition and fuel pump off; never on the jack alone.',
	'- The oil is hot: gloves, eyes covered.',
	'- Rotating parts: hands and sleeves away during the check.',
	'- A second person counts the teeth.',
	'- Before the engine is started: cover tight, oil filled, no tool left inside, everybody clear.',
];

/** For whoever swaps the gears. */
export function swapSheet(source: CardSource): string[] {
	const pair = parsePair(source.row.pair)!;
	const body = [
		'Before and during the swap',
		...cautions,
		'',
		...gearLines(pair, source),
		...checkLines(pair, source),
		...wearLines(pair, source),
		'Swapped by  ______________________  time __________',
		'Counted by  ______________________  time __________',
	];
	return cardOf('SWAP SHEET', source, body, caution);
}

function gearLines(pair: Pair, {row}: CardSource): string[] {
	return [
		item('DRIVING gear, teeth', pair.driving),
		'    on the shaft that the torque comes from',
		item('DRIVEN gear, teeth', pair.driven),
		'    on the shaft to the ring and pinion',
		item('Pair ratio', row.pairRatio.toFixed(4)),
		'Overall ratio',
		...row.overall.map((overall, i) => item(`gear ${i + 1}`, overall.toFixed(3))),
		'',
	];
}

/** Turns of the shaft ahead of gearbox and drop pair for ten turns of both wheels, in the gear that is easiest to turn. */
function checkLines(pair: Pair, source: CardSource): string[] {
	const {row, car} = source;
	const gear = row.overall.length;
	const turnsWith = (other: Pair) =>
		handTurns((row.overall[gear - 1]! * pairRatio(other)) / pairRatio(pair), wheelTurns, wheelTurns);
	const nearest = nearestPair(pair, car.rack.pairs);
	const lines = [
		`Hand-turn check in gear ${gear}, clutch out of engagement, rear wheels off the ground: turn both rear wheels ${wheelTurns} times and count the turns of the shaft ahead of gearbox and drop pair`,
		item(`expected, ${row.pair}`, turnsWith(pair).toFixed(1)),
		item(`flipped, ${pairName(flipped(pair))}`, turnsWith(flipped(pair)).toFixed(1)),
		...(nearest ? [item(`nearest on the rack, ${pairName(nearest)}`, turnsWith(nearest).toFixed(1))] : []),
		`  One wheel standing still gives half: ${(turnsWith(pair) / 2).toFixed(1)}. Wheels turning opposite ways: stop, lock them together.`,
	];
	const isClose = nearest && Math.abs(turnsWith(nearest) - turnsWith(pair)) < clearTurns;
	if (isClose) lines.push('  Nearest pair too close to tell by turning: count the teeth.');
	return [...lines, ...flippedPitLines(pair, source), ''];
}

/** RPM go with the overall ratio, so a flipped pair changes them by the square of its ratio. */
function flippedPitLines(pair: Pair, {row: {pitRoad}}: CardSource): string[] {
	if (pitRoad === null) return [];
	const rpm = (pitRoad.rpm * pairRatio(flipped(pair))) / pairRatio(pair);
	return [
		`Pit-road RPM in gear ${pitRoad.gear} at the limit`,
		item('as planned', downTo(1, pitRoad.rpm)),
		item('if the pair were flipped', downTo(1, rpm)),
	];
}

/** The other pair on the rack whose ratio is closest. */
function nearestPair(pair: Pair, rack: readonly RackPair[]): Pair | undefined {
	const distance = (other: Pair) => Math.abs(pairRatio(other) - pairRatio(pair));
	return rack
		.filter(other => !samePair(other, pair) && !samePair(other, flipped(pair)))
		.reduce<Pair | undefined>(
			(best, other) => (best === undefined || distance(other) < distance(best) ? other : best),
			undefined,
		);
}

function wearLines(pair: Pair, {car, units}: CardSource): string[] {
	const {driving, driven} = pair;
	const onRack =
		car.rack.pairs.find(other => samePair(other, pair)) ?? car.rack.pairs.find(other => samePair(other, flipped(pair)));
	const turns = turnsUntilMeeting(driving, driven);
	const hunting = isHunting(driving, driven)
		? 'yes: every tooth meets every other'
		: `no: the same teeth meet every ${turns} turns of the driving gear, so mount them in the mesh they ran in`;
	const most = onRack?.maxMilesM === undefined ? 'no limit given' : `of ${distanceText(onRack.maxMilesM, units)}`;
	return [
		`Hunting tooth: ${hunting}`,
		...(onRack ? [`Mileage: ${distanceText(onRack.milesM, units)}, ${most}; sets on hand: ${onRack.sets}`] : []),
		'',
	];
}
