import type { DecimalMark } from '@/lib/format';

export type TrendReading = {
  /** ISO instant. */
  at: string;
  /** Null where the point was due and not measured. */
  value: number | null;
  /** Where the reading opens. */
  href?: string;
};

export type TrendSeries = {
  /** “overall”, “1x”. */
  name: string;
  readings: readonly TrendReading[];
};

/** A boundary between zones, or a target. */
export type TrendLimit = {
  /** “B/C”. */
  label: string;
  value: number;
};

export type TrendEvent = {
  id: number | string;
  at: string;
  /** “balanced, 90 g + 75 g”. */
  label: string;
  href: string;
  /** The curve is not joined across it. */
  breaksTrend?: boolean;
};

export type TrendForecast = {
  /** Method and basis: “straight line, based on 12 readings”. */
  words: string;
  points: readonly { at: string; value: number; low?: number; high?: number }[];
};

export type ChartSite = { timeZone: string; decimalMark?: DecimalMark };
