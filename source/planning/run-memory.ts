/** What was run before, so that a change of one straight runs only that straight again. */
import type {Candidate} from './candidates.ts';
import type {Place} from './conditions.ts';
import type {Plan} from './plan.ts';
import type {PlaceRun} from './run-place.ts';

/** A run, unless the very same has been run before. */
export type Recall = (place: Place, candidate: Candidate, run: () => PlaceRun) => PlaceRun;

/** Numbers for texts: the same text has the same number. */
class Numbers {
	readonly #known = new Map<string, number>();

	of(text: string): number {
		const known = this.#known.get(text);
		if (known !== undefined) return known;
		this.#known.set(text, this.#known.size);
		return this.#known.size - 1;
	}
}

/** After so many answers everything is let go, with the texts that grew meanwhile. */
const mostAnswers = 1000;
const mostPlaces = 2 ** 20;

/**
 * Runs by all that bears on them: the vehicle of the situation, the straight and its courses, the gear train. An answer uses
 * them through `recallFor`, and `forget` then lets go of what neither it nor the one before it has used.
 */
export class RunMemory {
	#places = new Numbers();
	#trains = new Numbers();
	#answers = 0;
	/** In the order of their last use. */
	#runs = new Map<number, PlaceRun>();
	#used = 0;

	recallFor(plan: Plan): Recall {
		this.#used = 0;
		const numbers = new Map<Place, number>();
		for (const condition of plan.conditions) {
			const vehicle = JSON.stringify([condition.vehicle, condition.steadySlip]);
			const places = condition.restart === undefined ? condition.places : [...condition.places, condition.restart];
			for (const place of places) numbers.set(place, this.#places.of(vehicle + placeText(place)));
		}
		const trains = new Map<Candidate, number>();
		return (place, candidate, run) => {
			const train = trains.get(candidate) ?? this.#trains.of(JSON.stringify(candidate.train));
			trains.set(candidate, train);
			return this.#recalled(train * mostPlaces + numbers.get(place)!, run);
		};
	}

	/** After an answer: twice as many as it used are kept, the latest. */
	forget(): void {
		const spare = this.#runs.size - 2 * this.#used;
		for (const key of [...this.#runs.keys()].slice(0, Math.max(0, spare))) this.#runs.delete(key);
		if (++this.#answers < mostAnswers) return;
		this.#places = new Numbers();
		this.#trains = new Numbers();
		this.#runs = new Map();
		this.#answers = 0;
	}

	#recalled(key: number, run: () => PlaceRun): PlaceRun {
		const known = this.#runs.get(key) ?? run();
		this.#runs.delete(key);
		this.#runs.set(key, known);
		this.#used++;
		return known;
	}
}

const placeText = ({name, isRestart, straight, courses}: Place): string =>
	JSON.stringify([name, isRestart, straight, [...courses]]);
