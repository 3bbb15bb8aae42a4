/** What was mounted: what is installed by the documents, unless the log speaks clearly against it. */
import {mileM, mphMps} from '../../drivetrain/constants.ts';
import {flipped, samePair} from '../../drivetrain/gear-pair.ts';
import type {Plan} from '../../planning/plan.ts';
import type {Hump, Humps} from './clusters.ts';
import type {Fitting, Mounted, MountedVerdict} from './findings.ts';
import {explains, fitsAt, fittingsOf, type Installed, isInstalled, type Laid, plausibleSpan} from './fittings.ts';
import {whyMounted} from './mounted-words.ts';

/** Penalties closer than this are not told apart: three standard deviations, squared. */
const sameFit = 9;
const mostAlso = 8;

/**
 * The rule: a pair and set explain the log if a circumference within the plausible span of the documents' (2 % at low speed,
 * more where growth counts) brings their ratios to within 0.6 % of the humps. What is installed is kept if it explains the log, unless another explains it better by three standard
 * deviations. Else the likeliest of those that do is named, where a mistake in mounting (the installed pair turned, another
 * pair, another set, a pair that is not on hand) counts as the less likely the more of it there must be.
 */
export function mountedBy(
	plan: Plan,
	{humps, speedMps}: Humps,
	installed: Installed | undefined,
): Omit<Mounted, 'gearColumnAgrees'> {
	const span = plausibleSpan(speedMps);
	const fits = humps.length === 0 ? [] : fittingsOf(plan.car, humps, installed, plan.track.gears, span);
	const documented = fits.find(fit => isInstalled(fit, installed));
	const explaining = fits.filter(fit => explains(fit, span));
	const first = explaining[0];
	const kept = documented !== undefined && explains(documented, span) && documented.penalty - first!.penalty <= sameFit;
	const best = kept ? documented : first;
	const verdict = verdictOf(humps, best, documented, installed);
	const alsoFit = explaining
		.filter(fit => best !== undefined && fit !== best && fit.penalty - best.penalty <= sameFit)
		.slice(0, mostAlso);
	const slip = humps.length === 0 || best === documented ? undefined : unitSlip(documented, humps, span);
	const mounted = {
		verdict,
		best: best && plain(best),
		installed: documented && plain(documented),
		alsoFit: alsoFit.map(plain),
		nearest: best === undefined && fits[0] !== undefined ? plain(fits[0]) : undefined,
		certain: best !== undefined && slip === undefined && (kept || alsoFit.length === 0),
		clusters: humps.map(({overall, spread, samples}, i) => ({overall, spread, samples, gear: best?.gears[i]})),
	};
	return {...mounted, why: whyMounted(mounted, plan, span, slip)};
}

const kilometerM = 1000;
/** Speeds read in one unit that were logged in another: how many times too high they then are. */
const unitSlips: readonly (readonly [number, string])[] = [
	[mileM / kilometerM, 'km/h read as mph'],
	[kilometerM / mileM, 'mph read as km/h'],
	[3.6, 'km/h read as m/s'],
	[1 / mphMps, 'mph read as m/s'],
	[mphMps, 'm/s read as mph'],
	[1 / 3.6, 'm/s read as km/h'],
];

/** The unit that would make what is installed fit after all. */
function unitSlip(documented: Laid | undefined, humps: readonly Hump[], span: number): string | undefined {
	if (documented === undefined) return undefined;
	const {overall} = documented.candidate.train;
	return unitSlips.find(([times]) => fitsAt(overall, humps, times, span))?.[1];
}

function verdictOf(
	humps: readonly Hump[],
	best: Laid | undefined,
	documented: Laid | undefined,
	installed: Installed | undefined,
): MountedVerdict {
	if (humps.length === 0) return 'unknown';
	if (best === undefined) return 'nothingFits';
	if (best === documented) return 'asInstalled';
	if (best.flipped || (installed !== undefined && samePair(flipped(best.candidate.pair), installed.pair)))
		return 'flippedFits';
	return installed === undefined ? 'noInstalled' : 'otherFits';
}

const plain = ({candidate, flipped: turned, circumferenceFactor, residual}: Laid): Fitting => ({
	candidate,
	flipped: turned,
	circumferenceFactor,
	residual,
});
