import { SIGNIFICANT_SHARE_OF_BC } from './change-rule';
import type { ZoneBoundaries } from './zone';

/** Levels asking for action and for a stop are not set above this many times B/C and C/D. */
const CAP = 1.25;

/**
 * Level asking for action: baseline + 25 % of B/C, not above 1.25·B/C, in the boundaries' unit.
 * Source: ISO 20816-1, setting of alarms (from memory of the standard).
 *
 * Example: baseline 1.9 with B/C 2.8 gives 2.6; baseline 3.2 is held at 3.5.
 */
export function alertLevel(baseline: number, { bc }: Pick<ZoneBoundaries, 'bc'>): number {
  return Math.min(baseline + SIGNIFICANT_SHARE_OF_BC * bc, CAP * bc);
}

/**
 * Highest level asking for a stop: 1.25·C/D. It lies within C or D and does not follow the
 * baseline. Source: ISO 20816-1, setting of trips (from memory of the standard).
 *
 * Example: C/D 4.5 gives 5.625.
 */
export function stopLevelCap({ cd }: Pick<ZoneBoundaries, 'cd'>): number {
  return CAP * cd;
}
