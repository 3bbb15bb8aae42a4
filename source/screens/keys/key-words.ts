const signs: Readonly<Record<string, string>> = {
	up: '↑',
	down: '↓',
	left: '←',
	right: '→',
	enter: 'Enter',
	escape: 'Esc',
	tab: 'Tab',
	space: 'Space',
	pageup: 'PgUp',
	pagedown: 'PgDn',
	home: 'Home',
	end: 'End',
	delete: 'Del',
	backspace: 'Backspace',
	f1: 'F1',
};

/** As a person reads it: "↑", "Shift+Tab", "Ctrl+S". */
export function keyWords(key: string): string {
	if (signs[key]) return signs[key];
	const [modifier, rest] = key.split(/\+(?=.)/, 2) as [string, string | undefined];
	if (rest === undefined) return key;
	const letter = signs[rest] ?? rest.toUpperCase();
	return `${modifier.charAt(0).toUpperCase()}${modifier.slice(1)}+${letter}`;
}

/** Where arrows cannot be drawn, their stand-ins "<", ">", "^" and "v" would read as other keys. */
const arrowNames: Readonly<Record<string, string>> = {up: 'Up', down: 'Down', left: 'Left', right: 'Right'};

export const asciiKeyWords = (key: string): string => arrowNames[key] ?? keyWords(key);
