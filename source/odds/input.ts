/** One number that is not known exactly: how far it may be off, and why that is thought. */
import type {Shift} from './world.ts';

export type InputKind =
	| 'rollout'
	| 'growth'
	| 'slip'
	| 'exit'
	| 'tow'
	| 'situation exit'
	| 'drag'
	| 'power'
	| 'grip'
	| 'temperature'
	| 'pressure'
	| 'wind speed'
	| 'wind direction'
	/** Drawn only where a document states how well it is known. */
	| 'other';

/** What its standard deviation is in: SI, or a share of the number. */
export type InputUnit =
	| 'share'
	| 'points'
	| 'speed'
	| 'temperature'
	| 'pressure'
	| 'angle'
	| 'mass'
	| 'area'
	| 'length'
	| 'number'
	| 'power';

export type Input = {
	/** "rollout", "exit of Front", "drag in In the tow". */
	readonly name: string;
	readonly kind: InputKind;
	/** One standard deviation, above 0. */
	readonly sd: number;
	readonly unit: InputUnit;
	/** Stated in a document, or the default with its reason. */
	readonly source: 'stated' | 'default';
	readonly why: string;
	/** Moves the shift by so much of it. */
	readonly move: (shift: Shift, off: number) => void;
};
