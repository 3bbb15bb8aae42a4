/** What would be missed first if a pair stayed at home. */
import type {Row} from '../planning/results.ts';
import type {ServedNeed} from './load-needs.ts';
import type {Role, Without} from './load-results.ts';

/**
 * The worst over the tracks that the pair is for. A track without any pair that passes comes before one that is slower by
 * more than `withinS`, the slowest first; then a track without a step, one whose next step is further away, the furthest first,
 * and one that hardly gets slower.
 */
export function withoutPair(
	pair: string,
	carried: readonly string[],
	needs: readonly ServedNeed[],
	roles: readonly Role[],
	withinS: number,
): Without | null {
	const left = carried.filter(other => other !== pair);
	const losses = roles.flatMap(role => {
		const need = needs.find(({track, way}) => track.name === role.track && way.row.gearbox === role.gearbox);
		if (need === undefined) return [];
		return role.role === 'best' ? bestLoss(need, left) : [stepLoss(need, role.role, pair, left)];
	});
	return losses.reduce<Without | null>(
		(worst, loss) => (worst === null || isWorse(loss, worst, withinS) ? loss : worst),
		null,
	);
}

const severity: Record<Without['kind'], number> = {nothing: 4, slower: 3, nearest: 3, noStep: 2, further: 1};

const severityOf = (loss: Without, withinS: number): number =>
	loss.kind === 'slower' && loss.lossS <= withinS ? 0 : severity[loss.kind];

function isWorse(one: Without, other: Without, withinS: number): boolean {
	const by = severityOf(one, withinS) - severityOf(other, withinS);
	if (by !== 0) return by > 0;
	if (one.kind === 'slower' && other.kind === 'slower') return one.lossS > other.lossS;
	return one.kind === 'further' && other.kind === 'further' && one.rpm > other.rpm;
}

function bestLoss({track, usable, way}: ServedNeed, left: readonly string[]): Without[] {
	const next = usable.find(row => left.includes(row.pair) && (way.row.verdict === 'fail' || row.verdict !== 'fail'));
	if (next === undefined) return [{kind: 'nothing', track: track.name}];
	if (next.fastestS === null || way.row.fastestS === null) return [nearestTo(way.row, track.name, usable, left)];
	const lossS = Math.max(0, next.fastestS - way.row.fastestS);
	return [{kind: 'slower', track: track.name, pair: next.pair, gearbox: next.gearbox, lossS}];
}

function nearestTo(own: Row, track: string, usable: readonly Row[], left: readonly string[]): Without {
	const away = (row: Row) => Math.abs(row.pairRatio - own.pairRatio);
	const others = usable.filter(row => row.gearbox === own.gearbox && left.includes(row.pair));
	if (others.length === 0) return {kind: 'nothing', track};
	const nearest = others.reduce((best, row) => (away(row) < away(best) ? row : best));
	return {kind: 'nearest', track, pair: nearest.pair, rpm: (highestRpm(own) * away(nearest)) / own.pairRatio};
}

function stepLoss(
	{track, usable, way}: ServedNeed,
	role: 'shorter' | 'taller',
	pair: string,
	left: readonly string[],
): Without {
	const side = role === 'shorter' ? 1 : -1;
	const sameSet = usable.filter(({gearbox}) => gearbox === way.row.gearbox);
	const own = sameSet.find(row => row.pair === pair)!;
	const beyond = sameSet.filter(row => left.includes(row.pair) && side * (row.pairRatio - own.pairRatio) >= 0);
	if (beyond.length === 0) {
		const short = sameSet.filter(row => left.includes(row.pair) && side * (row.pairRatio - own.pairRatio) < 0);
		const last = short.reduce(
			(furthest, row) => (side * (row.pairRatio - furthest.pairRatio) > 0 ? row : furthest),
			way.row,
		);
		return {kind: 'noStep', track: track.name, role, than: last.pair};
	}
	const next = beyond.reduce((nearest, row) => (side * (row.pairRatio - nearest.pairRatio) < 0 ? row : nearest));
	const rpm = (highestRpm(way.row) * Math.abs(next.pairRatio - own.pairRatio)) / way.row.pairRatio;
	return {kind: 'further', track: track.name, role, pair: next.pair, rpm};
}

/** The highest RPM of a row; RPM goes with the pair ratio. */
function highestRpm(row: Row): number {
	return row.checks.find(({check}) => check === 'limit')?.value ?? Number.NaN;
}
