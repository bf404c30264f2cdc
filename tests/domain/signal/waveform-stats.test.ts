import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { downsampleMinMax } from '@/lib/domain/signal/downsample-min-max';
import { clippedPlaces, droppedSamples } from '@/lib/domain/signal/sample-faults';
import { waveformStats } from '@/lib/domain/signal/waveform-stats';

const value = fc.double({ min: -1000, max: 1000, noNaN: true });

describe('time statistics', () => {
  it('says nothing about the shape of a flat line', () => {
    expect(waveformStats(new Float64Array(100).fill(0.1))).toMatchObject({
      rms: 0,
      truePeak: 0,
      peakToPeak: 0,
      crest: null,
      kurtosis: null,
    });
  });

  it('measures peak, crest and kurtosis from the mean', () => {
    const stats = waveformStats(Float64Array.of(6, 4, 6, 4));
    expect(stats).toEqual({ mean: 5, rms: 1, truePeak: 1, peakToPeak: 2, crest: 1, kurtosis: 1 });
  });
});

describe('reduced curve', () => {
  it('keeps both extremes, the order and the values of the record', () => {
    fc.assert(
      fc.property(
        fc.array(value, { minLength: 1, maxLength: 500 }),
        fc.integer({ min: 1, max: 60 }),
        (values, buckets) => {
          const samples = Float64Array.from(values);
          const { indices, values: kept } = downsampleMinMax(samples, buckets);
          expect(kept.length).toBeLessThanOrEqual(Math.max(2 * buckets, 0));
          expect(Math.max(...kept)).toBe(Math.max(...values));
          expect(Math.min(...kept)).toBe(Math.min(...values));
          indices.forEach((index, i) => {
            expect(kept[i]).toBe(samples[index]);
            expect(index).toBeGreaterThanOrEqual(indices[i - 1] ?? 0);
          });
        },
      ),
    );
  });
});

describe('sample faults', () => {
  const sine = (amplitude: number, step: number): Float64Array =>
    Float64Array.from({ length: 2000 }, (_, i) => {
      const x = amplitude * Math.sin(i / 20);
      return step === 0 ? x : Math.round(x / step) * step;
    });

  it('counts the places where a signal is cut off', () => {
    expect(clippedPlaces(Float64Array.of(0, 5, 5, 5, 0, 5, 5, 5, 0))).toBe(2);
    const cut = sine(1, 0).map((x) => Math.max(-0.9, Math.min(0.9, x)));
    expect(clippedPlaces(cut)).toBeGreaterThan(20);
  });

  it('does not take the rounded top of a coarse sine for clipping', () => {
    expect(clippedPlaces(sine(1, 0.01))).toBe(0);
    expect(clippedPlaces(sine(1, 0))).toBe(0);
    expect(clippedPlaces(new Float64Array(50))).toBe(0);
  });

  it('finds the longest stretch of lost samples', () => {
    const lost = sine(1, 0.001);
    lost.fill(0.25, 100, 120).fill(0.25, 700, 740);
    expect(droppedSamples(lost, 0.7)).toEqual({ from: 700, length: 40 });
    expect(droppedSamples(sine(1, 0.001), 0.7)).toBeNull();
    expect(droppedSamples(new Float64Array(50), 0)).toBeNull();
  });
});
