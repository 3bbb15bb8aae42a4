/** The least that views are made of: text whose meaning is named. */
import {visible} from '../documents/visible.ts';

/** `first` and `second` are the two lines of a picture. */
export type Tone = 'plain' | 'strong' | 'muted' | 'pass' | 'near' | 'fail' | 'first' | 'second';
export type Cell = {text: string; tone: Tone};
export type Line = readonly Cell[];

/** A cell; what a stranger's text could do to a terminal becomes visible here. */
export const cell = (text: string, tone: Tone = 'plain'): Cell => ({text: visible(text), tone});
