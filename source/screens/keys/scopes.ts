/** Where a key works: places first, then what lies over a place while it lasts. */
export const scopes = {
	ranking: 'In the ranking',
	why: 'In the reasons',
	pictures: 'In the pictures',
	edit: 'In the form',
	choose: 'Choosing a track or a car',
	'hand over': 'Handing over',
	'take in': 'Taking a plan in',
	incoming: 'When a plan was read',
	history: 'In the history of the track',
	draft: 'Adding to the history',
	differences: 'In the differences',
	field: 'Typing into a field',
	margin: 'Typing the least margin',
	entry: 'Typing a file name, notes or a directory',
	overwriting: 'When a file is there already',
	forgetting: 'When asked about forgetting',
	help: 'In this help',
	quitting: 'When asked about unsaved changes',
	recovery: 'When an unsaved session is offered',
	everywhere: 'In every place',
} as const;
export type Scope = keyof typeof scopes;
