import {EventEmitter} from 'node:events';
import headless from '@xterm/headless';
import fc from 'fast-check';
import {expect, test} from 'vitest';
import {Screen, type Terminal} from '../../../source/screens/terminal/screen.ts';
import {runs} from '../../runs.ts';

class FakeTerminal extends EventEmitter {
	columns = 20;
	rows = 4;
	writableNeedDrain = false;
	written: string[] = [];
	write(text: string): boolean {
		this.written.push(text);
		return true;
	}
}

const started = () => {
	const terminal = new FakeTerminal();
	return {terminal, screen: new Screen(terminal as unknown as Terminal)};
};

test('the first frame clears the screen, a later one writes only the lines that changed', () => {
	const {terminal, screen} = started();
	screen.write('one\ntwo\nthree');
	screen.write('one\n2\nthree');
	expect(terminal.written[0]).toBe(
		'\x1B[?2026h\x1B[H\x1B[2J\x1B[1;1Hone\x1B[K\x1B[2;1Htwo\x1B[K\x1B[3;1Hthree\x1B[K\x1B[?25l\x1B[?2026l',
	);
	expect(terminal.written[1]).toBe('\x1B[?2026h\x1B[2;1H2\x1B[K\x1B[?25l\x1B[?2026l');
});

test('a line that is gone is cleared', () => {
	const {terminal, screen} = started();
	screen.write('one\ntwo');
	screen.write('one');
	expect(terminal.written[1]).toContain('\x1B[2;1H\x1B[K');
});

test('more lines than the terminal has are left out', () => {
	const {terminal, screen} = started();
	screen.write('a\nb\nc\nd\nleft out');
	expect(terminal.written[0]).not.toContain('left out');
});

test('the scrollback is never cleared, whatever is drawn at whatever size', () => {
	const {terminal, screen} = started();
	for (const rows of [4, 2, 40, 1]) {
		terminal.rows = rows;
		terminal.emit('resize');
		screen.write(Array.from({length: 60}, (_, i) => `line ${i}`).join('\n'));
		screen.redraw();
	}
	expect(terminal.written.join('')).not.toContain('\x1B[3J');
});

test('after a resize everything is drawn anew', () => {
	const {terminal, screen} = started();
	let told = 0;
	screen.on('resize', () => told++);
	screen.write('one');
	terminal.emit('resize');
	screen.write('one');
	expect(told).toBe(1);
	expect(terminal.written[1]).toContain('\x1B[2J');
});

test('a window that was changed and has its size again is drawn anew; one of another size waits for its frame', () => {
	const {terminal, screen} = started();
	screen.write('one');
	screen.windowChanged();
	expect(terminal.written[1]).toContain('\x1B[2J');
	terminal.columns = 30;
	screen.windowChanged();
	expect(terminal.written).toHaveLength(2);
	screen.close();
	terminal.columns = 20;
	screen.windowChanged();
	expect(terminal.written).toHaveLength(2);
});

test('a slow line gets the latest frame only', () => {
	const {terminal, screen} = started();
	screen.write('first');
	terminal.writableNeedDrain = true;
	for (const frame of ['second', 'third', 'fourth']) screen.write(frame);
	expect(terminal.written).toHaveLength(1);
	terminal.writableNeedDrain = false;
	terminal.emit('drain');
	expect(terminal.written).toHaveLength(2);
	expect(terminal.written[1]).toContain('fourth');
});

test('once closed nothing is written', () => {
	const {terminal, screen} = started();
	screen.write('one');
	screen.close();
	screen.write('two');
	expect(terminal.written).toHaveLength(1);
});

test('a list that moves by a line is moved by the terminal', () => {
	const {terminal, screen} = started();
	terminal.rows = 12;
	const list = (from: number) => ['head', ...Array.from({length: 10}, (_, i) => `row ${from + i}`), 'foot'].join('\n');
	screen.write(list(0));
	screen.write(list(1));
	expect(terminal.written[1]).toBe('\x1B[?2026h\x1B[2;11r\x1B[1S\x1B[r\x1B[11;1Hrow 10\x1B[K\x1B[?25l\x1B[?2026l');
	screen.write(list(0));
	expect(terminal.written[2]).toBe('\x1B[?2026h\x1B[2;11r\x1B[1T\x1B[r\x1B[2;1Hrow 0\x1B[K\x1B[?25l\x1B[?2026l');
});

test('whatever lists are scrolled to, the terminal shows the last one', async () => {
	const frame = fc.record({from: fc.nat(30), cursor: fc.nat(17), head: fc.boolean()});
	await fc.assert(
		fc.asyncProperty(fc.array(frame, {minLength: 2, maxLength: 8}), async frames => {
			const {terminal, screen} = started();
			terminal.rows = 20;
			const emulator = new headless.Terminal({cols: 20, rows: 20, allowProposedApi: true});
			const lines = ({from, cursor, head}: {from: number; cursor: number; head: boolean}) => [
				head ? 'one' : 'two',
				...Array.from({length: 18}, (_, i) => `${i === cursor ? '>' : ' '} row ${from + i}`),
				'foot',
			];
			for (const one of frames) screen.write(lines(one).join('\n'));
			await new Promise<void>(resolve => emulator.write(terminal.written.join(''), resolve));
			const {active} = emulator.buffer;
			const shown = Array.from({length: 20}, (_, y) => active.getLine(y)!.translateToString(true).trimEnd());
			expect(shown).toEqual(lines(frames.at(-1)!).map(one => one.trimEnd()));
			emulator.dispose();
		}),
		{numRuns: runs(60, 2000)},
	);
});

test('whatever frames follow each other, the terminal shows the last one', async () => {
	const line = fc.constantFrom('', 'a', 'bb', '\x1B[7mccc\x1B[27m', '漢字', 'a long line of it');
	await fc.assert(
		fc.asyncProperty(
			fc.array(fc.array(line, {minLength: 1, maxLength: 4}), {minLength: 1, maxLength: 6}),
			async frames => {
				const {terminal, screen} = started();
				const emulator = new headless.Terminal({cols: 20, rows: 4, allowProposedApi: true});
				for (const frame of frames) screen.write(frame.join('\n') || ' ');
				await new Promise<void>(resolve => emulator.write(terminal.written.join(''), resolve));
				const shown = Array.from({length: 4}, (_, y) =>
					emulator.buffer.active.getLine(y)!.translateToString(true).trimEnd(),
				);
				const plain = (text: string) => text.replaceAll('\x1B[7m', '').replaceAll('\x1B[27m', '');
				expect(shown).toEqual(Array.from({length: 4}, (_, y) => plain(frames.at(-1)![y] ?? '')));
				emulator.dispose();
			},
		),
		{numRuns: runs(40, 1000)},
	);
});
