import { nearestIndex } from '@/lib/domain/drawing/curve-pieces';
import { formatDateTime, formatNumber, NOT_MEASURED } from '@/lib/format';
import type { ChartRange, Numbers } from './chart-types';
import type { ChartSite, TrendEvent, TrendForecast, TrendLimit, TrendSeries } from './trend-types';

export type TimedSeries = {
  name: string;
  byTime: ReadonlyMap<number, TrendSeries['readings'][number]>;
};

/** Everything of the trend on one time axis, epoch milliseconds. */
export type TrendModel = { times: readonly number[]; series: readonly TimedSeries[] };

export function trendModel(series: readonly TrendSeries[]): TrendModel {
  const timed = series.map(({ name, readings }) => ({
    name,
    byTime: new Map(readings.map((reading) => [Date.parse(reading.at), reading])),
  }));
  const times = [...new Set(timed.flatMap(({ byTime }) => [...byTime.keys()]))];
  return { times: times.sort((a, b) => a - b), series: timed };
}

const HALF_DAY = 43_200_000;

/** From the first reading to the last, or to where the forecast ends. */
export function fullRange(model: TrendModel, forecast?: TrendForecast): ChartRange {
  const ends = [...model.times, ...(forecast?.points ?? []).map(({ at }) => Date.parse(at))];
  const from = ends.reduce((low, at) => Math.min(low, at), Infinity);
  const to = ends.reduce((high, at) => Math.max(high, at), -Infinity);
  if (ends.length === 0) return { from: 0, to: HALF_DAY };
  return from === to ? { from: from - HALF_DAY, to: to + HALF_DAY } : { from, to };
}

/** The y axis from zero to past the values in sight and the next limit above them. */
export function valueTop(model: TrendModel, shown: ChartRange, limits: readonly TrendLimit[]) {
  let top = 0;
  for (const { byTime } of model.series) {
    for (const [at, { value }] of byTime) {
      if (at >= shown.from && at <= shown.to) top = Math.max(top, value ?? 0);
    }
  }
  const above = limits.map(({ value }) => value).filter((value) => value >= top);
  const next = above.length > 0 ? Math.min(...above) : 0;
  return Math.max(top * 1.08, next * 1.05) || 1;
}

/** Readings inside what is in sight. */
export function timesIn(model: TrendModel, shown: ChartRange): number[] {
  return model.times.filter((at) => at >= shown.from && at <= shown.to);
}

/** What the cursor reads at an instant. */
export function readoutText(
  model: TrendModel,
  at: number | undefined,
  unit: string,
  site: ChartSite,
): string {
  if (at === undefined) return 'No reading in this period.';
  const values = model.series.map(({ name, byTime }) => {
    const value = byTime.get(at)?.value ?? null;
    const text = value === null ? NOT_MEASURED : formatNumber(value, site);
    return `${name} ${text}`;
  });
  return `${formatDateTime(at, site.timeZone)} · ${values.join(' · ')} ${unit}`;
}

/** Where the reading under the cursor opens. */
export function readingHref(model: TrendModel, at: number | undefined): string | undefined {
  if (at === undefined) return undefined;
  return model.series.find(({ byTime }) => byTime.get(at)?.href)?.byTime.get(at)?.href;
}

export function nearestTime(times: readonly number[], at: number): number {
  return nearestIndex(times, at);
}

/** Instants at which the curve must not be joined. */
export function breakTimes(events: readonly TrendEvent[]): number[] {
  return events.filter(({ breaksTrend }) => breaksTrend).map(({ at }) => Date.parse(at));
}

export function trendNumbers(model: TrendModel, unit: string, fileName: string): Numbers {
  return {
    fileName,
    head: ['time (UTC)', ...model.series.map(({ name }) => `${name}, ${unit}`)],
    rows: () =>
      model.times.map((at) => [
        new Date(at).toISOString(),
        ...model.series.map(({ byTime }) => byTime.get(at)?.value ?? null),
      ]),
  };
}
