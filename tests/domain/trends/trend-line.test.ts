import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossingOf } from '@/lib/domain/trends/crossing';
import { madSigma, median, percentileOfRising } from '@/lib/domain/trends/order-statistics';
import { findSteps, lastSegment } from '@/lib/domain/trends/segments';
import { theilSen } from '@/lib/domain/trends/theil-sen';
import { dayOfInstant, trendLine, type TrendReading } from '@/lib/domain/trends/trend-line';

const every = (days: number, values: readonly number[]): TrendReading[] =>
  values.map((value, i) => ({ day: i * days, value }));
const lineOf = (readings: readonly TrendReading[]) => {
  const line = trendLine(readings);
  if (!line.ok) throw new Error(line.failure.message);
  return line.value;
};
const anySeries = fc
  .array(fc.double({ min: 0, max: 20, noNaN: true }), { minLength: 5, maxLength: 25 })
  .map((values) => every(10, values));

describe('order statistics', () => {
  it('percentiles lie straight between neighbours', () => {
    expect(percentileOfRising([1, 2, 3, 10], 0.5)).toBe(2.5);
    expect(percentileOfRising([1, 2, 3, 10], 0.9)).toBeCloseTo(7.9, 12);
    expect(percentileOfRising([], 0.5)).toBeNaN();
  });

  it('scatter is deaf to one outlier', () => {
    expect(median([3, 1, 10, 2])).toBe(2.5);
    expect(madSigma([1, 2, 3, 4, 100])).toBeCloseTo(1.4826, 12);
  });
});

describe('theilSen', () => {
  it('leaves out pairs of one time, and fails where there is no other', () => {
    const line = theilSen([
      { x: 0, y: 1 },
      { x: 0, y: 3 },
      { x: 10, y: 12 },
    ]);
    expect(line).toMatchObject({ ok: true, value: { slope: 1 } });
    const same = [1, 2, 3].map((y) => ({ x: 5, y }));
    expect(theilSen(same)).toMatchObject({ ok: false, failure: { code: 'SAME_X' } });
    expect(theilSen([])).toMatchObject({ ok: false });
  });

  it.each([Number.NaN, Infinity])('fails on %d', (y) => {
    const points = [
      { x: 0, y: 1 },
      { x: 1, y },
    ];
    expect(theilSen(points)).toMatchObject({ ok: false, failure: { code: 'NOT_FINITE' } });
  });

  it('keeps its digits on time stamps in milliseconds', () => {
    const points = Array.from({ length: 10 }, (_, i) => ({
      x: 1_767_225_600_000 + i * 60_000,
      y: 1 + 0.02 * i,
    }));
    const line = theilSen(points);
    expect(line.ok && line.value.slope * 60_000).toBeCloseTo(0.02, 14);
  });

  it('is deaf to one wild reading in seven', () => {
    const points = [0, 1, 2, 3, 4, 5, 6].map((x) => ({ x, y: x === 3 ? 90 : 2 * x }));
    const line = theilSen(points);
    expect(line.ok && line.value.slope).toBeCloseTo(2, 12);
  });
});

describe('trendLine', () => {
  it('gives slope, fit and span', () => {
    expect(lineOf(every(10, [1, 2, 3, 4]))).toMatchObject({
      fitAtFirst: 1,
      fitAtLast: 4,
      sigma: 0,
      firstDay: 0,
      lastDay: 30,
      readings: 4,
    });
  });

  it('asks for 4 readings over 30 days', () => {
    for (const readings of [every(20, [1, 2, 3]), every(9, [1, 2, 3, 4]), []])
      expect(trendLine(readings)).toMatchObject({ ok: false, failure: { code: 'NOT_ENOUGH' } });
  });

  it('does not depend on the origin of time nor on the order of the readings', () => {
    const origin = fc.integer({ min: -30_000, max: 30_000 });
    fc.assert(
      fc.property(anySeries, origin, (readings, days) => {
        const here = lineOf(readings);
        const moved = readings.map(({ day, value }) => ({ day: day + days, value })).reverse();
        const there = lineOf(moved);
        expect(there.perDay).toBeCloseTo(here.perDay, 12);
        expect(there.fitAtLast).toBeCloseTo(here.fitAtLast, 12);
        expect(there.sigma).toBeCloseTo(here.sigma, 12);
      }),
    );
  });

  it('follows the unit of the value', () => {
    fc.assert(
      fc.property(anySeries, (readings) => {
        const scaled = readings.map(({ day, value }) => ({ day, value: 8 * value }));
        expect(lineOf(scaled).perDay).toBeCloseTo(8 * lineOf(readings).perDay, 9);
      }),
    );
  });

  it('counts days from instants', () => {
    expect(dayOfInstant(86_400_000)).toBe(1);
  });
});

describe('steps and segments', () => {
  const swap = every(14, [1.05, 1.15, 1.03, 1.01, 1.04, 1.09, 1.09, 1.07, 5.84, 6.17]);

  it('finds a step and starts a segment at it', () => {
    expect(findSteps(swap, 2.8)).toEqual([{ day: 112, change: 5.84 - 1.07 }]);
    expect(lastSegment(swap, 2.8).map(({ day }) => day)).toEqual([112, 126]);
  });

  it('sees no step in scatter, nor a change equal to the limit', () => {
    expect(findSteps(every(14, [2, 3, 2, 3, 2, 3, 2]), 2.8)).toEqual([]);
    expect(findSteps(every(14, [1, 1, 1, 1.5, 1.5]), 2)).toEqual([]);
    expect(findSteps(every(14, [1, 1, 1, 1.51, 1.5]), 2)).toHaveLength(1);
  });

  it('starts a segment at an event too, whichever is later', () => {
    expect(lastSegment(swap, 2.8, [28]).map(({ day }) => day)).toEqual([112, 126]);
    expect(lastSegment(swap, 2.8, [120]).map(({ day }) => day)).toEqual([126]);
    expect(lastSegment(swap, 2.8, [200])).toEqual([]);
  });

  it('brings readings into order of time', () => {
    expect(lastSegment([...swap].reverse(), 2.8).map(({ day }) => day)).toEqual([112, 126]);
    expect(findSteps([], 2.8)).toEqual([]);
  });
});

describe('crossingOf', () => {
  const rising = lineOf(every(10, [1, 2, 3, 4]));

  it('counts from today', () => {
    const crossing = crossingOf(rising, 4.5, { readingAgeDays: 2 });
    expect(crossing).toMatchObject({ kind: 'expected' });
    if (crossing.kind === 'no crossing expected') throw new Error('a crossing was expected');
    for (const days of [crossing.earlyDays, crossing.middleDays, crossing.lateDays])
      expect(days).toBeCloseTo(3, 9);
  });

  it('expects none while the slope does not rise', () => {
    for (const values of [
      [4, 3, 2, 1],
      [2, 2, 2, 2],
    ]) {
      const flat = lineOf(every(10, values));
      expect(crossingOf(flat, 4.5, { readingAgeDays: 0 })).toEqual({
        kind: 'no crossing expected',
      });
    }
  });

  it('has no late day where the slow side does not rise', () => {
    const wavering = lineOf(every(10, [1, 1.6, 0.8, 1.9, 1.1, 1.2, 1.9]));
    expect(wavering.perDay).toBeGreaterThan(0);
    expect(crossingOf(wavering, 4.5, { readingAgeDays: 0 })).toMatchObject({ lateDays: null });
  });

  it('says what lies beyond the horizon', () => {
    expect(crossingOf(rising, 100, { readingAgeDays: 0 }).kind).toBe('beyond the horizon');
    expect(crossingOf(rising, 100, { readingAgeDays: 0, horizonDays: 2000 }).kind).toBe('expected');
  });

  it('is never negative and runs from early to late', () => {
    const boundary = fc.double({ min: 0, max: 30, noNaN: true });
    fc.assert(
      fc.property(anySeries, boundary, fc.nat(100), (readings, limit, readingAgeDays) => {
        const crossing = crossingOf(lineOf(readings), limit, { readingAgeDays });
        if (crossing.kind === 'no crossing expected') return;
        expect(crossing.earlyDays).toBeGreaterThanOrEqual(0);
        expect(crossing.middleDays).toBeGreaterThanOrEqual(crossing.earlyDays - 1e-9);
        expect(crossing.lateDays ?? Infinity).toBeGreaterThanOrEqual(crossing.middleDays - 1e-9);
      }),
    );
  });
});
