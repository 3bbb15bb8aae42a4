import {expect, test} from 'vitest';
import type {Findings, MountedVerdict} from '../../../source/practice/find/findings.ts';
import {isUnclear} from '../../../source/practice/learn/unclear.ts';

const findings = (verdict: MountedVerdict, alsoFit: readonly unknown[] = []) =>
	({mounted: {verdict, alsoFit}}) as unknown as Findings;

test.each<[string, Findings | undefined, boolean]>([
	['no log', undefined, false],
	['a log that fits what is installed', findings('asInstalled', [{}]), false],
	['a log that fits another pair', findings('otherFits'), true],
	['a log that fits the flipped pair', findings('flippedFits'), true],
	['a log of a car of which nothing is said, with one pair that fits', findings('noInstalled'), false],
	['a log of a car of which nothing is said, with several', findings('noInstalled', [{}]), true],
])('%s', (_, one, unclear) => {
	expect(isUnclear(one)).toBe(unclear);
});
