/** Whatever form a plan was sent in: text, the content of a QR code, the short form, or JSON. */
import type {Problem} from '../documents/problem.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import {readPlanJson} from './check-plan.ts';
import {densePrefix, readDensePlan} from './dense.ts';
import type {PlanDocument} from './plan-document.ts';
import {readPlan} from './read-plan.ts';
import {readShortForm, type ShortPlan} from './short-form.ts';

export type SharedReading =
	| {ok: true; form: 'plan'; plan: PlanDocument; car: Car; track: Track}
	/** Only the numbers to act on; nothing to compute them again from. */
	| {ok: true; form: 'short'; fields: ShortPlan}
	| {ok: false; problems: Problem[]};

/** The plan in a message, or all that is wrong with it. */
export async function readShared(message: string): Promise<SharedReading> {
	if (/^\ufeff?\s*\{/.test(message)) return asPlan(await readPlanJson(message));
	if (/DROPRACK\s+PLAN/.test(message)) return asPlan(await readPlan(message));
	if (message.includes(densePrefix)) return asPlan(await readDensePlan(message));
	if (!/\bDR1\s/i.test(message)) return asPlan(await readPlan(message));
	const short = readShortForm(message);
	if (short.ok) return {ok: true, form: 'short', fields: short.fields};
	return {ok: false, problems: [{path: '', found: short.found, allowed: short.allowed}]};
}

function asPlan(reading: Awaited<ReturnType<typeof readPlan>>): SharedReading {
	return reading.ok ? {...reading, form: 'plan'} : reading;
}
