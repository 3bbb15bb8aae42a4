/** Times of day and dates as logs write them, in seconds. */

const clockPattern =
	/^(?:(\d{4})-(\d\d)-(\d\d)[T ])?(?:(\d{1,3}):)?(\d{1,4}):(\d{1,2})(?:[.,:](\d{1,9}))?(?:Z|[+-]\d\d:?\d\d)?$/;

const [minute, hour, day] = [60, 3600, 86400];

/** `mm:ss`, `hh:mm:ss`, with a fraction after a point, a comma or a colon, and with an ISO 8601 date before; NaN for other text. */
export function clockS(text: string): number {
	const [, year, month, date, hours, minutes, seconds, fraction] = clockPattern.exec(text) ?? [];
	if (minutes === undefined) return Number.NaN;
	const days = year === undefined ? 0 : Date.UTC(Number(year), Number(month) - 1, Number(date)) / 1000 / day;
	const whole = days * day + Number(hours ?? 0) * hour + Number(minutes) * minute + Number(seconds);
	return fraction === undefined ? whole : whole + Number(fraction) / 10 ** fraction.length;
}
