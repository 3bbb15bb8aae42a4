const inchMm = 25.4;
const sizePattern = /^P?(\d{3})\/(\d{2,3})\s?-?(?:Z?R|-|\s)\s?(\d{2}(?:\.\d)?)$/i;

/** Overall diameter of a tire by its size, D = 25.4·rim + 2·width·aspect/100 in mm (ISO 4000-1); undefined where it is no size. */
export function sidewallDiameterM(size: string): number | undefined {
	const [widthMm, aspect, rimIn] = (sizePattern.exec(size.trim()) ?? []).slice(1).map(Number);
	if (widthMm === undefined || aspect === undefined || rimIn === undefined) return undefined;
	return (inchMm * rimIn + (2 * widthMm * aspect) / 100) / 1000;
}
