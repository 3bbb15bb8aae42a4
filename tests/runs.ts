// Sampled in npm test, in full in npm run test:full.
export const full = process.env.DROPRACK_FULL === '1';
export const runs = (sample: number, whole: number) => (full ? whole : sample);
