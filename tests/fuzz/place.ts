/** Directories for readers that need one. */
import {mkdtempSync, rmSync} from 'node:fs';
import {tmpdir} from 'node:os';
import {join} from 'node:path';

const places: string[] = [];

export function newPlace(): string {
	const place = mkdtempSync(join(tmpdir(), 'droprack-fuzz-'));
	places.push(place);
	return place;
}

export function removePlaces(): void {
	for (const place of places.splice(0)) rmSync(place, {recursive: true, force: true});
}

// A worker of the test runner ends without telling: there the tests remove them.
process.on('exit', removePlaces);
