import { size, subtract, type Complex } from '../complex';

/** A change since the baseline, the change that counts, and whether it was passed. */
export type ChangeVerdict = {
  readonly change: number;
  readonly limit: number;
  readonly significant: boolean;
};

/** Share of the B/C boundary by which a value must change to count. */
export const SIGNIFICANT_SHARE_OF_BC = 0.25;

// Differences of decimal readings carry rounding errors: a change equal to the limit stays equal.
const ROUNDING = 1e-9;

/**
 * Change rule: a change from the baseline of more than 25 % of the B/C boundary is significant, up
 * or down, whatever the zone. All values in one unit and detector; `change` is signed. Source:
 * ISO 20816-1, evaluation criterion II (from memory of the standard).
 *
 * Example: 1.10 → 1.85 mm/s with B/C 2.8: 0.75 is more than 0.70.
 */
export function significantChange(
  now: number,
  baseline: number,
  bcBoundary: number,
): ChangeVerdict {
  return verdict(now - baseline, bcBoundary);
}

/**
 * The same rule on 1x vectors: `|V − V_base|`, so that a swing of the lag at constant size counts
 * too. Vectors in the boundary's unit, angles as lag, of one set-up and one speed.
 *
 * Example: 2 mm/s at 0° and at 60° lag differ by 2 mm/s.
 */
export function significantVectorChange(
  now: Complex,
  baseline: Complex,
  bcBoundary: number,
): ChangeVerdict {
  return verdict(size(subtract(now, baseline)), bcBoundary);
}

function verdict(change: number, bcBoundary: number): ChangeVerdict {
  const limit = SIGNIFICANT_SHARE_OF_BC * bcBoundary;
  return { change, limit, significant: Math.abs(change) > limit * (1 + ROUNDING) };
}
