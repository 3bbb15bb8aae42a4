/** What the size on a sidewall tells: overall diameter, and about what circumference it rolls on. */
import {inchM} from './constants.ts';

/** "275/40R17": section width, nominal aspect ratio in per cent, rim code. */
export type TireSize = {readonly widthMm: number; readonly aspectPercent: number; readonly rimIn: number};

const metricRadial = /^(?:P|LT)?(\d{3})\/(\d{2,3})Z?R(\d{2}(?:\.5)?)$/i;

/** The fields of a metric radial size such as `275/40R17`, `P275/40ZR17` or `275/40 R 17`; undefined for anything else. */
export function parseTireSize(text: string): TireSize | undefined {
	const [, width, aspect, rim] = metricRadial.exec(text.replaceAll(/\s/g, '')) ?? [];
	const size = {widthMm: Number(width), aspectPercent: Number(aspect), rimIn: Number(rim)};
	return size.widthMm > 0 && size.aspectPercent > 0 && size.rimIn > 0 ? size : undefined;
}

/** Design overall diameter by ISO 4000-1, m: rim diameter and twice the section height. `aspectPercent` is 40 in 275/40R17. */
export function overallDiameterM(widthMm: number, aspectPercent: number, rimIn: number): number {
	return rimIn * inchM + (2 * (widthMm / 1000) * aspectPercent) / 100;
}

/** ETRTO: a radial rolls on 3.05 overall diameters at 60 km/h. Less than π, for the tire flattens where it stands. */
const radialRolling = 3.05;

/** What ETRTO allows a radial's rolling circumference to differ by, as fractions. */
export const etrtoTolerance = {above: 0.015, below: 0.025};

/** Rolling circumference of a radial by its overall diameter, m (ETRTO, at 60 km/h), good to `etrtoTolerance`. */
export function etrtoCircumferenceM(diameterM: number): number {
	return radialRolling * diameterM;
}

/** Whether a rolling circumference is what ETRTO lets a radial of this overall diameter have. */
export function withinEtrto(circumferenceM: number, diameterM: number): boolean {
	const difference = circumferenceM / etrtoCircumferenceM(diameterM) - 1;
	return difference <= etrtoTolerance.above && difference >= -etrtoTolerance.below;
}
