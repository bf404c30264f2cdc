import { describe, expect, it } from 'vitest';
import { angleDeg, divide, fromPolar, multiply, scale, size } from '@/lib/domain/complex';
import { circularMean } from '@/lib/domain/trends/circular';
import { driftedTo, driftLine } from '@/lib/domain/trends/drift-line';
import { median, percentileOfRising } from '@/lib/domain/trends/order-statistics';
import { theilSen, valueOnLine } from '@/lib/domain/trends/theil-sen';

const fitted = (x: readonly number[], y: readonly number[]) => {
  const line = theilSen(x.map((at, i) => ({ x: at, y: y[i] ?? Number.NaN })));
  if (!line.ok) throw new Error(line.failure.message);
  return line.value;
};

// TR-03: example data of P. K. Sen, JASA 63 (1968), with the values of the test suite of SciPy
// 1.10.1 (stats, theilslopes; read there). Of the two intercepts in use ours is the median of
// y − slope·x.
describe('TR-03 Theil–Sen on the data of Sen', () => {
  const x = [1, 2, 3, 4, 10, 12, 18];
  const y = [9, 15, 19, 20, 45, 55, 78];
  const line = fitted(x, y);

  it('slope 4, and intercept 6 by the median of y − slope·x', () => {
    expect(line.slope).toBeCloseTo(4, 12);
    expect(valueOnLine(line, 0)).toBeCloseTo(6, 12);
    expect(median(y) - line.slope * median(x)).toBeCloseTo(4, 12);
  });

  it('has the limits 3.71 and 4.38 among its pairwise slopes', () => {
    // 93 %: ranks of Sen (1968) for n = 7 without ties, z = 1.8119.
    const reach = 1.8119 * Math.sqrt((7 * 6 * 19) / 18);
    const lower = line.slopes[Math.max(0, Math.round((21 - reach) / 2) - 1)];
    const upper = line.slopes[Math.min(20, Math.round((21 + reach) / 2))];
    expect(Math.abs((lower ?? 0) - 3.71)).toBeLessThanOrEqual(0.005);
    expect(Math.abs((upper ?? 0) - 4.38)).toBeLessThanOrEqual(0.0051);
  });
});

// TR-04: Hollander & Wolfe, Nonparametric Statistical Methods, Theil's example (from memory).
describe('TR-04 Theil–Sen on the cloud-seeding data', () => {
  it('slope −0.056', () => {
    const line = fitted([1, 2, 3, 4, 5], [1.26, 1.27, 1.12, 1.16, 1.03]);
    expect(line.slopes).toHaveLength(10);
    expect(Math.abs(line.slope + 0.056)).toBeLessThanOrEqual(0.0005);
    expect(percentileOfRising(line.slopes, 0.5)).toBe(line.slope);
  });
});

// Scenario values: circular mean and SD.
describe('circular mean', () => {
  it('of 352, 4, 358, 9, 1 is 0.8 with SD 5.7', () => {
    const mean = circularMean([352, 4, 358, 9, 1]);
    expect(Math.abs((mean?.meanDeg ?? 0) - 0.8)).toBeLessThanOrEqual(0.1);
    expect(Math.abs((mean?.sdDeg ?? 0) - 5.7)).toBeLessThanOrEqual(0.1);
  });
});

// Scenario S18 (computed by an independent two-degree-of-freedom rotor model with reading noise).
describe('S18 drift line of RM-1', () => {
  const coefficient = fromPolar(0.172 / 1000, 22);
  const readings: [number, number][] = [
    [0.3, 220],
    [0.22, 247],
    [0.31, 295],
    [0.46, 302],
    [0.64, 317],
    [0.82, 322],
    [1.03, 326],
    [1.23, 322],
    [1.37, 328],
    [1.61, 331],
    [1.75, 330],
    [1.89, 332],
    [2.07, 333],
    [2.29, 334],
    [2.48, 334],
  ];
  const line = driftLine(
    readings.map(([amplitude, lag], i) => ({
      day: 15 * i,
      unbalanceGmm: divide(fromPolar(amplitude, lag), coefficient),
    })),
  );
  if (!line.ok) throw new Error(line.failure.message);
  const drift = line.value;

  it('unbalance now, drift and straightness', () => {
    const monthly = scale(drift.perDayGmm, 30);
    expect(Math.abs(size(drift.nowGmm) - 14_459)).toBeLessThanOrEqual(60);
    expect(Math.abs(angleDeg(drift.nowGmm) - 311.9)).toBeLessThanOrEqual(2);
    expect(Math.abs(size(monthly) - 2190)).toBeLessThanOrEqual(60);
    expect(Math.abs(angleDeg(monthly) - 317.5)).toBeLessThanOrEqual(2);
    expect(drift.straightness).toBeCloseTo(0.96, 2);
    expect(drift.isForecast).toBe(true);
  });

  it('passes B/C 20 days after the last reading', () => {
    const overall = (days: number): number =>
      Math.hypot(size(multiply(coefficient, driftedTo(drift, days))), 0.6);
    expect(overall(16)).toBeLessThan(2.8);
    expect(overall(24)).toBeGreaterThan(2.8);
  });
});
