/** |actual − expected| ÷ |expected|; NaN where either is, so that no bound holds. */
export const relativeError = (actual: number, expected: number) => Math.abs(actual - expected) / Math.abs(expected);
