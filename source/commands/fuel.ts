/** `droprack fuel`: how far the fuel goes with one pair, beside another. */
import {fuelAnswer} from '../life/answer.ts';
import {fuelView} from '../text/fuel-view.ts';
import type {CommandRun} from './command.ts';
import {compareLife} from './compare-life.ts';

export const fuel: CommandRun = (request, around) => compareLife(request, around, fuelAnswer, fuelView);
