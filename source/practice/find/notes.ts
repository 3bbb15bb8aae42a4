/** What to know beside the numbers. Each is said once. */
import {growthReferenceMps} from '../../drivetrain/tire.ts';
import type {Plan} from '../../planning/plan.ts';
import {counted, listed, speedText} from '../../planning/words.ts';
import type {Findings, Lap, LapKind, Note} from './findings.ts';
import {plausibleSpan} from './fittings.ts';
import type {FullThrottle} from './full-throttle.ts';

type Seen = Omit<Findings, 'notes'>;

/** Below these rates, in samples a second, shifts are not seen, and exits and ends only to within some meters. */
const shiftsFromHz = 8;
export const edgesFromHz = 4;
const gearColumnDoubt = 0.97;

export function notesOn(seen: Seen, plan: Plan, by: FullThrottle['by']): Note[] {
	return [
		...sampling(seen),
		...throttle(seen, by),
		...laps(seen),
		...matching(seen),
		...mounted(seen),
		...wheelspin(seen),
		...circumference(seen, plan),
	];
}

function sampling({log}: Seen): Note[] {
	if (log.rateHz >= shiftsFromHz || log.rateHz === 0) return [];
	const rate = `The log has ${log.rateHz.toFixed(log.rateHz < 2 ? 1 : 0)} samples a second: shift RPM and missed shifts cannot be told from it`;
	const edges = `; exits and ends of straights are the first and last full-throttle samples, up to ${(1 / log.rateHz).toFixed(1)} s off, so no exit speed and no highest RPM is proposed. Pair, gears and circumference are found all the same`;
	return [{code: 'slowSampling', text: `${rate}${log.rateHz < edgesFromHz ? edges : ''}.`}];
}

function throttle({log}: Seen, by: FullThrottle['by']): Note[] {
	if (by === 'throttle') return [];
	const why = log.throttle ? 'The throttle of the log shows no lift, or never opens' : 'The log has no throttle';
	return [
		{
			code: 'noThrottle',
			text: `${why}: exits and ends of straights are told by where the speed begins to rise and to fall, so exit speeds are rough.`,
		},
	];
}

const kindWords: Record<Exclude<LapKind, 'good'>, string> = {
	out: 'out lap',
	in: 'in lap',
	pace: 'lap at pace speed',
	slow: 'slow lap',
	part: 'part of a lap',
};

function laps({laps: all, lapsFrom, passes}: Seen): Note[] {
	const notes: Note[] = [];
	if (lapsFrom === 'none')
		notes.push({
			code: 'noLaps',
			text: 'No laps were told apart: the log has no lap column, and its straights do not repeat.',
		});
	const good = all.filter(lap => lap.kind === 'good');
	if (!passes.some(pass => pass.good))
		notes.push({code: 'noGoodLap', text: 'No straight of a good lap was found: nothing is fitted.'});
	else if (good.length === 1)
		notes.push({code: 'oneLap', text: 'There is one good lap: no spread from lap to lap can be told.'});
	const left = all.filter((lap): lap is Lap & {kind: Exclude<LapKind, 'good'>} => lap.kind !== 'good');
	const others = left.length > mostTold ? [counted(left.length - mostTold, 'other')] : [];
	if (left.length > 0)
		notes.push({
			code: 'lapsLeftOut',
			text: `Left out of medians and fits: ${listed([...left.slice(0, mostTold).map(told), ...others])}.`,
		});
	return notes;
}

const mostTold = 6;
const told = (lap: Lap & {kind: Exclude<LapKind, 'good'>}) => `lap ${lap.number} (${kindWords[lap.kind]}: ${lap.why})`;

function matching({matching: {why}}: Seen): Note[] {
	return why === '' ? [] : [{code: 'straightsDiffer', text: why}];
}

function mounted({mounted: found}: Seen): Note[] {
	const pair: Note = {code: found.verdict === 'nothingFits' ? 'wrongCar' : 'pair', text: found.why};
	const agrees = found.gearColumnAgrees;
	if (agrees === undefined || agrees >= gearColumnDoubt) return [pair];
	const text = `The gear column of the log says the gear that the ratio says in ${(100 * agrees).toFixed(0)} % of the samples at full throttle; the ratio is used.`;
	return [pair, {code: 'gearColumn', text}];
}

function wheelspin({wheelspin: {samples, exits, spinning}}: Seen): Note[] {
	if (samples === 0) return [];
	return [
		{
			code: 'wheelspin',
			text: `Wheelspin at ${counted(spinning, 'exit')} of ${exits}; those samples are left out of the fits.`,
		},
	];
}

function circumference({circumference: fit, mounted: {verdict}}: Seen, {base}: Plan): Note[] {
	if (fit === undefined) {
		if (verdict === 'nothingFits') return [];
		return [
			{code: 'noCircumference', text: 'Too few steady samples in a known gear on good laps for the circumference.'},
		];
	}
	const notes: Note[] = [
		{
			code: 'slipHeld',
			text: `Slip is held at ${(100 * fit.slipHeld).toFixed(1)} %: engine and road speed cannot tell it from the circumference.`,
		},
	];
	if (fit.growthHeld) {
		notes.push({
			code: 'growthHeld',
			text: `Growth is held at ${(100 * fit.growth.value).toFixed(1)} %: it does not show between ${speedText(fit.lowestMps)} and ${speedText(fit.highestMps)}.`,
		});
	}
	const documented = base.vehicle.rolloutM * (1 + base.vehicle.growth * (fit.atMps / growthReferenceMps) ** 2);
	const off = fit.circumferenceM.value / documented - 1;
	if (Math.abs(off) > plausibleSpan(fit.atMps)) {
		notes.push({
			code: 'farCircumference',
			text: `The circumference is ${(100 * Math.abs(off)).toFixed(1)} % ${off < 0 ? 'below' : 'above'} the documents': more than a rollout is usually off.`,
		});
	}
	return notes;
}
