import { angleDeg, fromPolar, scale, size, sum } from '../complex';

/** Mean direction of angles and how far they spread, degrees. */
export type CircularMean = { readonly meanDeg: number; readonly sdDeg: number };

/**
 * Mean and standard deviation of angles: with R the length of the mean of the unit vectors, the mean
 * is its direction, [0, 360), and the deviation `√(−2·ln R)` in degrees. Null for no angles and
 * where they cancel, as 0° and 180° do. Angles in degrees, any turn. Source: K. V. Mardia,
 * Statistics of Directional Data (textbook).
 *
 * Example: 352, 4, 358, 9, 1 have mean 0.8 and deviation 5.7.
 */
export function circularMean(anglesDeg: readonly number[]): CircularMean | null {
  if (anglesDeg.length === 0) return null;
  const resultant = scale(sum(anglesDeg.map((deg) => fromPolar(1, deg))), 1 / anglesDeg.length);
  const length = Math.min(1, size(resultant));
  if (!(length > 1e-9)) return null;
  const spread = Math.sqrt(Math.max(0, -2 * Math.log(length)));
  return { meanDeg: angleDeg(resultant), sdDeg: (spread * 180) / Math.PI };
}
