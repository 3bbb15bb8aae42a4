/** Medians with spread over the good passes of each straight. */
import type {Track} from '../../drivetrain/track.ts';
import {median, robustSd} from '../fit/robust.ts';
import type {Pass, Spread, StraightFinding} from './findings.ts';

const fewestForSd = 3;

/** Undefined of nothing; what is not a number does not count. */
export function spreadOf(values: readonly (number | undefined)[]): Spread | undefined {
	const read = values.filter((value): value is number => value !== undefined && Number.isFinite(value));
	if (read.length === 0) return undefined;
	const middle = median(read);
	return {median: middle, sd: read.length < fewestForSd ? undefined : robustSd(read, middle), count: read.length};
}

export function straightFindings(track: Track, passes: readonly Pass[]): StraightFinding[] {
	return track.straights.map(({name}, index) => {
		const good = passes.filter(pass => pass.good && pass.straight === index);
		const over = (of: (pass: Pass) => number | undefined) => spreadOf(good.map(of));
		return {
			index,
			name,
			passes: good.length,
			exitMps: over(pass => pass.exitMps),
			minimumMps: over(pass => pass.minimumMps),
			endMps: over(pass => pass.endMps),
			endRpm: over(pass => pass.endRpm),
			highestMps: highest(good.map(pass => pass.highestMps)),
			highestRpm: highest(good.map(pass => pass.highestRpm)),
			exitGear: mostFrequent(good.map(pass => pass.exitGear)),
			endGear: mostFrequent(good.map(pass => pass.endGear)),
			timeS: over(pass => pass.timeS),
			lengthM: over(pass => pass.lengthM),
			limiterM: over(pass => pass.limiterM),
			spinShare: good.length === 0 ? undefined : good.filter(pass => pass.spinS > 0).length / good.length,
		};
	});
}

function highest(values: readonly (number | undefined)[]): number | undefined {
	const read = values.filter(value => value !== undefined);
	return read.length === 0 ? undefined : Math.max(...read);
}

function mostFrequent(gears: readonly (number | undefined)[]): number | undefined {
	const counts = new Map<number, number>();
	for (const gear of gears) if (gear !== undefined) counts.set(gear, (counts.get(gear) ?? 0) + 1);
	return [...counts].sort(([, many], [, few]) => few - many)[0]?.[0];
}
