/** The answer of `droprack learn` for programs: SI, unit in the name. */

import {pathText} from '../documents/problem.ts';
import type {Car} from '../drivetrain/car.ts';
import type {Track} from '../drivetrain/track.ts';
import type {Row} from '../planning/results.ts';
import type {Findings, Fitting} from '../practice/find/findings.ts';
import type {Effect} from '../practice/learn/effect.ts';
import type {Learning} from '../practice/learn/learn.ts';
import type {Lesson} from '../practice/learn/lesson.ts';
import type {ModelRun} from '../practice/learn/model.ts';
import type {Known} from '../practice/learn/reading.ts';

type Answer = {car: Car; track: Track; taught: Lesson; effect: Effect | undefined; accepted: readonly string[]};

export const learnJson = ({car, track, taught, effect, accepted}: Answer) => {
	const {learning, findings, proposals} = taught;
	return {
		track: track.name,
		car: car.name,
		source: learning.source,
		from: learning.from,
		pair: learning.candidate?.pairName ?? null,
		gearbox: learning.candidate?.gearbox.name ?? null,
		held: learning.held ?? null,
		...fitted(learning),
		straights: learning.compared.map(({reading, before, after}) => ({
			name: reading.name,
			gear: reading.gear ?? after?.endGear ?? null,
			endSpeedMps: known(reading.endMps),
			endSpeedSeen: reading.speedSeen,
			endRpm: known(reading.endRpm),
			timeS: known(reading.timeS),
			before: run(before),
			after: run(after),
		})),
		proposals: proposals.map(({name, rows}) => ({
			name,
			rows: rows.map(({document, path, before, value, label}) => ({
				document,
				field: pathText(path),
				label,
				before: before ?? null,
				value,
			})),
		})),
		accepted,
		effect:
			effect === undefined ? null : {before: choice(effect.before), after: choice(effect.after), words: effect.words},
		log: findings === undefined ? null : shownOf(findings),
	};
};

const known = (one: Known | undefined) => (one === undefined ? null : {value: one.value, se: one.se});
const choice = (row: Row | undefined) => (row === undefined ? null : {pair: row.pair, gearbox: row.gearbox});
const run = (one: ModelRun | undefined) =>
	one === undefined ? null : {endSpeedMps: one.endMps, endRpm: one.endRpm, endGear: one.endGear, timeS: one.timeS};

const fitted = ({circumference, anchor, grip}: Learning) => ({
	circumference:
		circumference === undefined
			? null
			: {
					rolloutM: known(circumference.rolloutM),
					factor: circumference.factor,
					growth: known(circumference.growth),
					slipHeld: circumference.slipHeld,
				},
	drag: known(anchor?.drag),
	power: known(anchor?.power),
	grip: known(grip?.factor),
	misfit: anchor?.misfit ?? null,
});

const fitting = (one: Fitting | undefined) =>
	one === undefined
		? null
		: {
				pair: one.candidate.pairName,
				gearbox: one.candidate.gearbox.name,
				flipped: one.flipped,
				circumferenceFactor: one.circumferenceFactor,
				residual: one.residual,
			};

/** All but what there is one of a sample. */
const shownOf = ({samples: _, mounted, ...rest}: Findings) => ({
	...rest,
	mounted: {
		verdict: mounted.verdict,
		why: mounted.why,
		best: fitting(mounted.best),
		installed: fitting(mounted.installed),
		alsoFit: mounted.alsoFit.map(fitting),
		clusters: mounted.clusters,
	},
});
