import { fail, ok, type Failure, type Result } from '../result';
import { madSigma, percentileOfRising } from './order-statistics';
import { theilSen, valueOnLine } from './theil-sen';

/** A reading on the time line: `day` in days from any origin, the value in one unit and detector. */
export type TrendReading = { readonly day: number; readonly value: number };

/** Trend of one segment, in the unit of the readings. */
export type TrendLine = {
  readonly perDay: number;
  /** 10th and 90th percentile of the pairwise slopes, per day. */
  readonly perDayLow: number;
  readonly perDayHigh: number;
  /** The line at the first and at the last reading. */
  readonly fitAtFirst: number;
  readonly fitAtLast: number;
  /** 1.4826·MAD of the distances from the line. */
  readonly sigma: number;
  readonly firstDay: number;
  readonly lastDay: number;
  readonly readings: number;
};

const READINGS_MIN = 4;
const SPAN_MIN_DAYS = 30;
const MS_PER_DAY = 86_400_000;

/** UTC milliseconds as days of the time line. Example: `dayOfInstant(86_400_000)` is 1. */
export function dayOfInstant(epochMs: number): number {
  return epochMs / MS_PER_DAY;
}

/**
 * Trend of the readings of one segment (see `lastSegment`): slope by the median of pairwise slopes,
 * the fit at both ends, scatter, and the spread of the slopes. Needs at least 4 readings over at
 * least 30 days and fails with 'NOT_ENOUGH' otherwise. The slope does not depend on the origin of
 * the days. Source: Theil–Sen, see `theilSen`.
 *
 * Example: readings 1, 2, 3, 4 on days 0, 10, 20, 30 give 0.1 per day and 4 at the last.
 */
export function trendLine(
  readings: readonly TrendReading[],
): Result<TrendLine, Failure<'NOT_ENOUGH' | 'NOT_FINITE' | 'SAME_X'>> {
  const days = readings.map(({ day }) => day);
  const firstDay = days.reduce((low, day) => Math.min(low, day), Infinity);
  const lastDay = days.reduce((high, day) => Math.max(high, day), -Infinity);
  if (readings.length < READINGS_MIN || lastDay - firstDay < SPAN_MIN_DAYS)
    return fail(
      'NOT_ENOUGH',
      `A trend needs ${String(READINGS_MIN)} readings over ${String(SPAN_MIN_DAYS)} days since the last break: take further readings.`,
    );
  const line = theilSen(readings.map(({ day, value }) => ({ x: day, y: value })));
  if (!line.ok) return line;
  const { slope, slopes } = line.value;
  return ok({
    perDay: slope,
    perDayLow: percentileOfRising(slopes, 0.1),
    perDayHigh: percentileOfRising(slopes, 0.9),
    fitAtFirst: valueOnLine(line.value, firstDay),
    fitAtLast: valueOnLine(line.value, lastDay),
    sigma: madSigma(readings.map(({ day, value }) => value - valueOnLine(line.value, day))),
    firstDay,
    lastDay,
    readings: readings.length,
  });
}
