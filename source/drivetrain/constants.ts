/** Constants that the arithmetic uses, as their definitions. */

/** Standard acceleration of free fall (3rd CGPM, 1901), m/s². Exact. */
export const standardGravityMps2 = 9.80665;

/** The inch and the mile (63 360 in) of the international yard and pound agreement (1959), m. Exact. */
export const inchM = 0.0254;
export const footM = 0.3048;
export const mileM = 1609.344;

/** One mile per hour, m/s. Exact. */
export const mphMps = mileM / 3600;

/** The ice point of the Celsius scale, K. Exact. */
export const celsiusZeroK = 273.15;

/** Conventional inch of mercury at 0 °C (NIST SP 811), Pa. */
export const inchOfMercuryPa = 3386.389;
