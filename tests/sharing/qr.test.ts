import jsqr from 'jsqr';
import {describe, expect, test} from 'vitest';
import {densePlan, readDensePlan} from '../../source/sharing/dense.ts';
import {drawQr, paintQr} from '../../source/sharing/qr.ts';
import {shortForm} from '../../source/sharing/short-form.ts';
import {rewrap} from './mangle.ts';
import {samplePlan, trackDocument} from './sample.ts';

const plan = await samplePlan();
const big = {columns: 100, rows: 50};
const small = {columns: 80, rows: 24};
const pixels = 4;

/** The lines as a camera sees them: each half block a square of pixels. Decoded by a library that did not draw them. */
function scan(lines: readonly string[]): string | undefined {
	const width = lines[0]!.length * pixels;
	const height = lines.length * 2 * pixels;
	const image = new Uint8ClampedArray(width * height * 4).fill(255);
	for (let y = 0; y < height; y++) {
		for (let x = 0; x < width; x++) {
			const row = Math.floor(y / pixels);
			const block = lines[row >> 1]![Math.floor(x / pixels)]!;
			const isBlack = row % 2 === 0 ? '█▀'.includes(block) : '█▄'.includes(block);
			if (isBlack) image.fill(0, (y * width + x) * 4, (y * width + x) * 4 + 3);
		}
	}
	// The module is CommonJS; its function is the default of the default.
	const decode = (jsqr as unknown as {default?: typeof jsqr}).default ?? jsqr;
	return decode(image, width, height)?.data;
}

const drawn = (text: string, window: typeof big) => {
	const code = drawQr(text, window);
	if (!code.ok) throw new Error(`needs ${code.needs.columns} x ${code.needs.rows}`);
	return code.lines;
};

describe('a QR code', () => {
	test('of the short form fits 80 x 24 and is read by an independent decoder', () => {
		const {line} = shortForm(plan);
		expect(scan(drawn(line, small))).toBe(line);
		expect(scan(drawn('x'.repeat(134), small))).toBe('x'.repeat(134));
		expect(scan(drawn('A:'.repeat(97), small))).toBe('A:'.repeat(97));
	});

	test('of the plan of a track with four straights fits 100 x 50 and reads back as the plan', async () => {
		const lines = drawn(densePlan(plan), big);
		expect(lines.length).toBeLessThanOrEqual(50);
		expect(Math.max(...lines.map(line => line.length))).toBeLessThanOrEqual(100);
		expect(await readDensePlan(scan(lines)!)).toMatchObject({ok: true, plan});
	});

	test('says what window it needs', () => {
		expect(drawQr('x'.repeat(600), small)).toEqual({ok: false, needs: {columns: 89, rows: 45}});
		expect(drawQr('x'.repeat(5000), small)).toEqual({ok: false, needs: {columns: 0, rows: 0}});
		expect(drawQr('x'.repeat(3500), small)).toEqual({ok: false, needs: {columns: 0, rows: 0}});
	});

	test('is painted black on white, and the colors are taken back on every line', () => {
		expect(paintQr(['█▀'])).toBe('\u001b[38;5;16;48;5;231m█▀\u001b[0m\n');
	});
});

describe('the dense form', () => {
	test('is of QR alphanumerics that no message changes, and survives any line break', async () => {
		const dense = densePlan(plan);
		expect(dense).toMatch(/^DRP1:[0-9A-Z+\-./:]+$/);
		const broken = `Scanned:\n${dense.replace(/.{37}/g, '$&\r\n> ')}\n`;
		expect(await readDensePlan(broken)).toMatchObject({ok: true, plan});
		expect(await readDensePlan(rewrap(dense, 40, true))).toMatchObject({ok: true, plan});
	});

	test('that was damaged is refused', async () => {
		const dense = densePlan(plan);
		for (let at = 5; at < dense.length; at += 7) {
			const other = dense[at] === 'A' ? 'B' : 'A';
			expect((await readDensePlan(dense.slice(0, at) + other + dense.slice(at + 1))).ok).toBe(false);
		}
	});

	test('fits 100 x 50 for up to four straights with every field', async () => {
		const straight = trackDocument.straights[0]!;
		const names = ['Front stretch', 'Turn one to two', 'Back stretch', 'Turn three to four'];
		const straights = names.map((name, i) => ({
			...straight,
			name,
			length: `${651 + 17 * i} ft`,
			grade: `0.${i} %`,
			load: 1 + i / 10,
		}));
		const full = await samplePlan(
			{...trackDocument, straights},
			'Watch the oil and keep it clean. Jo checks the stagger.',
		);
		expect(drawQr(densePlan(full), big).ok).toBe(true);
	});
});
