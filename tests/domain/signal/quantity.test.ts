import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { amplitudeSpectrum } from '@/lib/domain/signal/amplitude-spectrum';
import { lagAs, samplesAs, sizeFactor, spectrumAs } from '@/lib/domain/signal/quantity';

const cosine = (n: number, line: number, lagDeg: number): Float64Array =>
  Float64Array.from({ length: n }, (_, i) =>
    Math.cos((2 * Math.PI * line * i) / n - (lagDeg * Math.PI) / 180),
  );

describe('one quantity as another', () => {
  it('turns acceleration at 159.155 Hz into velocity of the same number', () => {
    expect(sizeFactor('acceleration', 'velocity', 1000 / (2 * Math.PI))).toBeCloseTo(1, 12);
    expect(sizeFactor('acceleration', 'displacement', 1000 / (2 * Math.PI))).toBeCloseTo(1, 12);
  });

  it('undoes itself', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 1e4, noNaN: true }), (frequencyHz) => {
        const there = sizeFactor('displacement', 'acceleration', frequencyHz);
        const back = sizeFactor('acceleration', 'displacement', frequencyHz);
        expect(there * back).toBeCloseTo(1, 12);
      }),
    );
  });

  it('adds 90 degrees of lag for each integration', () => {
    expect(lagAs(127.8, 'acceleration', 'velocity')).toBeCloseTo(217.8, 12);
    expect(lagAs(130, 'displacement', 'velocity')).toBe(40);
    expect(lagAs(130, 'displacement', 'acceleration')).toBe(310);
  });

  it('integrates a record line by line, with the size and the lag of the formula', () => {
    const n = 300;
    const velocity = samplesAs(cosine(n, 20, 40), n, {
      from: 'acceleration',
      to: 'velocity',
      lowHz: 10,
    });
    const size = sizeFactor('acceleration', 'velocity', 20);
    cosine(n, 20, 130).forEach((x, i) => expect(velocity[i]).toBeCloseTo(size * x, 10));
  });

  it('differentiates what it integrated', () => {
    const samples = cosine(256, 30, 77);
    const there = samplesAs(samples, 256, { from: 'acceleration', to: 'displacement', lowHz: 1 });
    const back = samplesAs(there, 256, { from: 'displacement', to: 'acceleration', lowHz: 1 });
    samples.forEach((x, i) => expect(back[i]).toBeCloseTo(x, 10));
  });

  it('integrates nothing below the lower edge', () => {
    const spectrum = amplitudeSpectrum(cosine(200, 5, 0), 200);
    const velocity = spectrumAs(spectrum, { from: 'acceleration', to: 'velocity', lowHz: 10 });
    expect(Math.max(...velocity.rms.slice(0, 10))).toBe(0);
    expect(Math.max(...spectrum.rms)).toBeGreaterThan(0.7);
  });

  it('leaves a velocity record alone when velocity is wanted', () => {
    const spectrum = amplitudeSpectrum(cosine(200, 5, 0), 200);
    expect(spectrumAs(spectrum, { from: 'velocity', to: 'velocity', lowHz: 10 })).toBe(spectrum);
    const samples = cosine(20, 2, 0);
    expect(samplesAs(samples, 20, { from: 'velocity', to: 'velocity', lowHz: 1 })).toEqual(samples);
  });
});
