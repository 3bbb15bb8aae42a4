/** Display width of text: what it takes on the screen, not how many code units it has. */
import stringWidth from 'fast-string-width';

const ascii = /^[\x20-\x7e]*$/;

export const displayWidth = (text: string): number => (ascii.test(text) ? text.length : stringWidth(text));

/** The text, cut with a mark where it is wider. */
export const cut = (text: string, width: number): string => {
	if (displayWidth(text) <= width) return text;
	if (width < 1) return '';
	const characters = [...text];
	while (characters.length > 0 && displayWidth(characters.join('')) > width - 1) characters.pop();
	return `${characters.join('').trimEnd()}…`;
};

/** Padded with blanks to the width, cut where it is wider. */
export const padTo = (text: string, width: number, align: 'left' | 'right'): string => {
	const short = cut(text, width);
	const blanks = ' '.repeat(Math.max(0, width - displayWidth(short)));
	return align === 'right' ? blanks + short : short + blanks;
};

/** The longest beginning that fits, and the rest. */
const splitAt = (word: string, width: number): [string, string] => {
	const characters = [...word];
	let taken = '';
	while (characters.length > 0 && (taken === '' || displayWidth(taken + characters[0]) <= width))
		taken += characters.shift();
	return [taken, characters.join('')];
};

/** Lines of at most the width, broken at blanks; lines after the first start with `hang` blanks. */
export const wrap = (text: string, width: number, hang = 0): string[] => {
	const lines: string[] = [];
	const margin = ' '.repeat(hang);
	let current = '';
	let empty = true;
	for (const whole of text.split(' ')) {
		let word = whole;
		if (!empty && displayWidth(current) + 1 + displayWidth(word) > width) {
			lines.push(current);
			current = margin;
			empty = true;
		}
		while (empty && displayWidth(current) + displayWidth(word) > width) {
			const [start, rest] = splitAt(word, width - displayWidth(current));
			lines.push(current + start);
			current = margin;
			word = rest;
		}
		current += empty ? word : ` ${word}`;
		empty = false;
	}
	return [...lines, current].map(each => each.trimEnd());
};
