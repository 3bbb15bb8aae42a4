/** What messages do to text. Each mangling leaves the meaning to a person. */

const mapLines = (text: string, change: (line: string) => string) => text.trimEnd().split('\n').map(change).join('\n');

/** Breaks at blanks, as mail clients do; with `hyphens` also after a hyphen or slash. */
export function rewrap(text: string, width: number, hyphens = false): string {
	const words = text
		.trim()
		.split(/\s+/)
		.flatMap(word =>
			hyphens
				? word.split(/(?<=[A-Za-z0-9][-/])/).map((piece, i) => ({piece, glue: i > 0}))
				: [{piece: word, glue: false}],
		);
	const lines: string[] = [];
	let line = '';
	for (const {piece, glue} of words) {
		const joined = line + (glue || line === '' ? '' : ' ') + piece;
		if (line !== '' && joined.length > width) {
			lines.push(line);
			line = piece;
		} else line = joined;
	}
	return [...lines, line].join('\n');
}

const greeting = 'Hi Sam,\n\nthe plan for Saturday > see below: DROPRACK says [ok]\n\n';
const signature = '\n\n-- \nJo [crew chief], 555-0100: call me\n';

export const manglings: Readonly<Record<string, (text: string) => string>> = {
	'line ends of another system': text => text.replaceAll('\n', '\r\n'),
	'old line ends': text => text.replaceAll('\n', '\r'),
	'a quote': text => mapLines(text, line => `> ${line}`),
	'a quote of a quote': text => mapLines(text, line => `>> ${line}`),
	'a quote of a quote with blanks': text => mapLines(text, line => `> > ${line}`),
	'smart quotes and dashes': text => text.replaceAll("'", '\u2019').replaceAll('"', '\u201d').replaceAll('-', '\u2013'),
	'minus signs': text => text.replaceAll('-', '\u2212'),
	'non-breaking spaces': text => text.replaceAll(' ', '\u00a0'),
	'narrow non-breaking spaces': text => text.replaceAll(' ', '\u202f'),
	'trimmed lines': text => mapLines(text, line => line.trim()),
	'doubled blanks': text => text.replaceAll(' ', '  '),
	'blanks at both ends': text => mapLines(text, line => `  ${line}  `),
	'empty lines between': text => text.replaceAll('\n', '\n\n'),
	'lines broken at 40': text => rewrap(text, 40),
	'lines broken at 57, hyphens too': text => rewrap(text, 57, true),
	'lines broken at 80': text => rewrap(text, 80),
	'a quote broken again': text =>
		mapLines(
			rewrap(
				mapLines(text, line => `> ${line}`),
				44,
			),
			line => `> ${line}`,
		),
	'all lines joined': text => text.trim().replace(/\s+/g, ' '),
	'lines joined without a blank after an entry': text => text.replace(/\]\n/g, ']'),
	'a greeting before and a signature after': text => greeting + text + signature,
	'a signature on the same line': text => `${text.trimEnd()} -- Jo`,
	'a byte order mark': text => `\ufeff${text}`,
	'soft hyphens and joiners': text => text.replaceAll('a', 'a\u00ad').replaceAll('e', 'e\u200d'),
	fractions: text => text.replaceAll('1/2', '\u00bd').replaceAll('/', '\u2044'),
	'everything at once': text =>
		mapLines(greeting + rewrap(text, 48) + signature, line => `>> ${line.replaceAll(' ', '\u00a0 ')}  `).replaceAll(
			'\n',
			'\r\n',
		),
};
