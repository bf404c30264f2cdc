/** Smallest dot that can still be seen and told apart in print, as a share of the largest. */
const SMALLEST_SHARE = 0.3;

/**
 * Radius of the dot for each mass, so that areas are proportional to masses and the largest has
 * `largestRadius`: `r = R·√(m/m_max)`. A mass so small that its dot could not be seen (below 9 % of
 * the largest) keeps the smallest visible one; masses in grams, ≥ 0.
 *
 * Example: `weightDotRadii([90, 22.5], 10)` is `[10, 5]`. Source: area of a circle.
 */
export function weightDotRadii(massesG: readonly number[], largestRadius: number): number[] {
  const heaviest = Math.max(0, ...massesG);
  if (heaviest === 0) return massesG.map(() => largestRadius * SMALLEST_SHARE);
  return massesG.map(
    (mass) => largestRadius * Math.max(SMALLEST_SHARE, Math.sqrt(Math.max(0, mass) / heaviest)),
  );
}
