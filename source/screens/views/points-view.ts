/** RPM at every point of the track: in the gear that is used there, and in the gears below and above it. */

import type {RpmPoint, Setting} from '../../planning/results.ts';
import {type Block, cell, type Making, tableOf} from '../../text/blocks.ts';
import {absent, rpm, rpmUp, signed, type Units} from '../../text/units.ts';

type Compared = {readonly point: RpmPoint; readonly other: RpmPoint | undefined};

const inGear = (point: RpmPoint, gear: number | null): number | null =>
	gear === null ? null : (point.rpm[gear - 1] ?? null);

/** In words first: above the limit, in the band, below it. */
function standing(value: number | null, {rpmLimit, bandLowRpm}: Setting) {
	if (value === null) return cell('');
	if (value > rpmLimit) return cell('over limit', 'fail');
	return value < bandLowRpm ? cell('below band', 'muted') : cell('in band');
}

/** `others` are the same points of the row that is compared with. */
export function pointsView(
	points: readonly RpmPoint[],
	others: readonly RpmPoint[] | undefined,
	setting: Setting,
	units: Units,
): Block {
	const same = (point: RpmPoint) => others?.find(({at, situation}) => at === point.at && situation === point.situation);
	const used = ({point}: Compared) => inGear(point, point.gear);
	const beside =
		(by: number) =>
		({point}: Compared) =>
			cell(rpm(point.gear === null ? null : inGear(point, point.gear + by)), 'muted');
	const columns: Making<Compared>[] = [
		{head: 'at', align: 'left', keep: 0, shortest: 12, cell: ({point}) => cell(point.at)},
		{head: 'situation', align: 'left', keep: 6, shortest: 8, cell: ({point}) => cell(point.situation, 'muted')},
		{
			head: units.label('speed'),
			align: 'right',
			keep: 3,
			cell: ({point}) => cell(units.number('speed', point.speedMps)),
		},
		{head: 'gear', align: 'right', keep: 0, cell: ({point}) => cell(point.gear === null ? absent : String(point.gear))},
		{head: 'rpm', align: 'right', keep: 0, cell: one => cell(rpmUp(used(one)), 'strong')},
		...(others === undefined
			? []
			: [
					{
						head: '±',
						align: 'right',
						keep: 1,
						cell: (one: Compared) => cell(differenceAt(one)),
					} satisfies Making<Compared>,
				]),
		{head: 'stands', align: 'left', keep: 2, cell: one => standing(used(one), setting)},
		{head: 'gear below', align: 'right', keep: 5, cell: beside(-1)},
		{head: 'gear above', align: 'right', keep: 4, cell: beside(1)},
	];
	return tableOf(
		columns,
		points.map(point => ({point, other: same(point)})),
	);
}

function differenceAt({point, other}: Compared): string {
	const [mine, its] = [inGear(point, point.gear), other && inGear(other, other.gear)];
	return signed(mine === null || its == null ? null : mine - its, 0);
}
