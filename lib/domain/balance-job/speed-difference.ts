/**
 * Largest difference of a run's speed from the runs before it, in per cent of the earlier mean.
 * Null where there is no earlier run. Source: common practice (no single published source).
 * Example: `speedDifferencePct([1480, 1481, 1479], 1521)` is 2.77 within 0.01.
 */
export function speedDifferencePct(earlierRpm: readonly number[], speedRpm: number): number | null {
  if (earlierRpm.length === 0) return null;
  const mean = earlierRpm.reduce((total, speed) => total + speed, 0) / earlierRpm.length;
  return (100 * Math.abs(speedRpm - mean)) / mean;
}
