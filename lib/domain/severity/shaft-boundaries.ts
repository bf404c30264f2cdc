import type { ZoneBoundaries } from './zone';

/**
 * Zone boundaries of relative shaft vibration, µm peak-to-peak, at `speedRpm` > 0:
 * `4800, 9000 and 13 200 / √n`. Source: ISO 20816-3 annex B, the rule of ISO 7919-3 (from memory of
 * the standard, check against your copy).
 *
 * Example: 3600 r/min gives 80, 150 and 220 µm p-p.
 */
export function shaftBoundaries(speedRpm: number): ZoneBoundaries {
  const root = Math.sqrt(speedRpm);
  return { ab: 4800 / root, bc: 9000 / root, cd: 13_200 / root };
}
