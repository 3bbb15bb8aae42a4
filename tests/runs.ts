/** How many runs a property gets: a sample in everyday use, the whole number in the full suite. */
export const full = process.env.DROPRACK_FULL === '1';
export const runs = <T>(sample: T, whole: T): T => (full ? whole : sample);
