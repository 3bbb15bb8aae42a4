/** The shortest text that still does the same. */

/** At most so many tries. Takes out ever smaller pieces for as long as the rest still does it (Zeller, 2002: delta debugging). */
export async function minimized(
	text: string,
	stillDoes: (text: string) => Promise<boolean>,
	mostTries = 600,
): Promise<string> {
	let [shortest, tries] = [text, 0];
	for (let size = Math.ceil(text.length / 2); size >= 1; size = size === 1 ? 0 : Math.ceil(size / 2)) {
		for (let at = 0; at < shortest.length && tries < mostTries; ) {
			const candidate = shortest.slice(0, at) + shortest.slice(at + size);
			tries++;
			if (await stillDoes(candidate)) shortest = candidate;
			else at += size;
		}
	}
	return shortest;
}
