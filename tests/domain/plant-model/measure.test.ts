import { describe, expect, it } from 'vitest';
import { measure } from '@/lib/domain/plant-model/measure';
import { normalFrom, randomSource } from '@/lib/domain/plant-model/random-source';
import { lagDeg } from '@/lib/domain/units';

const vibration = {
  point: 'A-H',
  orders: [{ order: 1, rmsMmS: 3, lagDeg: lagDeg(47.4) }],
  broadBandRmsMmS: 4,
  knocks: null,
};

describe('randomSource', () => {
  it('gives the same series for the same seed, another for another', () => {
    const series = (seed: number) => Array.from({ length: 50 }, randomSource(seed));
    expect(series(7)).toEqual(series(7));
    expect(series(8)).not.toEqual(series(7));
    for (const value of series(7)) expect(value >= 0 && value < 1).toBe(true);
  });

  it('normal numbers have mean 0 and deviation 1', () => {
    const random = randomSource(1);
    const values = Array.from({ length: 20_000 }, () => normalFrom(random));
    const mean = values.reduce((a, b) => a + b) / values.length;
    const square = values.reduce((total, value) => total + value ** 2, 0) / values.length;
    // Three standard errors: 3/√20 000 and 3·√(2/20 000).
    expect(Math.abs(mean)).toBeLessThan(0.022);
    expect(Math.abs(square - 1)).toBeLessThan(0.03);
  });
});

describe('measure', () => {
  it('reads what is there, rounded as an instrument prints it', () => {
    const exact = { absoluteMmS: 0, relative: 0 };
    expect(measure(vibration, exact, randomSource(1))).toEqual({
      overallMmS: 5,
      oneXMmS: 3,
      lagDeg: 47,
    });
  });

  it('scatters about it, never with more 1x than overall, lag within [0, 360)', () => {
    const random = randomSource(3);
    const steep = { ...vibration, broadBandRmsMmS: 0.02 };
    const near0 = { ...steep, orders: [{ order: 1, rmsMmS: 0.2, lagDeg: lagDeg(359.8) }] };
    for (let i = 0; i < 500; i++) {
      const reading = measure(i % 2 ? steep : near0, { absoluteMmS: 0.03, relative: 0.02 }, random);
      expect(reading.oneXMmS).toBeLessThanOrEqual(reading.overallMmS);
      expect(reading.lagDeg >= 0 && reading.lagDeg < 360).toBe(true);
      expect(Math.round(100 * reading.overallMmS) / 100).toBe(reading.overallMmS);
    }
  });

  it('the mean of many readings is what is there', () => {
    const random = randomSource(5);
    const scatter = { absoluteMmS: 0.03, relative: 0.02 };
    const sizes = Array.from({ length: 400 }, () => measure(vibration, scatter, random).oneXMmS);
    expect(sizes.reduce((a, b) => a + b) / 400).toBeCloseTo(3, 1);
  });
});
