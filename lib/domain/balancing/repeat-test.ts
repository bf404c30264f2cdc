import { angleDeg, scale, size, subtract, sum, type Complex } from '../complex';
import { shortTurnDeg } from '../units';

/** How well repeated runs agree at one point. */
export type RepeatTest = {
  readonly count: number;
  readonly meanAmplitude: number;
  readonly meanLagDeg: number;
  /** Largest distance of a reading from the mean vector, in the unit of the readings. */
  readonly scatter: number;
  /** Standard deviation of the vectors, `√(Σ|d|²/(k−1))`. */
  readonly deviation: number;
  readonly lagSpreadDeg: number;
  readonly good: boolean;
};

/** Defaults of the site settings (common practice). */
const SCATTER_PCT = 5;
const LAG_SPREAD_DEG = 5;

/**
 * Repeat test of two or more runs in the same state, at one point: scatter is the largest distance
 * from the mean vector; good when it is at most 5 % of the size or `floor`, and lags spread over at
 * most 5°. Null for fewer than two readings.
 *
 * @param floor scatter that is always good, in the unit of the readings (0.1 mm/s by default of the site)
 * Source: common practice (no single published source).
 * @example 3.88, 3.85 and 3.89 mm/s, all at 219° → mean 3.873, scatter 0.023, good
 */
export function repeatTest(readings: readonly Complex[], floor: number): RepeatTest | null {
  const count = readings.length;
  if (count < 2) return null;
  const mean = scale(sum(readings), 1 / count);
  const distances = readings.map((v) => size(subtract(v, mean)));
  const scatter = Math.max(...distances);
  const lagSpreadDeg = spreadDeg(readings.map(angleDeg), angleDeg(mean));
  const allowed = Math.max((SCATTER_PCT / 100) * size(mean), floor);
  return {
    count,
    meanAmplitude: size(mean),
    meanLagDeg: angleDeg(mean),
    scatter,
    deviation: Math.hypot(...distances) / Math.sqrt(count - 1),
    lagSpreadDeg,
    good: scatter <= allowed && lagSpreadDeg <= LAG_SPREAD_DEG,
  };
}

function spreadDeg(angles: readonly number[], middle: number): number {
  const turns = angles.map((angle) => shortTurnDeg(middle, angle));
  return Math.max(...turns) - Math.min(...turns);
}
