import {test} from 'vitest';
import {readFileSync} from 'node:fs';
import {checkTrack, checkCar} from '../../source/documents/read.ts';
import {rankRack} from '../../source/planning/rank-rack.ts';
test('x', () => {
	const car = checkCar(JSON.parse(readFileSync('tracks/cars/demo.json','utf8')));
	for (const t of ['tarrowdale','hesper-ridge','quillmere','ostrand-flats']) {
	const track = checkTrack(JSON.parse(readFileSync(`tracks/${t}.json`,'utf8')));
	if (!car.ok || !track.ok) throw 1;
	const times = [];
	for (let i = 0; i < 6; i++) { const t0 = performance.now(); rankRack(car.value, track.value); times.push(Math.round(performance.now() - t0)); }
	console.log(t, times.join(' '));
	}
});
