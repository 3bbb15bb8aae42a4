import {expect, test} from 'vitest';
import {progressLine} from '../../source/commands/progress-line.ts';

const start = '\r\x1B[K';
const megabyte = 1_000_000;

/** A terminal that keeps what is written, and a clock that is set by hand. */
function terminal(columns = 100) {
	const writes: string[] = [];
	const clock = {ms: 0};
	const make = (total: number | undefined, label = 'run.csv') =>
		progressLine({write: text => writes.push(text), columns}, label, total, () => clock.ms);
	return {writes, clock, make};
}

test('a reading that is soon over shows nothing', () => {
	const {writes, clock, make} = terminal();
	const line = make(100 * megabyte);
	clock.ms = 199;
	line.update(50 * megabyte);
	line.clear();
	expect(writes).toEqual([]);
});

test('a long one shows its share, ten times a second at most, and leaves an empty line', () => {
	const {writes, clock, make} = terminal();
	const line = make(150 * megabyte);
	for (clock.ms = 200; clock.ms < 400; clock.ms += 10) line.update(clock.ms * 250_000);
	line.clear();
	line.clear();
	expect(writes).toEqual([
		`${start}Reading run.csv [########................]  33 %  50 of 150 MB`,
		`${start}Reading run.csv [############............]  50 %  75 of 150 MB`,
		start,
	]);
});

test('without a known size it shows what was read', () => {
	const {writes, clock, make} = terminal();
	const line = make(undefined, 'standard input');
	clock.ms = 500;
	line.update(64 * megabyte);
	expect(writes).toEqual([`${start}Reading standard input 64 MB`]);
});

test('a narrow terminal gets what fits, in ASCII', () => {
	for (const [columns, text] of [
		[60, 'Reading [########................]  33 %  50 of 150 MB'],
		[50, '[########................]  33 %  50 of 150 MB'],
		[10, ''],
	] as const) {
		const {writes, clock, make} = terminal(columns);
		const line = make(150 * megabyte, 'Übung.csv');
		clock.ms = 500;
		line.update(50 * megabyte);
		expect(writes).toEqual([start + text]);
	}
	const {writes, clock, make} = terminal();
	const line = make(150 * megabyte, 'Übung\x1B.csv');
	clock.ms = 500;
	line.update(50 * megabyte);
	expect(writes[0]).toContain('Reading ?bung?.csv [');
});

test('without a terminal nothing is written', () => {
	const line = progressLine(undefined, 'run.csv', 100);
	line.update(50);
	line.clear();
});
