import {readFileSync} from 'node:fs';
import {expect, test} from 'vitest';
import {readCar, readTrack} from '../../source/documents/read.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';

const read = (path: string) => readFileSync(new URL(`../../${path}`, import.meta.url), 'utf8');
const examples = [...read('README.md').matchAll(/^```json\n([\s\S]*?)^```$/gm)].map(match => match[1]!);

test('the README shows a document', () => {
	expect(examples.length).toBeGreaterThan(0);
});

test.each(examples)('a track in the README is one, and the demo car has pairs for it', async text => {
	const [track, car] = [await readTrack(text), await readCar(read('tracks/cars/demo.json'))];
	if (!track.ok || !car.ok) throw new Error(JSON.stringify({track, car}, null, '\t'));
	const ranking = rankRack(car.value, track.value, {});
	if (!ranking.ok) throw new Error(JSON.stringify(ranking.faults));
	expect(ranking.value.rows[0]?.verdict).not.toBe('fail');
	expect(ranking.value.setting.anchored).toBe(true);
});
