/** What several fields of a track must be together. Each rule looks only at what could be read. */
import {listRule, type Report, reportRepeated, rule} from './fields.ts';
import {shortened, shown} from './problem.ts';

/** The name of the situation that is the track as it stands. */
export const baseName = 'Base';

export const gearListRules = () =>
	listRule<unknown>((gears, report) => {
		const first = gears[0];
		const isRun = gears.every((gear, i) => typeof gear !== 'number' || typeof first !== 'number' || gear === first + i);
		if (!isRun)
			report([], 'gears in rising order without gaps, like [3, 4, 5]', {
				found: shortened(`[${gears.map(shown).join(', ')}]`),
			});
	});

type StraightValues = {length?: unknown; end?: unknown; entry?: unknown; braking?: unknown};

export const straightRules = () =>
	rule<StraightValues>(({length, end, entry, braking}, report) => {
		if (entry !== undefined && braking === undefined)
			report(['braking'], 'a deceleration like "0.9 g", beside "entry"');
		if (braking !== undefined && entry === undefined) report(['entry'], 'a speed like "92 mph", beside "braking"');
		if (end !== undefined && length !== undefined) {
			const hint = 'With a length the speed at the end is calculated; what was seen goes into "measured".';
			report(['end'], 'an end speed only without "length"', {hint});
		}
	});

export const situationRules = () =>
	rule<{name?: unknown}>((situation, report) => {
		if (situation.name !== baseName) return;
		for (const [field, value] of Object.entries(situation)) {
			if (field === 'name' || field === 'share' || value === undefined) continue;
			report([field], `only "share" in the situation "${baseName}", which is the track as it stands`);
		}
	});

type Air = {altimeter?: unknown; elevation?: unknown};
type Situation = {
	share?: unknown;
	name?: unknown;
	air?: Air | undefined;
	wind?: {speed?: unknown; from?: unknown} | undefined;
};
type Situations = readonly Situation[];
type TrackValues = {
	air?: Air | undefined;
	wind?: unknown;
	straights?: readonly unknown[] | undefined;
	situations?: Situations | undefined;
};

export const trackRules = () =>
	rule<TrackValues>((track, report) => {
		const straights = listOf(track.straights);
		const situations = listOf(track.situations);
		reportRepeated(
			straights,
			({name}: {name?: unknown}) => name,
			index => ['straights', index, 'name'],
			report,
		);
		reportRepeated(
			situations,
			({name}: {name?: unknown}) => name,
			index => ['situations', index, 'name'],
			report,
		);
		reportElevations(track.air, situations, report);
		if (track.wind === undefined) reportHalfWinds(situations, report);
		reportNoShare(situations, report);
	});

function listOf<T>(value: readonly T[] | undefined): readonly T[] {
	return Array.isArray(value) ? value : [];
}

function reportElevations(air: Air | undefined, situations: Situations, report: Report): void {
	const allowed = 'the elevation that goes with "altimeter", like "650 ft"';
	if (air?.altimeter !== undefined && air.elevation === undefined) report(['air', 'elevation'], allowed);
	situations.forEach((situation, index) => {
		const own = situation?.air;
		const isMissing = own?.altimeter !== undefined && own.elevation === undefined && air?.elevation === undefined;
		if (isMissing) report(['situations', index, 'air', 'elevation'], allowed);
	});
}

/** Half a wind can only change a whole one. */
function reportHalfWinds(situations: Situations, report: Report): void {
	situations.forEach((situation, index) => {
		const wind = situation?.wind;
		if (typeof wind !== 'object' || wind === null) return;
		for (const field of ['speed', 'from'] as const) {
			if (wind[field] !== undefined) continue;
			report(['situations', index, 'wind', field], `"speed" and "from", as the track itself has no wind`);
		}
	});
}

function reportNoShare(situations: Situations, report: Report): void {
	const base = situations.find(situation => situation?.name === baseName);
	const isSilent = base !== undefined && situations.every(situation => situation?.share === 0);
	if (isSilent) report(['situations'], 'a share above 0 in one situation at least', {found: 'a share of 0 everywhere'});
}
