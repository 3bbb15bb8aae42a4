/** `droprack schema`: the JSON Schema that an editor completes and checks documents with. */
import {carSchema, trackSchema} from '../documents/schema.ts';
import type {CommandRun} from './command.ts';
import {printJson} from './print.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';

export const schema: CommandRun = async request => {
	if (request.argument === 'track') return replyDone(printJson(trackSchema(), request));
	if (request.argument === 'car') return replyDone(printJson(carSchema(), request));
	const found = request.argument === undefined ? '' : ` Found ${request.argument}.`;
	return replyRefused(badInput(`droprack schema: of which kind of document, track or car?${found}`));
};
