/** Which part of a plan stands in which entry of its text, in the order of the entries. */

export type Section = {
	label: string;
	path: readonly string[];
	/** The field that stands beside the label: `Straight Front: …`. */
	subject?: string;
	/** One entry for each object of a list. */
	many?: true;
	/** The value itself is the entry: free text. */
	prose?: true;
};

export const sections: readonly Section[] = [
	{label: 'DROPRACK PLAN 1', path: []},
	{label: 'Limit', path: ['results', 'limit']},
	{label: 'Highest', path: ['results', 'highest'], subject: 'situation', many: true},
	{label: 'Shift', path: ['results', 'shifts'], subject: 'from', many: true},
	{label: 'Pit RPM', path: ['results', 'pitRoad']},
	{label: 'Restart RPM', path: ['results', 'restart']},
	{label: 'Notes', path: ['notes'], prose: true},
	{label: 'Track', path: ['track'], subject: 'name'},
	{label: 'Air', path: ['track', 'air']},
	{label: 'Wind', path: ['track', 'wind']},
	{label: 'Pit road', path: ['track', 'pitRoad']},
	{label: 'Restart', path: ['track', 'restart']},
	{label: 'Straight', path: ['track', 'straights'], subject: 'name', many: true},
	{label: 'Situation', path: ['track', 'situations'], subject: 'name', many: true},
	{label: 'Rules here', path: ['track', 'rules']},
	{label: 'On the car here', path: ['track', 'car']},
	{label: 'Learned here', path: ['track', 'learned'], many: true},
	{label: 'Car', path: ['car'], subject: 'name'},
	{label: 'Engine', path: ['car', 'engines'], subject: 'name', many: true},
	{label: 'Gearbox', path: ['car', 'gearboxes'], subject: 'name', many: true},
	{label: 'Tires', path: ['car', 'tires']},
	{label: 'Rack', path: ['car', 'rack']},
	{label: 'Rack pair', path: ['car', 'rack', 'pairs'], many: true},
	{label: 'Margins', path: ['car', 'margins']},
	{label: 'Installed', path: ['car', 'installed']},
	{label: 'Rules', path: ['car', 'rules']},
	{label: 'Learned', path: ['car', 'learned'], many: true},
];

/** Documents inside the plan, and what every one of them starts with. */
export const heads: Readonly<Record<string, {kind: string; version: number}>> = {
	'': {kind: 'plan', version: 1},
	track: {kind: 'track', version: 1},
	car: {kind: 'car', version: 1},
};

/** Fields that always hold text, so that a gearbox set called 4 needs no mark. */
export const textFields = new Set([
	'name',
	'situation',
	'at',
	'pair',
	'gearbox',
	'engine',
	'date',
	'pairs',
	'gearboxes',
]);
/** Fields that hold a list of plain values. */
export const listFields = new Set(['for', 'gears', 'ratios', 'efficiencies', 'toothSums', 'pairs', 'gearboxes']);
/** The field that holds dyno points, each `RPM torque`. */
export const curveField = 'curve';

/** Whether the field at a path, or what is in it, has entries of its own. */
export function hasOwnEntry(path: readonly string[]): boolean {
	return sections.some(section => path.every((key, i) => key === section.path[i]));
}

/** The section of what stands before the colon, and its subject. */
export function sectionOf(head: string): {section: Section; subject: string | undefined} | undefined {
	const exact = sections.find(({label}) => label === head);
	if (exact !== undefined) return {section: exact, subject: undefined};
	const blank = head.indexOf(' ');
	const section = sections.find(({label, subject}) => subject !== undefined && label === head.slice(0, blank));
	return section && {section, subject: head.slice(blank + 1)};
}
