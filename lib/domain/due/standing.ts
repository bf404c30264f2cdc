import { zoneOf, type Zone } from '../severity/zone';
import { crossingOf, type Crossing } from '../trends/crossing';
import { median } from '../trends/order-statistics';
import { findSteps, lastSegment, type Step } from '../trends/segments';
import { inSimilarState } from '../trends/similar-state';
import { trendLine, type TrendLine } from '../trends/trend-line';
import type { DueMachine, DueReading } from './due-machine';

/** Where a machine stands today and where it is going. */
export type Standing = {
  readonly latest: DueReading;
  readonly zone: Zone;
  /** The trend at the last reading; the median of the segment where it is too short for a trend. */
  readonly fitNow: number;
  /** The larger of fit and latest. */
  readonly ruling: number;
  readonly trend: TrendLine | null;
  readonly step: Step | null;
  /** The boundary ahead: B/C below it, C/D in zone C, none in D. */
  readonly boundary: { readonly name: 'B/C' | 'C/D'; readonly value: number } | null;
  readonly crossing: Crossing | null;
  /** False when something happened to the machine after its last reading. */
  readonly isSinceBreak: boolean;
  /** Readings that compare with the latest, since the last known break, in order of time. */
  readonly compared: readonly DueReading[];
};

/**
 * Zone, trend and boundary ahead from the readings at speeds within ±2 % of the latest. Values in
 * the unit of the boundaries. Null without readings.
 *
 * Example: readings in zone C rising steadily give the crossing of C/D.
 */
export function standingOf(machine: DueMachine): Standing | null {
  const { boundaries, readings, breakDays } = machine;
  const latest = readings.reduce<DueReading | null>(
    (newest, reading) => (newest === null || reading.day >= newest.day ? reading : newest),
    null,
  );
  if (latest === null) return null;
  const similar = inSimilarState(readings, latest.speedRpm);
  const sinceBreak = afterBreaks(similar, breakDays);
  const segment = lastSegment(similar, boundaries.bc, breakDays);
  const line = trendLine(segment);
  const trend = line.ok ? line.value : null;
  const fitNow = trend?.fitAtLast ?? middleOf(segment, latest);
  const zone = zoneOf(latest.value, boundaries);
  const boundary = boundaryAhead(zone, boundaries);
  return {
    latest,
    zone,
    fitNow,
    ruling: Math.max(fitNow, latest.value),
    trend,
    step: findSteps(sinceBreak, boundaries.bc).at(-1) ?? null,
    boundary,
    crossing: trend && boundary && crossingOf(trend, boundary.value, machine),
    isSinceBreak: sinceBreak.length > 0,
    compared: sinceBreak.length > 0 ? sinceBreak : afterBreaks(similar, []),
  };
}

function boundaryAhead(zone: Zone, { bc, cd }: DueMachine['boundaries']): Standing['boundary'] {
  if (zone === 'D') return null;
  return zone === 'C' ? { name: 'C/D', value: cd } : { name: 'B/C', value: bc };
}

function middleOf(segment: readonly DueReading[], latest: DueReading): number {
  return segment.length === 0 ? latest.value : median(segment.map(({ value }) => value));
}

function afterBreaks(readings: readonly DueReading[], breakDays: readonly number[]): DueReading[] {
  const start = breakDays.reduce((last, day) => Math.max(last, day), -Infinity);
  return readings.filter(({ day }) => day >= start).toSorted((a, b) => a.day - b.day);
}
