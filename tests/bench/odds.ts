/** The odds of the demo car at its largest track, against a plain loop over rankings of the same rows and draws. */
import {spawnSync} from 'node:child_process';
import {readFileSync} from 'node:fs';
import {readCar, readTrack} from '../../source/documents/read.ts';
import type {Car} from '../../source/drivetrain/car.ts';
import type {Track} from '../../source/drivetrain/track.ts';
import {dayOf} from '../../source/odds/day.ts';
import {worldOfDraw} from '../../source/odds/draws/draw.ts';
import {inputsOf} from '../../source/odds/inputs.ts';
import {oddsSteps} from '../../source/odds/odds-steps.ts';
import {seedUnlessGiven} from '../../source/odds/options.ts';
import type {Odds} from '../../source/odds/results.ts';
import {RowDraws} from '../../source/odds/row-draw.ts';
import {nothingStated} from '../../source/odds/stated.ts';
import {type World, worldOf} from '../../source/odds/world.ts';
import {candidatesOf} from '../../source/planning/candidates.ts';
import {planFor} from '../../source/planning/plan.ts';
import {rankRack, rowName} from '../../source/planning/rank-rack.ts';
import {groundOf} from '../../source/planning/run-rack.ts';
import type {Figures} from './budgets.ts';
import {assertClose, line, timedInTurns, told} from './harness.ts';

const largest = 'hesper-ridge';
const draws = 512;
/** The plain loop is timed on so many of the draws and counted up. */
const plainDraws = 8;
/** Rows that must be left for the measurement to mean anything. */
const leastRows = 8;
/** What the two ways may differ by, relatively: 0.1 ms of a lap of 70 s. */
const agreement = 1.5e-6;

export async function benchOdds(figures: Figures): Promise<void> {
	const {car, track} = await documents();
	const order = orderOf(car, track);
	const {odds, rows} = settled(car, track, order);
	if (rows.length < leastRows) throw new Error(`only ${rows.length} rows that can be first or are open`);
	const worlds = worldsOf(car, track);
	line(
		`Odds at ${largest}: ${rows.length} rows that were first, open or near in the first draws × ${draws} draws × all situations`,
	);
	line(`  ${agreeing(car, track, worlds, rows)}`);
	const timings = timedInTurns(
		{
			odds: () => settled(car, track, order).odds.draws,
			plain: () => worlds.slice(0, plainDraws).reduce((sum, world) => sum + plainly(world, rows), 0),
			first: () => firstAnswer(car, track, order),
			node: () => spawnSync(process.execPath, ['-e', '1']).status ?? 1,
		},
		5,
	);
	// Some sets of a pair may not be among the rows.
	const share = rows.length / rankedRows(worlds[0]!, rows).length;
	const plainMs = (timings.plain.minMs * share * draws) / plainDraws;
	line(`  odds until every such row has all draws: ${told(timings.odds)}`);
	line(
		`  plain loop over rankings of these rows alone, ${plainDraws} draws counted up to ${draws}: ${plainMs.toFixed(0)} ms`,
	);
	line(`  first answer: ${told(timings.first)}; node -e 1: ${told(timings.node)}`);
	const slice = Math.min(longestSliceMs(car, track, order), longestSliceMs(car, track, order));
	line(`  longest slice ${slice.toFixed(1)} ms; ${odds.rows.length} rows in all`);
	figures.hold('odds', timings.odds.minMs / plainMs);
	figures.hold('oddsTime', timings.odds.minMs / timings.node.minMs);
	figures.hold('oddsFirst', timings.first.minMs / timings.node.minMs);
	figures.hold('oddsSlice', slice / timings.node.minMs);
}

async function documents(): Promise<World> {
	const car = await readCar(readFileSync('tracks/cars/demo.json', 'utf8'));
	const track = await readTrack(readFileSync(`tracks/${largest}.json`, 'utf8'));
	if (!car.ok || !track.ok) throw new Error('the demo documents are not read');
	return {car: car.value, track: track.value};
}

function orderOf(car: Car, track: Track): string[] {
	const ranking = rankRack(car, track);
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows.map(rowName);
}

const steps = (car: Car, track: Track, order: readonly string[]) =>
	oddsSteps(car, track, {draws, mostDraws: draws, order});

/** Until every row that matters has been through all draws. */
function settled(car: Car, track: Track, order: readonly string[]): {odds: Odds; rows: string[]} {
	for (const progress of steps(car, track, order)) {
		if (!progress.isSettled) continue;
		const odds = progress.answer()!;
		return {odds, rows: odds.rows.filter(row => row.draws === draws).map(rowName)};
	}
	throw new Error('odds ended before they were settled');
}

function firstAnswer(car: Car, track: Track, order: readonly string[]): number {
	for (const {answer} of steps(car, track, order)) {
		const odds = answer();
		if (odds !== undefined) return odds.draws;
	}
	throw new Error('no answer');
}

/** Between two returns to the caller: what a key would wait. */
function longestSliceMs(car: Car, track: Track, order: readonly string[]): number {
	let [longest, last] = [0, performance.now()];
	for (const {isSettled} of steps(car, track, order)) {
		const now = performance.now();
		longest = Math.max(longest, now - last);
		last = now;
		if (isSettled) break;
	}
	return longest;
}

function worldsOf(car: Car, track: Track): World[] {
	const plan = planFor(car, track);
	if (!plan.ok) throw new Error(JSON.stringify(plan.faults));
	const {anchored} = groundOf(plan.value);
	const {inputs} = inputsOf(plan.value.car, plan.value.track, plan.value.engine, anchored, nothingStated);
	const world = worldOf(car, track);
	return Array.from({length: draws}, (_, draw) => worldOfDraw(world, inputs, draw, seedUnlessGiven));
}

/** The ranking of these rows in a world, with the rest of the rack put away. */
function rankedRows({car, track}: World, rows: readonly string[]) {
	const pairs = car.rack.pairs.filter(({driving, driven}) =>
		rows.some(name => name.startsWith(`${driving}/${driven} `)),
	);
	const installed = {pair: pairs[0]!, gearbox: car.gearboxes[0]!.name};
	const straights = track.straights.map(straight => ({...straight, measured: undefined}));
	const ranking = rankRack({...car, installed, rules: {}, rack: {...car.rack, pairs}}, {...track, straights});
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value.rows;
}

function plainly(world: World, rows: readonly string[]): number {
	return rankedRows(world, rows).reduce((sum, {fastestS}) => sum + (fastestS ?? 0), 0);
}

function agreeing(car: Car, track: Track, worlds: readonly World[], rows: readonly string[]): string {
	const plan = planFor(car, track);
	if (!plan.ok) throw new Error(JSON.stringify(plan.faults));
	const rowDraws = new RowDraws({plan: plan.value, measured: groundOf(plan.value).measured});
	const candidates = candidatesOf(plan.value.car);
	let compared = 0;
	for (const world of worlds.slice(0, plainDraws)) {
		const day = dayOf(plan.value, world);
		const ranked = new Map(rankedRows(world, rows).map(row => [rowName(row), row]));
		for (const name of rows) {
			const candidate = candidates.find(one => `${one.pairName} ${one.gearbox.name}` === name)!;
			const row = ranked.get(name)!;
			if (row.fastestS === null) continue;
			assertClose(`${name} in a draw`, rowDraws.run(day, {candidate}).timeS, row.fastestS, agreement * 10);
			compared++;
		}
	}
	return `${compared} times of rows in draws agree with their rankings to ${agreement * 10}`;
}
