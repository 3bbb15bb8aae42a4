/** `droprack life`: what a race with one pair asks of the engine, beside another. */
import {lifeAnswer} from '../life/answer.ts';
import {lifeView} from '../text/life-view.ts';
import type {CommandRun} from './command.ts';
import {compareLife} from './compare-life.ts';

export const life: CommandRun = (request, around) => compareLife(request, around, lifeAnswer, lifeView);
