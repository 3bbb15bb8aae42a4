/** `droprack share`: the plan of one pair and set, to hand over. */
import {describeProblems} from '../documents/read.ts';
import {checkPlan} from '../sharing/check-plan.ts';
import {densePlan} from '../sharing/dense.ts';
import {makePlan} from '../sharing/make-plan.ts';
import type {PlanDocument} from '../sharing/plan-document.ts';
import {printPlan} from '../sharing/print-plan.ts';
import {drawQr, paintQr} from '../sharing/qr.ts';
import {shortForm} from '../sharing/short-form.ts';
import {chosenRow} from './chosen-row.ts';
import type {CommandRun} from './command.ts';
import {withCopy} from './copy.ts';
import {printJson} from './print.ts';
import {badInput, type Found, found, replyDone, replyRefused} from './reply.ts';
import type {Request} from './request.ts';
import type {Surroundings} from './surroundings.ts';

export const share: CommandRun = async (request, around) => {
	const chosen = await chosenRow(request, around);
	if (!chosen.ok) return replyRefused(chosen);
	const {documents, row, setting, table, notes} = chosen.value;
	const date = around.now.toISOString().replace(/\.\d+Z$/, 'Z');
	const plan = makePlan({...documents, row, setting, table, date, notes: request.notes});
	const checked = await checkPlan(plan as unknown as Record<string, unknown>);
	if (!checked.ok) return replyRefused(badInput(describeProblems('the plan', checked.problems)));
	const text = request.short ? `${shortForm(plan).line}\n` : printPlan(plan);
	const out = request.qr ? qrOf(plan, request, around) : found(request.json ? jsonOf(plan, request) : text);
	if (!out.ok) return replyRefused(out);
	const fails = row.verdict === 'fail';
	const said = fails ? [...notes, `${row.pair} ${row.gearbox} FAILS a check. ${row.reason}`] : notes;
	const reply = replyDone(out.value, said, request.strict && fails);
	return request.copy ? withCopy(reply, text, around) : reply;
};

const jsonOf = (plan: PlanDocument, request: Request): string =>
	printJson(request.short ? shortForm(plan) : plan, request);

/** Through a pipe there is no window; then this one, which plans of up to four straights fit. */
const window = {columns: 100, rows: 50};

const qrOf = (plan: PlanDocument, {short, ascii, json}: Request, around: Surroundings): Found<string> => {
	if (ascii || json) return badInput('droprack: a QR code is drawn with block characters: without --ascii and --json.');
	const {columns, rows} = around.rows === undefined ? window : {columns: around.columns, rows: around.rows};
	const drawn = drawQr(short ? shortForm(plan).line : densePlan(plan), {columns, rows});
	if (drawn.ok) return found(paintQr(drawn.lines));
	const {needs} = drawn;
	const size =
		needs.columns === 0
			? 'The plan is too long for any QR code.'
			: `The QR code needs a window of ${needs.columns} x ${needs.rows} characters; this one has ${columns} x ${rows}.`;
	return badInput(`droprack: ${size}${short ? '' : ' --short --qr draws the one line to act on.'}`);
};
