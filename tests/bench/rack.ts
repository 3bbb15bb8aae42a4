/** A whole rack, ranked and run plainly, and what ten times of each kind costs. */
import {runStraight, runStraightPlainly} from '../../source/drivetrain/run-straight.ts';
import type {StraightRun} from '../../source/drivetrain/straight.ts';
import {type Candidate, candidatesOf} from '../../source/planning/candidates.ts';
import type {Condition, Place} from '../../source/planning/conditions.ts';
import {type Plan, planFor} from '../../source/planning/plan.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
import type {Ranking} from '../../source/planning/results.ts';
import type {BudgetName, Figures} from './budgets.ts';
import {type Documents, readDocuments, type Size} from './documents.ts';
import {assertClose, line, timedInTurns, told} from './harness.ts';

const wholeRack: Size = {pairs: 76, straights: 12, situations: 4};

/** What the fast way promises, for each straight and each row. */
const agreement = 1e-9;

export async function benchRack(figures: Figures, seed: number): Promise<void> {
	const documents = await readDocuments(wholeRack, seed);
	const plan = planOf(documents);
	line(`Whole rack: 76 pairs × 2 sets × 12 straights on 3 grades × 4 situations = ${straightsOf(plan)} straights`);
	line(`  ${agreeing(rankingOf(documents), plan)}`);
	const {rank, solver, plain} = timedInTurns(
		{
			rank: () => rankedTotal(documents),
			solver: () => total(plan, shared),
			plain: () => total(plan, plainly),
		},
		7,
	);
	line(`  rank, from parsed documents to ordered rows with verdicts: ${told(rank)}`);
	line(`  solver alone, the same straights: ${told(solver)}`);
	line(`  plain loop, the same straights: ${told(plain)}`);
	const ratio = rank.minMs / plain.minMs;
	figures.hold('rank', ratio);
	line(
		`  that is ${(0.25 / ratio).toFixed(1)} × below the budget; solver alone ÷ plain ${(solver.minMs / plain.minMs).toFixed(4)}`,
	);
	line(
		`  the solver is ${Math.round((100 * solver.minMs) / rank.minMs)} % of a ranking; the rest is results, checks, order and reasons`,
	);
}

export async function benchGrowth(figures: Figures, seed: number): Promise<void> {
	const base: Size = {pairs: 12, straights: 12, situations: 4};
	const kinds = ['pairs', 'straights', 'situations'] as const satisfies BudgetName[];
	const sizes = {base, ...Object.fromEntries(kinds.map(kind => [kind, {...base, [kind]: 10 * base[kind]}]))} as Record<
		'base' | (typeof kinds)[number],
		Size
	>;
	const works = await Promise.all(
		Object.entries(sizes).map(async ([name, size]) => {
			const documents = await readDocuments(size, seed);
			return [name, () => rankedTotal(documents)] as const;
		}),
	);
	const timings = timedInTurns(Object.fromEntries(works) as Record<keyof typeof sizes, () => number>, 15);
	line('Growth of a ranking: pairs, straights, situations; time; ratio; exponent');
	for (const name of ['base', ...kinds] as const) {
		const {pairs, straights, situations} = sizes[name];
		const ratio = timings[name].minMs / timings.base.minMs;
		const size = [pairs, straights, situations].map(count => String(count).padStart(4)).join(' ');
		const growth = name === 'base' ? '' : `  × ${ratio.toFixed(1)}  exponent ${Math.log10(ratio).toFixed(2)}`;
		line(`  ${size}  ${told(timings[name])}${growth}`);
	}
	for (const kind of kinds) figures.hold(kind, timings[kind].minMs / timings.base.minMs);
}

function planOf({car, track}: Documents): Plan {
	const plan = planFor(car, track);
	if (!plan.ok) throw new Error(JSON.stringify(plan.faults));
	return plan.value;
}

function rankingOf({car, track}: Documents): Ranking {
	const ranking = rankRack(car, track);
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	return ranking.value;
}

const rankedTotal = (documents: Documents) =>
	rankingOf(documents).rows.reduce((sum, {fastestS}) => sum + (fastestS ?? 0), 0);

const straightsOf = (plan: Plan) =>
	candidatesOf(plan.car).length * plan.conditions.reduce((sum, {places}) => sum + places.length, 0);

/** The runs of one candidate. */
type Runner = (plan: Plan, candidate: Candidate) => (condition: Condition, place: Place) => StraightRun;

const courseOf = ({train}: Candidate, {courses}: Place) => courses.get(train.overall.length)!;

const plainly: Runner = (_, candidate) => (condition, place) =>
	runStraightPlainly(condition.vehicle, candidate.train, courseOf(candidate, place));

/** Straights on one kind of road share their gears, as in a ranking. */
const shared: Runner = (plan, candidate) => {
	const gearsOn = plan.roads.gearsFor(candidate.train);
	return (_, place) => runStraight(gearsOn(place.road), courseOf(candidate, place));
};

function total(plan: Plan, runner: Runner): number {
	let sum = 0;
	for (const candidate of candidatesOf(plan.car)) {
		const runOne = runner(plan, candidate);
		for (const condition of plan.conditions) {
			for (const place of condition.places) {
				const run = runOne(condition, place);
				if (run.kind === 'ran') sum += run.fastest.timeS;
			}
		}
	}
	return sum;
}

/** Compares every straight and every row with the plain loop, and says what was compared. */
function agreeing({rows}: Ranking, plan: Plan): string {
	let timed = 0;
	for (const candidate of candidatesOf(plan.car)) {
		const name = `${candidate.pairName} ${candidate.gearbox.name}`;
		const row = rows.find(({pair, gearbox}) => `${pair} ${gearbox}` === name)!;
		const runOne = plainly(plan, candidate);
		let meanS: number | null = 0;
		plan.conditions.forEach((condition, i) => {
			condition.places.forEach((place, k) => {
				const run = runOne(condition, place);
				const result = row.situations[i]!.straights[k]!;
				const where = `${name}, ${condition.name}, ${place.name}`;
				if ((run.kind === 'ran') !== (result.fastestS !== null))
					throw new Error(`${where}: plain says ${run.kind}, the row ${result.fastestS}`);
				if (run.kind !== 'ran') meanS = null;
				else {
					assertClose(where, result.fastestS!, run.fastest.timeS, agreement);
					assertClose(where, result.timeS!, run.chosen.timeS, agreement);
					if (meanS !== null) meanS += condition.weight * run.fastest.timeS;
				}
			});
		});
		if (meanS === null && row.fastestS !== null)
			throw new Error(`${name}: a straight does not run, yet the row has a time`);
		if (meanS === null) continue;
		assertClose(name, row.fastestS ?? Number.NaN, meanS, agreement);
		timed++;
	}
	const verdicts = ['pass', 'near', 'fail'].map(one => `${rows.filter(({verdict}) => verdict === one).length} ${one}`);
	return `${rows.length} rows (${verdicts.join(', ')}), ${timed} with a time: all times agree with the plain loop to ${agreement}`;
}
