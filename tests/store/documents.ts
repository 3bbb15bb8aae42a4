/** Documents for the tests of the store. */
import type {Preset, SavedCar} from '../../source/store/kept-documents.ts';

export const track = (name: string) => ({
	kind: 'track',
	version: 1,
	name,
	type: 'short',
	straights: [{name: 'Front', exit: '88 mph', length: '650 ft'}],
});

export const preset = (name: string, more: Partial<Preset> = {}): Preset => ({
	kind: 'preset',
	version: 1,
	track: track(name),
	saved: '2026-01-01T12:00:00.000Z',
	...more,
});

export const savedCar = (name: string): SavedCar => ({
	kind: 'saved-car',
	version: 1,
	car: {kind: 'car', version: 1, name},
	saved: '2026-01-01T12:00:00.000Z',
});
