/** `droprack card`: what one person needs, to print or send. */
import {driverCard} from '../sharing/cards/driver-card.ts';
import {engineSheet} from '../sharing/cards/engine-sheet.ts';
import {swapSheet} from '../sharing/cards/swap-sheet.ts';
import {cell, line} from '../text/blocks.ts';
import {headingOf} from '../text/heading-view.ts';
import {chosenRow} from './chosen-row.ts';
import type {CommandRun} from './command.ts';
import {withCopy} from './copy.ts';
import {printJson, printText} from './print.ts';
import {badInput, replyDone, replyRefused} from './reply.ts';

const cards = new Map([
	['driver', driverCard],
	['swap', swapSheet],
	['engine', engineSheet],
]);

export const card: CommandRun = async (request, around) => {
	const {argument, second} = request;
	const make = cards.get(argument ?? '');
	if (make === undefined || second === undefined) {
		const found = make === undefined && argument !== undefined ? ` Found ${argument}.` : '';
		return replyRefused(
			badInput(`droprack card: whom for, and which TRACK? driver, swap or engine, then a track.${found}`),
		);
	}
	const chosen = await chosenRow({...request, argument: second}, around);
	if (!chosen.ok) return replyRefused(chosen);
	const {car, track, row, setting, table, notes} = chosen.value;
	const {day} = headingOf(car, track, around.now);
	const lines = make({car, track, row, setting, table, day, units: request.units});
	const out = request.json
		? printJson({track: track.name, car: car.name, card: argument, lines}, request)
		: printText(
				lines.map(text => line(cell(text))),
				request,
				around,
			);
	const reply = replyDone(out, notes, request.strict && row.verdict === 'fail');
	return request.copy ? withCopy(reply, `${lines.join('\n')}\n`, around) : reply;
};
