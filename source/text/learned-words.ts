/** What practice teaches, in sentences. */
import {listed, speedText} from '../planning/words.ts';
import type {Anchor, StraightAnchor} from '../practice/learn/anchor.ts';
import type {CircumferenceLearned} from '../practice/learn/circumference.ts';
import type {GripLearned} from '../practice/learn/grip.ts';
import type {Learning} from '../practice/learn/learn.ts';
import {fixed, signed} from './units.ts';

const inchM = 0.0254;
const mmM = 1e-3;

/** "87.95 in (2233.9 mm) ± 0.05 in". */
export function circumferenceText(value: number, se?: number): string {
	const number = `${fixed(value / inchM, 2)} in (${fixed(value / mmM, 0)} mm)`;
	return se === undefined ? number : `${number}, known to ${fixed(se / inchM, 2)} in (${fixed(se / mmM, 1)} mm)`;
}

const percent = (share: number, digits: number) => `${fixed(100 * share, digits)} %`;

/** In sentences; what is held is said with how to hold the other. */
export function fittedLines({circumference, held, anchor, grip, readings}: Learning): string[] {
	return [
		...(circumference === undefined ? [] : circumferenceWords(circumference)),
		...(held === undefined ? [] : [heldWords[held]]),
		...anchorWords(
			anchor,
			readings.filter(({limited}) => limited).map(({name}) => name),
		),
		...gripWords(grip),
		...implausibleWords({circumference, anchor, grip}),
	];
}

function gripWords(grip: GripLearned | undefined): string[] {
	if (grip === undefined) return [];
	const {factor, straights, untold} = grip;
	const unclear =
		untold.length === 0
			? []
			: [`Grip seems to hold the exit of ${listed(untold)}, but the samples cannot tell how much of it there was.`];
	if (factor === undefined)
		return unclear.length > 0 ? unclear : ['No exit is held by grip: the log says nothing about how much there is.'];
	const held = straights.map(
		({name, heldS, alone}) => `${name} ${signed(100 * (alone.value - 1), 1)} % (${fixed(heldS, 1)} s)`,
	);
	return [
		`Grip ${signed(100 * (factor.value - 1), 1)} %, known to ${percent(factor.se, 1)}, from exits that it holds: ${held.join(', ')}.`,
		...unclear,
	];
}

/** What practice corrects is small: beyond these something else is wrong. */
const plausible = {circumference: 0.03, drag: 0.2, power: 0.05, grip: 0.3} as const;

function implausibleWords({
	circumference,
	anchor,
	grip,
}: Pick<Learning, 'circumference' | 'anchor' | 'grip'>): string[] {
	const factors = {
		circumference: circumference?.factor,
		drag: anchor?.drag?.value,
		power: anchor?.power?.value,
		grip: grip?.factor?.value,
	};
	const wild = (Object.keys(plausible) as (keyof typeof plausible)[]).filter(
		name => Math.abs((factors[name] ?? 1) - 1) > plausible[name],
	);
	if (wild.length === 0) return [];
	return [
		`So much of a difference in ${listed(wild)} is not likely: check the pair, the gear and the straight before accepting it.`,
	];
}

const heldWords: Record<NonNullable<Learning['held']>, string> = {
	circumference:
		'Held: the circumference. RPM alone cannot tell it from the speed, so the RPM says how fast the car was; with "speed" held it would correct the circumference.',
	speed:
		'Held: the model\'s speed. RPM alone cannot tell it from the circumference, so the RPM says how far a turn of the tire goes; with "circumference" held it would correct drag or power.',
};

function circumferenceWords({rolloutM, factor, growth, slipHeld, growthHeld}: CircumferenceLearned): string[] {
	const before = rolloutM.value / factor;
	const start = `Rolling circumference at standstill ${circumferenceText(rolloutM.value, rolloutM.se)}; by the documents ${circumferenceText(before)}, ${signed(100 * (factor - 1), 2)} %.`;
	const grown =
		growth === undefined
			? `Growth was held at ${percent(growthHeld, 2)}, slip at ${percent(slipHeld, 1)}.`
			: `Growth at 100 mph ${percent(growth.value, 2)}, known to ${percent(growth.se, 2)}; by the documents ${percent(growthHeld, 2)}. Slip was held at ${percent(slipHeld, 1)}: n/V alone cannot tell it from the circumference.`;
	return [start, grown];
}

function anchorWords(anchor: Anchor | undefined, limited: readonly string[]): string[] {
	const onLimiter = limited.map(name => `${name} ends on the limiter: it says nothing about drag and power.`);
	if (anchor === undefined) return onLimiter;
	const factor = (name: string, what: Anchor['drag'], held: string) =>
		what === undefined
			? []
			: [`${name} ${signed(100 * (what.value - 1), 1)} %, known to ${percent(what.se, 1)}; ${held}.`];
	const lost = anchor.straights
		.filter(({alone, tells}) => alone === undefined && tells !== undefined)
		.map(
			({reading, tells, beforeMps}) =>
				`${reading.name} is ${speedText(Math.abs(beforeMps))} ${beforeMps > 0 ? 'faster' : 'slower'} than the model: no ${tells} within reason explains that. Check gear, pair, length and exit speed.`,
		);
	const silent = anchor.straights.filter(({tells}) => tells === undefined).map(({reading}) => reading.name);
	const scattered =
		anchor.misfit !== undefined && anchor.misfit > scattersFrom
			? [
					`The straights disagree by ${fixed(anchor.misfit, 1)} times what their numbers are known to: something else differs between them, such as wind or length.`,
				]
			: [];
	return [
		...factor('Drag area', anchor.drag, anchor.power ? 'the long straights tell it' : powerHeld),
		...factor('Power', anchor.power, anchor.drag ? 'the short straights tell it' : dragHeld),
		...aloneWords(anchor.straights),
		...(silent.length > 0
			? [`Nothing of drag and power is told by ${listed(silent)}: grip or the shifts decide the speed at the end.`]
			: []),
		...scattered,
		...lost,
		...onLimiter,
	];
}
const powerHeld = 'power was held, since a straight cannot tell it from drag';
const dragHeld = 'drag was held, since 1 % of it moves the end of these straights by less than 0.2 mph (0.3 km/h)';

/** "Each straight by itself: Front drag +5.6 % (to 0.2 %), Back drag +5.9 % (to 0.2 %)." */
function aloneWords(straights: readonly StraightAnchor[]): string[] {
	const asked = straights.flatMap(({reading, tells, alone}) =>
		alone === undefined
			? []
			: [`${reading.name} ${tells} ${signed(100 * (alone.value - 1), 1)} % (to ${percent(alone.se, 1)})`],
	);
	return asked.length < 2 ? [] : [`Each straight by itself: ${asked.join(', ')}.`];
}

/** Of two straights one in twenty misfits is above 2. */
const scattersFrom = 2;
