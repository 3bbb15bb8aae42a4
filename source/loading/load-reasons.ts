/** What a pair on the list is for, in a few words. */
import {listed, secondsText} from '../planning/words.ts';
import type {Role, RoleName} from './load-results.ts';

/** "Best at Quillmere; shorter step at Tarrowdale and Cullamere."; with the sets where every set counts. */
export function loadReason(roles: readonly Role[], eachSet: boolean): string {
	const kinds = (['best', 'shorter', 'taller'] as const).flatMap(name => {
		const steps = [...new Set(roles.filter(({role}) => role === name).map(({step}) => step))];
		return steps.toSorted((one, other) => one - other).map(step => ({name, step}));
	});
	const parts = kinds.map(({name, step}) => {
		const places = roles.filter(role => role.role === name && role.step === step).map(role => placeOf(role, eachSet));
		return `${roleText(name, step)} at ${listed([...new Set(places)])}`;
	});
	const text = parts.join('; ');
	return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

/** What is below it rounds to 0.000 s. */
const shownFromS = 0.0005;

function placeOf({track, gearbox, role, lossS}: Role, eachSet: boolean): string {
	const place = eachSet ? `${track} with ${gearbox}` : track;
	return role === 'best' && lossS !== null && lossS >= shownFromS
		? `${place} (${secondsText(lossS)} a lap off its very best)`
		: place;
}

/** "best", "shorter step", "second taller step". */
export function roleText(name: RoleName, step: number): string {
	if (name === 'best') return name;
	return step === 1 ? `${name} step` : `${ordinals[step - 2] ?? `${step}th`} ${name} step`;
}

const ordinals = ['second', 'third', 'fourth', 'fifth'];
