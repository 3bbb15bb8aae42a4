/** QR codes (ISO/IEC 18004) in half blocks. */
import {encode} from 'uqr';

/** Modules of white on every side: what the standard asks for, else half of it, which phones read as well. */
const borders = [4, 2];
export type Window = {columns: number; rows: number};
export type Drawn =
	| {ok: true; lines: string[]}
	| {ok: false /** What window it needs, zero where no QR code holds it. */; needs: Window};

/** A longer text fits no QR code (version 40, level L, alphanumeric). */
const longestText = 4296;

/** The code in lines of half blocks, black where the block is drawn; or the window that it needs. */
export function drawQr(text: string, window: Window): Drawn {
	const codes = borders.map(border => modulesOf(text, border));
	const fitting = codes.find(code => code !== undefined && fits(windowOf(code), window));
	if (fitting !== undefined) return {ok: true, lines: linesOf(fitting)};
	const smallest = codes.at(-1);
	return {ok: false, needs: smallest ? windowOf(smallest) : {columns: 0, rows: 0}};
}

function windowOf(code: readonly unknown[]): Window {
	return {columns: code.length, rows: Math.ceil(code.length / 2)};
}

function fits(needs: Window, window: Window): boolean {
	return needs.columns <= window.columns && needs.rows <= window.rows;
}

function linesOf(code: boolean[][]): string[] {
	const isBlack = (row: number, column: number) => code[row]?.[column] === true;
	return Array.from({length: windowOf(code).rows}, (_, i) =>
		code.map((_, column) => blockOf(isBlack(2 * i, column), isBlack(2 * i + 1, column))).join(''),
	);
}

function modulesOf(text: string, border: number): boolean[][] | undefined {
	if (text.length > longestText) return undefined;
	try {
		return encode(text, {ecc: 'L', border, boostEcc: true}).data;
	} catch (error) {
		if (error instanceof RangeError || /too long|overflow/i.test(String(error))) return undefined;
		throw error;
	}
}

function blockOf(top: boolean, bottom: boolean): string {
	if (top) return bottom ? '█' : '▀';
	return bottom ? '▄' : ' ';
}

/** Colors 16 and 231 of the 256 are black and white in every theme (xterm's color cube). */
const blackOnWhite = '\u001b[38;5;16;48;5;231m';
const reset = '\u001b[0m';

/** The lines for a terminal, black on white whatever the theme. */
export function paintQr(lines: readonly string[]): string {
	return lines.map(line => `${blackOnWhite}${line}${reset}\n`).join('');
}
