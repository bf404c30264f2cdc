import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  amplitudeSpectrum,
  averagedSpectrum,
  peakLines,
} from '@/lib/domain/signal/amplitude-spectrum';
import { bandRms } from '@/lib/domain/signal/band';
import { fft, inverseFft, realFft } from '@/lib/domain/signal/fft';
import { mainPeak } from '@/lib/domain/signal/main-peak';
import { windowOf, type WindowKind } from '@/lib/domain/signal/window';

const WINDOWS: WindowKind[] = ['rectangular', 'hann', 'hamming', 'blackman', 'flat-top'];
const value = fc.double({ min: -100, max: 100, noNaN: true });
const record = fc.array(value, { minLength: 1, maxLength: 300 }).map((v) => Float64Array.from(v));
const close = (a: number, b: number, tolerance: number): void => {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(tolerance);
};

describe('discrete Fourier transform', () => {
  it('keeps the energy of a record of any length (Parseval)', () => {
    fc.assert(
      fc.property(record, (samples) => {
        const { re, im } = fft(samples, new Float64Array(samples.length));
        const energy = samples.reduce((sum, x) => sum + x * x, 0);
        const lines = re.reduce((sum, x, k) => sum + x * x + (im[k] ?? 0) ** 2, 0);
        close(lines / samples.length, energy, 1e-10 * (1 + energy));
      }),
    );
  });

  it('is linear', () => {
    fc.assert(
      fc.property(record, record, value, (a, b, factor) => {
        const n = Math.min(a.length, b.length);
        const x = a.slice(0, n);
        const y = b.slice(0, n);
        const mixed = realFft(x.map((v, i) => v + factor * (y[i] ?? 0)));
        const fx = realFft(x);
        const fy = realFft(y);
        mixed.re.forEach((v, k) => {
          close(v, (fx.re[k] ?? 0) + factor * (fy.re[k] ?? 0), 1e-7);
        });
        mixed.im.forEach((v, k) => {
          close(v, (fx.im[k] ?? 0) + factor * (fy.im[k] ?? 0), 1e-7);
        });
      }),
    );
  });

  it('comes back through its inverse', () => {
    fc.assert(
      fc.property(record, (samples) => {
        const lines = fft(samples, samples.slice().reverse());
        const back = inverseFft(lines.re, lines.im);
        back.re.forEach((v, i) => close(v, samples[i] ?? 0, 1e-10 * 100));
      }),
    );
  });

  it('gives a real record the first half of the complex transform', () => {
    fc.assert(
      fc.property(record, (samples) => {
        const whole = fft(samples, new Float64Array(samples.length));
        const half = realFft(samples);
        expect(half.re.length).toBe(Math.floor(samples.length / 2) + 1);
        half.re.forEach((v, k) => close(v, whole.re[k] ?? 0, 1e-9 * 100));
        half.im.forEach((v, k) => close(v, whole.im[k] ?? 0, 1e-9 * 100));
      }),
    );
  });

  it('leaves its input as it was', () => {
    const samples = Float64Array.of(1, 2, 3, 4, 5, 6);
    realFft(samples);
    expect([...samples]).toEqual([1, 2, 3, 4, 5, 6]);
  });
});

describe.each(WINDOWS)('spectrum with the %s window', (window) => {
  it('obeys Parseval: band power over all lines is the mean square of the windowed record', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 4, maxLength: 200 }), (values) => {
        const samples = Float64Array.from(values);
        const spectrum = amplitudeSpectrum(samples, 1000, window);
        const w = windowOf(window, samples.length);
        const mean = samples.reduce((s, x) => s + x, 0) / samples.length;
        const square = w.reduce((s, wi, i) => s + (wi * ((samples[i] ?? 0) - mean)) ** 2, 0);
        const wanted = square / w.reduce((s, wi) => s + wi * wi, 0);
        close(bandRms(spectrum, { lowHz: 0, highHz: 500 }) ** 2, wanted, 1e-9 * (1 + wanted));
      }),
    );
  });

  it('reads the amplitude of a cosine that lies on a line', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 20, max: 300 }),
        fc.double({ min: 0.25, max: 0.75, noNaN: true }),
        fc.double({ min: 0.01, max: 50, noNaN: true }),
        fc.double({ min: 0, max: 6.28, noNaN: true }),
        (n, place, amplitude, phase) => {
          const line = Math.round((place * n) / 2);
          const samples = Float64Array.from(
            { length: n },
            (_, i) => 3 + amplitude * Math.cos((2 * Math.PI * line * i) / n - phase),
          );
          const spectrum = amplitudeSpectrum(samples, n, window);
          const far = line > 4 && line < n / 2 - 4;
          fc.pre(far);
          close(peakLines(spectrum)[line] ?? 0, amplitude, 1e-9 * amplitude);
        },
      ),
    );
  });
});

describe('averaged spectrum', () => {
  it('of one block is the amplitude spectrum', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 2, maxLength: 100 }), (values) => {
        const samples = Float64Array.from(values);
        const blocks = { window: 'hann', blockLength: 1000, overlap: 0.5 } as const;
        expect(averagedSpectrum(samples, 10, blocks)).toEqual(amplitudeSpectrum(samples, 10));
      }),
    );
  });

  it('counts the blocks that took part', () => {
    const blocks = { window: 'hann', blockLength: 8, overlap: 0.5 } as const;
    expect(averagedSpectrum(new Float64Array(22), 1, blocks).averages).toBe(4);
  });
});

describe('main peak', () => {
  it('finds a tone between two Hann lines within 0.05 lines and 1 %', () => {
    fc.assert(
      fc.property(fc.double({ min: 40, max: 60, noNaN: true }), (frequencyHz) => {
        const samples = Float64Array.from({ length: 512 }, (_, i) =>
          Math.cos((2 * Math.PI * frequencyHz * i) / 512 + 1),
        );
        const peak = mainPeak(amplitudeSpectrum(samples, 512), { lowHz: 30, highHz: 70 });
        close(peak?.frequencyHz ?? 0, frequencyHz, 0.05);
        close(peak?.rms ?? 0, Math.SQRT1_2, 0.01 * Math.SQRT1_2);
      }),
    );
  });

  it('is nothing where the band holds only the flank of a tone', () => {
    const samples = Float64Array.from({ length: 512 }, (_, i) =>
      Math.cos((2 * Math.PI * 50 * i) / 512),
    );
    const spectrum = amplitudeSpectrum(samples, 512);
    expect(mainPeak(spectrum, { lowHz: 51, highHz: 51.5 })).toBeNull();
    expect(
      mainPeak(amplitudeSpectrum(new Float64Array(64), 64), { lowHz: 1, highHz: 20 }),
    ).toBeNull();
  });

  it('reads a flat-top line by a parabola', () => {
    const samples = Float64Array.from({ length: 512 }, (_, i) =>
      Math.cos((2 * Math.PI * 50.3 * i) / 512),
    );
    const peak = mainPeak(amplitudeSpectrum(samples, 512, 'flat-top'), { lowHz: 30, highHz: 70 });
    close(peak?.rms ?? 0, Math.SQRT1_2, 0.002);
    close(peak?.frequencyHz ?? 0, 50.3, 0.2);
  });
});
