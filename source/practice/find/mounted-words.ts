/** What is said of the pair and the set. */
import {flipped, pairName} from '../../drivetrain/gear-pair.ts';
import type {Plan} from '../../planning/plan.ts';
import {listed} from '../../planning/words.ts';
import type {Fitting, Mounted} from './findings.ts';

type Told = Omit<Mounted, 'gearColumnAgrees' | 'why'>;

/** "33/35 set A" */
export const fittingName = ({candidate}: Fitting) => `${candidate.pairName} set ${candidate.gearbox.name}`;

const percent = (fraction: number, digits = 1) => `${(100 * fraction).toFixed(digits)} %`;

/** Shown as 0.0 %. */
const asStated = 0.0005;

/** "a rolling circumference 0.6 % above the documents'" */
function circumferenceText({circumferenceFactor}: Fitting): string {
	const off = circumferenceFactor - 1;
	if (Math.abs(off) < asStated) return "the documents' rolling circumference";
	return `a rolling circumference ${percent(Math.abs(off))} ${off < 0 ? 'below' : 'above'} the documents'`;
}

export function whyMounted(told: Told, plan: Plan, span: number, unitSlip: string | undefined): string {
	return [verdictText(told, span), slipText(unitSlip), alsoText(told), apartText(told, plan)]
		.filter(text => text !== '')
		.join(' ');
}

function verdictText({verdict, best, installed, nearest}: Told, span: number): string {
	switch (verdict) {
		case 'asInstalled':
			return `The log fits ${fittingName(best!)}, as installed, with ${circumferenceText(best!)}.`;
		case 'noInstalled':
			return `The documents do not say what is installed; the log fits ${fittingName(best!)} with ${circumferenceText(best!)}.`;
		case 'otherFits':
			return `The log fits ${fittingName(best!)} with ${circumferenceText(best!)}, not ${insteadText(installed)}.`;
		case 'flippedFits':
			return `The log fits ${fittingName(best!)}, that is ${pairName(flipped(best!.candidate.pair))} with its gears on the wrong shafts, with ${circumferenceText(best!)}; not ${insteadText(installed)}. Check the pair by hand before the car runs again.`;
		case 'nothingFits':
			return `No pair and set on the rack fits the log within ${percent(span)} of the documents' circumference: the nearest, ${fittingName(nearest!)}, needs ${circumferenceText(nearest!)} and leaves its ratios ${percent(nearest!.residual)} off. Wrong car, wrong units, or a rollout that is far off.`;
		case 'unknown':
			return 'Too few samples at full throttle to tell the gears.';
	}
}

function slipText(unitSlip: string | undefined): string {
	return unitSlip === undefined
		? ''
		: `What is installed would fit if the speed were ${unitSlip}: look at the column and its unit.`;
}

function insteadText(installed: Fitting | undefined): string {
	if (installed === undefined) return 'what is installed, which is not on the rack';
	return `${fittingName(installed)}, which is installed: that would need ${circumferenceText(installed)}`;
}

function alsoText({alsoFit, verdict}: Told): string {
	if (alsoFit.length === 0) return '';
	const names = alsoFit
		.slice(0, mostNamed)
		.map(fit => `${fittingName(fit)} (circumference ${signed(fit.circumferenceFactor - 1)})`);
	const more = alsoFit.length - names.length;
	const told = listed(more > 0 ? [...names, `${more} more`] : names);
	const kept = verdict === 'asInstalled' ? 'what is installed is kept' : 'the likeliest is taken';
	return `The log alone cannot tell it from ${told}; ${kept}.`;
}

/** As many as one reads. */
const mostNamed = 3;

const signed = (fraction: number) => `${fraction < 0 ? '-' : '+'}${percent(Math.abs(fraction))}`;

function apartText({clusters, best}: Told, {track}: Plan): string {
	if (best === undefined || clusters.length > 1) return '';
	return `Only one gear was used at full throttle at ${track.name}, so the set is not seen in the log.`;
}
