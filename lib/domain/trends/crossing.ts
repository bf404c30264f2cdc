import type { TrendLine } from './trend-line';

/** Days from today to a boundary, as a range; a late end of null means: not on the slow side. */
export type Crossing =
  | { readonly kind: 'no crossing expected' }
  | {
      readonly kind: 'expected' | 'beyond the horizon';
      readonly earlyDays: number;
      readonly middleDays: number;
      readonly lateDays: number | null;
    };

/** Forecasts reach this far unless a site says otherwise. */
export const HORIZON_DAYS = 365;

/** From when and how far a forecast looks. */
export type ForecastView = {
  /** Age of the last reading: days from it to today, ≥ 0. */
  readonly readingAgeDays: number;
  readonly horizonDays?: number;
};

/**
 * When a trend reaches a boundary, counted from today and never negative: early (90th percentile
 * slope from fit + σ), middle (slope from the fit) and late (10th percentile slope from fit − σ; null
 * where that slope does not rise). 'no crossing expected' where the slope is ≤ 0; 'beyond the
 * horizon' where even the early day is. `boundary` in the unit of the trend. This is extrapolation
 * of a trend in the sense of ISO 13381-1 (from memory of the standard).
 *
 * Example: 4 mm/s rising 0.1 a day without scatter reaches 4.5 in 5 days, seen from today in 3 when
 * the reading is 2 days old.
 */
export function crossingOf(line: TrendLine, boundary: number, view: ForecastView): Crossing {
  if (!(line.perDay > 0)) return { kind: 'no crossing expected' };
  const { readingAgeDays, horizonDays = HORIZON_DAYS } = view;
  const daysTo = (rise: number, perDay: number): number =>
    Math.max(0, rise / perDay - readingAgeDays);
  const rise = boundary - line.fitAtLast;
  const earlyDays = daysTo(rise - line.sigma, line.perDayHigh);
  const late = daysTo(rise + line.sigma, line.perDayLow);
  return {
    kind: earlyDays > horizonDays ? 'beyond the horizon' : 'expected',
    earlyDays,
    middleDays: daysTo(rise, line.perDay),
    lateDays: line.perDayLow > 0 ? late : null,
  };
}
