/** Readings are compared only within this share of the speed. */
export const SIMILAR_SPEED_SHARE = 0.02;

/**
 * Whether a reading at `speedRpm` compares with one at `referenceRpm` > 0: within ±2 %, both ends
 * included. A reading without a speed does not tell and is let through.
 *
 * Example: 1500 and 1470 r/min compare, 1500 and 1469 do not.
 */
export function isSimilarSpeed(speedRpm: number | null, referenceRpm: number | null): boolean {
  if (speedRpm === null || referenceRpm === null) return true;
  return Math.abs(speedRpm - referenceRpm) <= SIMILAR_SPEED_SHARE * referenceRpm * (1 + 1e-9);
}

/** The readings whose speed compares with the reference, in their order; see `isSimilarSpeed`. */
export function inSimilarState<R extends { readonly speedRpm: number | null }>(
  readings: readonly R[],
  referenceRpm: number | null,
): R[] {
  return readings.filter(({ speedRpm }) => isSimilarSpeed(speedRpm, referenceRpm));
}
