/** What a key may ask for beyond the session, by name. */

/** What is done for the session outside of it, and then told. */
export type ErrandEffect =
	| 'hand over'
	| 'copy it'
	| 'write it'
	| 'write over'
	| 'export'
	| 'track history'
	| 'add to history'
	| 'keep entry'
	| 'read file'
	| 'forget saved'
	| 'see it'
	| 'read log'
	| 'stop log'
	| 'accept this'
	| 'accept all'
	| 'take all back';

/** What reaches beyond the session. */
export type Effect =
	| 'leave'
	| 'discard and leave'
	| 'save'
	| 'save and leave'
	| 'suspend'
	| 'redraw'
	| 'stop'
	| 'take choice'
	| 'forget recovery'
	| ErrandEffect;
