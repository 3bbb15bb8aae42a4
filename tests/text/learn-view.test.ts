import {describe, expect, test} from 'vitest';
import {planFor, settingOf} from '../../source/planning/plan.ts';
import {candidateFor, learnFromFindings, learnFromSeen} from '../../source/practice/learn/learn.ts';
import {effectOn, findingsFor, lessonFrom} from '../../source/practice/learn/lesson.ts';
import {lapPicture, ratioPicture} from '../../source/practice/learn/pictures.ts';
import {headingOf} from '../../source/text/heading-view.ts';
import {layOut} from '../../source/text/layout.ts';
import {type LearnAnswer, learnView} from '../../source/text/learn-view.ts';
import {fittedLines} from '../../source/text/learned-words.ts';
import {unitsOf} from '../../source/text/units.ts';
import {displayWidth} from '../../source/text/width.ts';
import {demoDocuments, subjectOf} from '../practice/learn/subject.ts';
import {generateLog} from '../practice/log-generator.ts';

const documents = demoDocuments();
const subject = subjectOf(documents);
const planned = planFor(subject.car, subject.track);
const mounted = candidateFor(subject.car, {driving: 34, driven: 35}, 'C');
if (!planned.ok || !mounted.ok) throw new Error('the demo has no plan');
const plan = planned.value;
const candidate = mounted.value;

function answerFromLog(): LearnAnswer {
	const {run} = generateLog({seed: 5, plan, mounted: candidate, driving: {laps: 6, missed: 0.2}});
	const said = {pair: candidate.pair, gearbox: candidate.gearbox.name};
	const findings = findingsFor(subject.car, subject.track, run, said);
	if (!findings.ok) throw new Error('no findings');
	const learning = learnFromFindings(subject, findings.value);
	if (!learning.ok) throw new Error('nothing learned');
	const lesson = lessonFrom(subject, documents, learning.value, findings.value, 'us');
	const effect = effectOn(subject, documents, lesson.proposals);
	return {
		heading: headingOf(subject.car, subject.track, new Date(2026, 4, 2)),
		setting: settingOf(plan, false),
		learning: learning.value,
		findings: findings.value,
		proposals: lesson.proposals,
		accepted: ['drag'],
		effect: effect.ok ? effect.value : undefined,
		remarks: ['A remark of the reader.'],
		pictures: {
			ratio: ratioPicture(findings.value),
			lap: lapPicture(subject, run, findings.value, learning.value),
		},
	};
}
const answer = answerFromLog();
const lines = (width: number, ascii = false, units: 'us' | 'metric' = 'us') =>
	layOut(learnView(answer, unitsOf(units)), width, ascii).map(cells => cells.map(({text}) => text).join(''));

describe('the answer from a log', () => {
	test.each([40, 60, 80, 120, 160])('fits %d columns', width => {
		for (const ascii of [false, true]) {
			expect(Math.max(...lines(width, ascii).map(displayWidth))).toBeLessThanOrEqual(width);
		}
	});

	test('says what was accepted, what was not, and what the reader had to say', () => {
		const told = lines(80).join('\n');
		expect(told).toMatch(/Accepted\n +accept .*\n +drag +drag area +0\.9 m\^2 +0\.95/);
		expect(told).toMatch(/Not accepted\n[\s\S]*rollout left/);
		expect(told).toMatch(/- A remark of the reader\./);
		expect(told).not.toMatch(/Nothing is written yet/);
	});

	test('has speeds in the units that are asked for', () => {
		expect(lines(120, false, 'metric').join('\n')).toMatch(/end km\/h/);
	});

	test('draws the humps on the gears of the pair', () => {
		const picture = answer.pictures!.ratio;
		const highest = picture.points.reduce((best, point) => (point[1] > best[1] ? point : best));
		const fifth = picture.gears.find(({gear}) => gear === 5)!;
		expect(Math.abs(highest[0] / fifth.ratio - 1)).toBeLessThan(0.01);
	});

	test('draws a lap from its start to its end, with a piece of the model for each straight', () => {
		const {logged, before, after} = answer.pictures!.lap!;
		expect(logged[0]![0]).toBe(0);
		expect(logged.at(-1)![0]).toBeGreaterThan(3000);
		// Back, and Front before and after the line.
		expect([before.length, after.length]).toEqual([3, 3]);
		const gapMps = (piece: (typeof after)[number]) => {
			const [distanceM, speedMps] = piece.at(-1)!;
			const nearest = logged.reduce((best, point) =>
				Math.abs(point[0] - distanceM) < Math.abs(best[0] - distanceM) ? point : best,
			);
			return Math.abs(nearest[1] - speedMps);
		};
		for (const piece of after) expect(gapMps(piece)).toBeLessThan(1.5);
	});
});

test('a difference that is not likely is said to be so', () => {
	const learning = learnFromSeen(subject, [{index: 1, rpm: 8000, gear: 5, candidate}], 'circumference');
	if (!learning.ok) throw new Error('nothing learned');
	expect(fittedLines(learning.value).join(' ')).toMatch(/So much of a difference in drag is not likely/);
	const close = learnFromSeen(subject, [{index: 1, rpm: 8500, gear: 5, candidate}], 'circumference');
	if (!close.ok) throw new Error('nothing learned');
	expect(fittedLines(close.value).join(' ')).not.toMatch(/not likely/);
});
