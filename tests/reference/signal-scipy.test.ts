import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { averagedSpectrum, powerDensity } from '@/lib/domain/signal/amplitude-spectrum';
import { envelope } from '@/lib/domain/signal/envelope';
import { fft } from '@/lib/domain/signal/fft';
import type { WindowKind } from '@/lib/domain/signal/window';

// scipy.signal as the independent implementation: see tests/reference/generate/signal-vectors.py.
type Vectors = {
  sampleRateHz: number;
  periodograms: { window: WindowKind; samples: number[]; power: number[] }[];
  welch: {
    window: WindowKind;
    blockLength: number;
    samples: number[];
    power: number[];
    density: number[];
  }[];
  ffts: { re: number[]; im: number[]; outRe: number[]; outIm: number[] }[];
  envelope: { lowHz: number; highHz: number; samples: number[]; envelope: number[] };
};

const vectors = JSON.parse(
  readFileSync(new URL('./data/signal-vectors.json', import.meta.url), 'utf8'),
) as Vectors;

// Rounding grows with log N and with the largest line; 1e-12 of that line leaves room for both.
const agree = (ours: ArrayLike<number>, theirs: number[]): void => {
  const scale = Math.max(...theirs.map(Math.abs));
  expect(ours.length).toBe(theirs.length);
  theirs.forEach((value, k) => {
    expect(Math.abs((ours[k] ?? NaN) - value)).toBeLessThanOrEqual(1e-12 * scale);
  });
};

describe('the numbers of scipy.signal', () => {
  it.each(vectors.periodograms.map((v) => [v.window, v.samples.length, v] as const))(
    'periodogram with %s over %d samples',
    (window, blockLength, { samples, power }) => {
      const blocks = { window, blockLength, overlap: 0 };
      const { rms } = averagedSpectrum(Float64Array.from(samples), vectors.sampleRateHz, blocks);
      agree(
        rms.map((v) => v * v),
        power,
      );
    },
  );

  it.each(vectors.welch.map((v) => [v.window, v.blockLength, v] as const))(
    'Welch with %s and blocks of %d',
    (window, blockLength, { samples, power, density }) => {
      const blocks = { window, blockLength, overlap: 0.5 };
      const spectrum = averagedSpectrum(Float64Array.from(samples), vectors.sampleRateHz, blocks);
      agree(
        spectrum.rms.map((v) => v * v),
        power,
      );
      agree(powerDensity(spectrum), density);
    },
  );

  it.each(vectors.ffts.map((v) => [v.re.length, v] as const))(
    'transform of %d complex values',
    (_, { re, im, outRe, outIm }) => {
      const ours = fft(Float64Array.from(re), Float64Array.from(im));
      agree([...ours.re, ...ours.im], [...outRe, ...outIm]);
    },
  );

  it('envelope of a band', () => {
    const { lowHz, highHz, samples, envelope: theirs } = vectors.envelope;
    const band = { lowHz, highHz };
    agree(envelope(Float64Array.from(samples), vectors.sampleRateHz, band), theirs);
  });
});
