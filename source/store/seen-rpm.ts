/** What an engine speed in the history may be, wherever the entry is made. */
const mostRpm = 30_000;

export const isSeenRpm = (rpm: number): boolean => rpm > 0 && rpm <= mostRpm;
export const seenRpmWords = `RPM up to ${mostRpm}`;
