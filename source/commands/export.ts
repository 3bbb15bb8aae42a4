/** `droprack export`: the whole store as files in a directory. */
import {resolve} from 'node:path';
import {visible} from '../documents/visible.ts';
import {problemText} from '../store/answer.ts';
import {exportStore} from '../store/export-store.ts';
import {homeDirectory} from '../store/home.ts';
import {text} from '../text/blocks.ts';
import type {CommandRun} from './command.ts';
import {printJson, printText} from './print.ts';
import {badInput, replyDone, replyRefused, status} from './reply.ts';
import {isOfTheDisk, replyProblem} from './store-reply.ts';

export const exportAll: CommandRun = async (request, around) => {
	if (request.argument === undefined) return replyRefused(badInput('droprack export: to which DIR?'));
	const answer = exportStore(homeDirectory(around.environment), resolve(request.argument));
	if (!answer.ok) return replyProblem(answer);
	const {written, same, extra, problems} = answer.value;
	const lines = [
		...written.map(file => `written  ${file}`),
		...extra.map(file => `extra    ${file}: the store has no document for it; it stays.`),
		`${written.length} written, ${same.length} as they were.`,
	];
	const out = request.json
		? printJson({written, same, extra}, request)
		: printText(
				lines.map(each => text(visible(each), 'plain', 2)),
				request,
				around,
			);
	const reply = replyDone(out, problems.map(problemText), request.strict && problems.length > 0);
	return problems.some(isOfTheDisk) ? {...reply, status: status.unreachable} : reply;
};
