/** What the documents themselves say of how well their numbers are known. */
import type {Track} from '../drivetrain/track.ts';
import type {Uncertainties} from '../drivetrain/uncertainties.ts';

/** As the readings of both documents have it. */
export type Stated = {
	readonly car: Uncertainties;
	readonly track: Uncertainties;
	/** The names of the situations in the order of the document, which paths count by. */
	readonly situations: readonly string[];
};

export const nothingStated: Stated = {car: new Map(), track: new Map(), situations: []};

/** Looks up fields by their paths, and tells afterwards which ones nobody has asked for. */
export class StatedFields {
	readonly #stated: Stated;
	readonly #asked = new Set<string>();

	constructor(stated: Stated) {
		this.#stated = stated;
	}

	car(path: string): number | undefined {
		return this.#look('car', path);
	}

	track(path: string): number | undefined {
		return this.#look('track', path);
	}

	/** Of a number that the track may replace: the track's word where it does, else the car's. */
	replaceable(path: string, isReplaced: boolean): number | undefined {
		const [ofTrack, ofCar] = [this.track(`car.${path}`), this.car(path)];
		return isReplaced ? ofTrack : ofCar;
	}

	/** A field of a situation of the track; `Base` may be missing in the document. */
	situation(track: Track, index: number, field: string): number | undefined {
		const at = this.#stated.situations.indexOf(track.situations[index]!.name);
		return at < 0 ? undefined : this.track(`situations[${at}].${field}`);
	}

	/** "car: mass", "track: pitRoad.limit": stated, above 0, and not drawn. */
	notAsked(): string[] {
		return (['track', 'car'] as const).flatMap(document =>
			[...this.#stated[document]]
				.filter(([path, sd]) => sd > 0 && !this.#asked.has(`${document}: ${path}`))
				.map(([path]) => `${document}: ${path}`),
		);
	}

	#look(document: 'car' | 'track', path: string): number | undefined {
		this.#asked.add(`${document}: ${path}`);
		return this.#stated[document].get(path);
	}
}
