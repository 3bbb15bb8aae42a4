/** Every option once, whichever commands take it. */

export type Option = {
	/** What stands for the value in help; an option without one is a switch. */
	value?: string;
	short?: string;
	summary: string;
	/** May be given again and again; each counts. */
	many?: true;
};

export const options = {
	car: {value: 'CAR', summary: 'the car: a file, or the name of a saved or shipped one'},
	risk: {value: 'PERCENT', summary: 'the chance of passing the RPM limit that you accept, such as 5%'},
	seed: {value: 'N', summary: 'seed of the draws; the same seed gives the same answer'},
	situation: {value: 'NAME', summary: 'the situation that alone counts; with --add the one in which it was seen'},
	top: {value: 'N', summary: 'show the first N rows'},
	pair: {
		value: 'PAIR',
		summary:
			'driving/driven teeth, such as 33/38; rpm, run, life, fuel, share and card take the installed pair unless given',
	},
	gearbox: {
		value: 'SET',
		summary: 'the gearbox set; rpm, run, life, fuel, share and card take the installed one unless given, load any',
	},
	prefer: {value: 'NAME', summary: 'take this car where none is named; "none" clears it'},
	name: {value: 'NAME', summary: 'the name of the new document'},
	from: {value: 'DOCUMENT', summary: 'begin with a copy of this: a file, or the name of a saved or shipped one'},
	notes: {value: 'TEXT', summary: 'what to remember'},
	replace: {summary: 'write over the saved document that differs; it stays beside it as .bak'},
	shipped: {summary: 'the shipped document, also where a saved one has its name'},
	add: {summary: 'add an entry made of the options that follow'},
	date: {value: 'DATE', summary: 'the day of the entry, such as 2026-05-31; today unless given'},
	session: {value: 'TEXT', summary: 'the session, such as "practice 1"'},
	rpm: {value: 'N', summary: 'the highest RPM that was seen'},
	at: {value: 'TEXT', summary: 'where on the track it was seen'},
	remark: {value: 'TEXT', summary: 'what else was seen'},
	short: {summary: 'one line with what is needed to act on the plan'},
	qr: {summary: 'draw it as a QR code; with --short the one line'},
	take: {summary: "keep the plan's track, with its pair, set and notes, once it is compared"},
	copy: {summary: "send it to the terminal's clipboard too"},
	seen: {
		value: 'TEXT',
		many: true,
		summary: 'what was seen: "Back 8420 rpm gear 4 185 mph"; the speed only where it is known; may be repeated',
	},
	hold: {
		value: 'speed|circumference',
		summary: 'what is taken for right where no speed was seen; circumference unless given',
	},
	column: {
		value: 'CHANNEL=HEADER',
		many: true,
		summary: 'which column of the log it is, such as speed="GPS Speed"; may be repeated',
	},
	grip: {summary: 'learn grip too, from exits that it holds; from a log'},
	accept: {
		value: 'all|NAME',
		many: true,
		summary: 'write what was learned into track and car; NAME as listed; may be repeated',
	},
	'take-back': {
		value: 'all|NAME',
		many: true,
		summary: 'put back what stood there before it was learned; may be repeated',
	},
	shorter: {value: 'N', summary: 'steps shorter than the best pair to carry; 1 unless given'},
	taller: {value: 'N', summary: 'steps taller than the best pair to carry; 1 unless given'},
	within: {
		value: 'SECONDS',
		summary: "a pair this close to the best in lap time stands for it; the car's margin level unless given",
	},
	step: {value: 'PERCENT', summary: 'pairs this close in ratio are no step apart; 0.5 unless given'},
	'each-set': {summary: 'every gearbox set needs its pairs, not only the best set of a track'},
	together: {summary: 'one set for all the tracks'},
	against: {
		value: 'PAIR',
		summary: 'the pair to compare with, in the same set; unless given the installed one, or the best',
	},
	above: {value: 'RPM', summary: 'tell the time above this RPM; 500 under the limit unless given'},
	laps: {value: 'N', summary: 'the laps of the race; those of the track unless given'},
	json: {summary: 'print the result for programs: JSON, SI units, not rounded'},
	units: {value: 'us|metric', summary: 'units of the text output; us unless given'},
	strict: {summary: 'end with status 1 if the plan fails a check, or something is wrong'},
	ascii: {summary: 'print ASCII characters only'},
	help: {short: 'h', summary: 'show this help'},
	version: {summary: 'show the version'},
} as const satisfies Record<string, Option>;
export type OptionName = keyof typeof options;
export const option = (name: OptionName): Option => options[name];
