import type { ZoneBoundaries } from './zone';

/**
 * How bad a value is on a scale from 0 to 1, the same for every limit set: straight lines through
 * 0 at 0, 0.25 at A/B, 0.5 at B/C, 0.8 at C/D and 1 at 1.25·C/D, and 1 beyond. `value` ≥ 0 in the
 * boundaries' unit. The curve is this register's own.
 *
 * Example: 3.26 mm/s rms with 1.4/2.8/4.5 is 0.581.
 */
export function severityIndex(value: number, { ab, bc, cd }: ZoneBoundaries): number {
  const corners = [
    { at: 0, index: 0 },
    { at: ab, index: 0.25 },
    { at: bc, index: 0.5 },
    { at: cd, index: 0.8 },
    { at: 1.25 * cd, index: 1 },
  ];
  const above = corners.findIndex(({ at }) => value < at);
  const from = corners[above - 1];
  const to = corners[above];
  if (from === undefined || to === undefined) return value > 0 ? 1 : 0;
  return from.index + ((to.index - from.index) * (value - from.at)) / (to.at - from.at);
}
