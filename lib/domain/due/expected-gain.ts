import { zoneOf, type Zone, type ZoneBoundaries } from '../severity/zone';

/** What a balance is expected to leave. */
export type ExpectedGain = { readonly overall: number; readonly zone: Zone };

/** What a balance usually leaves of the 1x. */
const LEFT_OF_ONE_X = 0.25;

/**
 * Overall after a balance that leaves a quarter of the 1x and everything else as it is:
 * `√(overall² − 1x² + (1x/4)²)`, with its zone. Overall and 1x in one unit, rms, 1x ≤ overall.
 *
 * Example: 3.26 with 3.21 of 1x falls to 0.98.
 */
export function expectedGain(
  overall: number,
  oneX: number,
  boundaries: ZoneBoundaries,
): ExpectedGain {
  const rest = Math.max(0, overall ** 2 - oneX ** 2);
  const after = Math.sqrt(rest + (LEFT_OF_ONE_X * oneX) ** 2);
  return { overall: after, zone: zoneOf(after, boundaries) };
}
