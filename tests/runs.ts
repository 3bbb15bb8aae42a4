/** How often a property is tried: a sample in the daily tests, the whole count with DROPRACK_FULL=1. */
export const full = process.env.DROPRACK_FULL === '1';
export const runs = (sample: number, whole: number) => (full ? whole : sample);
