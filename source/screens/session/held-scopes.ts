/** What of the key table holds where a session is. */
import type {Scope} from '../keys/scopes.ts';
import type {Session} from './session.ts';

/** Which scopes of the key table hold, the first one first. */
export function scopesOf({place, over}: Session): Scope[] {
	if (over) return [over.is];
	if (place.at === 'edit' && place.editing) return ['field'];
	if (place.at === 'history' && place.adding) return ['draft'];
	if (place.at === 'take in' && place.incoming) return ['incoming', 'everywhere'];
	return place.at === 'choose' || place.at === 'take in' ? [place.at] : [place.at, 'everywhere'];
}

/** Whether what a person types is text here. */
export function takesText({place, over}: Session): boolean {
	if (over) return over.is === 'margin' || over.is === 'risk' || over.is === 'entry';
	if (place.at === 'edit') return place.editing !== undefined;
	if (place.at === 'history') return place.adding;
	return place.at === 'choose' || (place.at === 'take in' && place.incoming === undefined);
}
