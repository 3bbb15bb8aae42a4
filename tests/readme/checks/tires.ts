/** What a tire's size tells of how far it rolls. */
import {mileM} from '../../../source/drivetrain/constants.ts';
import {etrtoCircumferenceM, overallDiameterM, parseTireSize} from '../../../source/drivetrain/tire-size.ts';
import {turnsPerMile} from '../../road-cars.ts';
import {casesOf, type OutsideCheck} from '../outside-check.ts';

const diameterM = (text: string): number => {
	const size = parseTireSize(text)!;
	return overallDiameterM(size.widthMm, size.aspectPercent, size.rimIn);
};

export const tires: readonly OutsideCheck[] = [
	{
		what: 'Overall diameter by size, four sizes',
		source: 'ISO 4000-1',
		mark: 'from memory',
		unit: 'mm',
		cases: casesOf(
			[
				['614.6', '185/70R14'],
				['627.0', '205/60R15'],
				['651.8', '275/40R17'],
				['631.9', '205/55R16'],
			],
			size => 1000 * diameterM(size),
		),
		tolerance: 1e-14,
	},
	{
		what: 'Turns a mile by size (3.05 diameters, ETRTO: +1.5/-2.5 %), ten sizes',
		source: 'Consumer Reports, April 1990 (R, rpart::car90)',
		mark: 'published',
		unit: 'rev/mi',
		cases: Object.entries(turnsPerMile).map(([size, outside]) => ({
			outside: String(outside),
			ours: mileM / etrtoCircumferenceM(diameterM(size)),
		})),
		tolerance: 0.015,
	},
];
