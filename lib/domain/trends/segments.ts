import { SIGNIFICANT_SHARE_OF_BC } from '../severity/change-rule';
import { medianDeviation } from './order-statistics';
import type { TrendReading } from './trend-line';

const MAD_TIMES = 6;

/** A change from one reading to the next that starts a new segment. */
export type Step = { readonly day: number; readonly change: number };

/**
 * Steps of a series in order of time: a single change of more than the larger of 25 % of B/C and
 * 6·MAD of all changes. `bcBoundary` in the unit of the readings. A step asks for the event behind
 * it. The rule is this register's own, its 25 % that of ISO 20816-1.
 *
 * Example: 1.07 → 5.84 mm/s rms with B/C 2.8 is a step.
 */
export function findSteps(readings: readonly TrendReading[], bcBoundary: number): Step[] {
  const ordered = inOrderOfTime(readings);
  const changes = ordered.slice(1).map(({ day, value }, i) => ({
    day,
    change: value - (ordered[i]?.value ?? value),
  }));
  const scatter = changes.length === 0 ? 0 : medianDeviation(changes.map(({ change }) => change));
  const limit = Math.max(SIGNIFICANT_SHARE_OF_BC * bcBoundary, MAD_TIMES * scatter);
  return changes.filter(({ change }) => Math.abs(change) > limit);
}

/**
 * The readings since the last break, in order of time: from the last step on, or from the last of
 * `breakDays` (events and new set-ups) on, whichever is later. A reading on the day of a break
 * belongs to the new segment.
 *
 * Example: readings on days 0, 10, 20 with a break on day 10 leave those of days 10 and 20.
 */
export function lastSegment<R extends TrendReading>(
  readings: readonly R[],
  bcBoundary: number,
  breakDays: readonly number[] = [],
): R[] {
  const steps = findSteps(readings, bcBoundary).map(({ day }) => day);
  const start = [...steps, ...breakDays].reduce((latest, day) => Math.max(latest, day), -Infinity);
  return inOrderOfTime(readings).filter(({ day }) => day >= start);
}

function inOrderOfTime<R extends TrendReading>(readings: readonly R[]): R[] {
  return readings.toSorted((one, other) => one.day - other.day);
}
