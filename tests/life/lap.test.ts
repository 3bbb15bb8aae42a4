import {describe, expect, test} from 'vitest';
import {lapOf} from '../../source/life/lap.ts';
import {lapParts} from '../../source/life/lap-parts.ts';
import {rankSteps, rowName} from '../../source/planning/rank-rack.ts';
import {finish} from '../../source/planning/run-rack.ts';
import {shippedCar, shippedTrack, trackFiles} from '../tracks/demo.ts';

describe.each(trackFiles)('%s', file => {
	test('the times of every row in every situation add up to the lap, straights and corners', async () => {
		const ranked = finish(rankSteps(await shippedCar('demo.json'), await shippedTrack(file)));
		if (!ranked.ok) throw new Error('not ranked');
		const {ranking, ground, runs} = ranked.value;
		const parts = lapParts(ground.plan.track);
		const straightsAlone = {...parts, cornerM: undefined};
		const rows = ranking.rows.filter(({timeS}) => timeS !== null).filter((_, i) => i % 12 === 0);
		expect(rows.length).toBeGreaterThan(1);
		for (const row of rows) {
			const run = runs.get(rowName(row))!;
			for (const [i, within] of run.situations.entries()) {
				const whole = lapOf(run, within, ground.plan, parts, 8100);
				const told = whole.slices.reduce((sum, {timeS}) => sum + timeS, 0);
				expect(Math.abs(told - whole.timeS)).toBeLessThan(1e-9);
				const straights = lapOf(run, within, ground.plan, straightsAlone, 8100);
				expect(Math.abs(straights.timeS - row.situations[i]!.timeS!)).toBeLessThan(1e-9);
				expect(whole.timeS).toBeGreaterThanOrEqual(straights.timeS);
			}
		}
	});
});
