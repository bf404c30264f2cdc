/**
 * Percentile `p` in [0, 1] of rising values, straight between the two neighbours of position
 * `p·(n−1)`; NaN for none. Source: definition 7 of Hyndman & Fan (1996), the usual default.
 *
 * Example: 0.5 of `[1, 2, 3, 10]` is 2.5.
 */
export function percentileOfRising(rising: ArrayLike<number>, p: number): number {
  const position = p * (rising.length - 1);
  const below = rising[Math.floor(position)] ?? Number.NaN;
  const above = rising[Math.ceil(position)] ?? Number.NaN;
  return below + (above - below) * (position - Math.floor(position));
}

/** Median of values in any order; NaN for none. Example: the median of `[3, 1, 10, 2]` is 2.5. */
export function median(values: readonly number[]): number {
  return percentileOfRising(Float64Array.from(values).sort(), 0.5);
}

/**
 * Median of the distances from the median (MAD), in the unit of the values; NaN for none.
 * Example: `[1, 2, 3, 4, 100]` gives 1.
 */
export function medianDeviation(values: readonly number[]): number {
  const middle = median(values);
  return median(values.map((value) => Math.abs(value - middle)));
}

/**
 * Scatter as a standard deviation, deaf to outliers: 1.4826·MAD. The factor makes it σ for normally
 * distributed values. Source: textbooks of robust statistics.
 *
 * Example: `[1, 2, 3, 4, 100]` gives 1.4826.
 */
export function madSigma(values: readonly number[]): number {
  return 1.4826 * medianDeviation(values);
}
