import {expect, test} from 'vitest';
import type {JsonObject} from '../../../source/documents/json.ts';
import {readTrackOf} from '../../../source/screens/session/forms.ts';

const tracks = Array.from({length: 6}, (_, i): JsonObject => ({kind: 'track', version: 1, name: `Track ${i}`}));

test('a document is read once as long as it is among the latest', () => {
	const first = readTrackOf(tracks[0]!);
	expect(readTrackOf(tracks[0]!)).toBe(first);
	readTrackOf(tracks[1]!);
	expect(readTrackOf(tracks[0]!)).toBe(first);
});

test('what was made of an earlier document is let go: an undo history of any length does not hold it', () => {
	const first = readTrackOf(tracks[0]!);
	for (const track of tracks.slice(1)) readTrackOf(track);
	expect(readTrackOf(tracks[0]!)).not.toBe(first);
	expect(readTrackOf(tracks[0]!)).toEqual(first);
});
