import {assertClose, budget, line, timed, told} from './harness.ts';
import {countOf, plainly, together, total, workload} from './workload.ts';

/** The whole rack, fast and plain; then what ten times of each kind costs. */
export function benchWholeSolver(seed: number): void {
	const work = workload({pairs: 76, straights: 12, situations: 4}, seed);
	line(`Whole solver: 76 pairs × 2 sets × 12 straights on 3 grades × 4 situations = ${countOf(work)} straights`);
	const plain = [...plainly(work)];
	const kinds = new Map<string, number>();
	[...together(work)].forEach((run, i) => {
		const other = plain[i]!;
		kinds.set(run.kind, (kinds.get(run.kind) ?? 0) + 1);
		if (run.kind !== other.kind) throw new Error(`straight ${i}: fast says ${run.kind}, plain says ${other.kind}`);
		if (run.kind === 'ran' && other.kind === 'ran') {
			assertClose(`straight ${i}`, run.fastest.timeS, other.fastest.timeS, 1e-9);
			assertClose(`straight ${i}`, run.chosen.timeS, other.chosen.timeS, 1e-9);
		}
	});
	line(`  answers agree to 1e-9: ${[...kinds].map(([kind, count]) => `${count} ${kind}`).join(', ')}`);
	const fastTiming = timed(() => total(together(work)), 10);
	const plainTiming = timed(() => total(plainly(work)), 3, 1);
	line(`  fast:  ${told(fastTiming)}`);
	line(`  plain: ${told(plainTiming)}`);
	budget('fast ÷ plain', fastTiming.minMs / plainTiming.minMs, 0.25, '×');
}

export function benchGrowth(seed: number): void {
	const size = {pairs: 12, straights: 12, situations: 4};
	const timeOf = (changed: Partial<typeof size>) => {
		const work = workload({...size, ...changed}, seed);
		return {count: countOf(work), timing: timed(() => total(together(work)), 5)};
	};
	const base = timeOf({});
	line(`Growth of cost, from 12 pairs, 12 straights, 4 situations (${base.count} straights): ${told(base.timing)}`);
	for (const [name, changed] of [
		['pairs × 10', {pairs: 120}],
		['straights × 10', {straights: 120}],
		['situations × 10', {situations: 40}],
	] as const) {
		const {timing} = timeOf(changed);
		line(`  ${name.padEnd(15)} ${told(timing)}: × ${(timing.minMs / base.timing.minMs).toFixed(1)}`);
	}
}
