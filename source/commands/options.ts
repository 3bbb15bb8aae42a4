/** Every option once, whichever commands take it. */

export type Option = {
	/** What stands for the value in help; an option without one is a switch. */
	value?: string;
	short?: string;
	summary: string;
};

export const options = {
	car: {value: 'CAR', summary: 'the car: a file, or the name of a saved or shipped one'},
	situation: {value: 'NAME', summary: 'rank by this situation alone'},
	top: {value: 'N', summary: 'show the first N rows'},
	pair: {value: 'PAIR', summary: 'driving/driven teeth, such as 33/38; the installed pair unless given'},
	gearbox: {value: 'SET', summary: 'the gearbox set; the installed one unless given'},
	prefer: {value: 'NAME', summary: 'take this car where none is named; "none" clears it'},
	short: {summary: 'one line with what is needed to act on the plan'},
	qr: {summary: 'draw it as a QR code; with --short the one line'},
	copy: {summary: "send it to the terminal's clipboard too"},
	notes: {value: 'TEXT', summary: 'what to remember'},
	json: {summary: 'print the result for programs: JSON, SI units, not rounded'},
	units: {value: 'us|metric', summary: 'units of the text output; us unless given'},
	strict: {summary: 'end with status 1 if the plan fails a check'},
	ascii: {summary: 'print ASCII characters only'},
	help: {short: 'h', summary: 'show this help'},
	version: {summary: 'show the version'},
} as const satisfies Record<string, Option>;
export type OptionName = keyof typeof options;
export const option = (name: OptionName): Option => options[name];
