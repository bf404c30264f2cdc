import { amplitudeSpectrum, type AmplitudeSpectrum } from './amplitude-spectrum';
import { bandLines, type Band } from './band';
import { fft, inverseFft } from './fft';

/** A line of an envelope spectrum compared with the floor around it. */
export type LineOverFloor = {
  readonly frequencyHz: number;
  readonly rms: number;
  readonly overFloor: number;
};

/** Where the floor of an envelope spectrum is taken: below it drift, above it the window of interest ends. */
export const ENVELOPE_FLOOR_BAND: Band = { lowHz: 5, highHz: 400 };

/**
 * Envelope of a record: magnitude of the analytic signal of its band from `lowHz` to `highHz`, cut
 * in the frequency domain; unit of the record. Source: R. B. Randall, textbook definition.
 *
 * Example: `(1 + cos 2π·20t)·cos 2π·1000t` in 900–1100 Hz has the envelope `1 + cos 2π·20t`.
 */
export function envelope(samples: Float64Array, sampleRateHz: number, band: Band): Float64Array {
  const n = samples.length;
  const lines = fft(samples, new Float64Array(n));
  const dfHz = sampleRateHz / n;
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  const last = Math.min(Math.floor(band.highHz / dfHz), Math.ceil(n / 2) - 1);
  for (let k = Math.max(1, Math.ceil(band.lowHz / dfHz)); k <= last; k++) {
    re[k] = 2 * (lines.re[k] ?? 0);
    im[k] = 2 * (lines.im[k] ?? 0);
  }
  const analytic = inverseFft(re, im);
  return analytic.re.map((x, i) => Math.hypot(x, analytic.im[i] ?? 0));
}

/** Spectrum of the envelope of a band: whole record, mean removed, Hann, rms lines. */
export function envelopeSpectrum(
  samples: Float64Array,
  sampleRateHz: number,
  band: Band,
): AmplitudeSpectrum {
  return amplitudeSpectrum(envelope(samples, sampleRateHz, band), sampleRateHz, 'hann');
}

/**
 * The highest line within `±shareOfFrequency` (at least half a line) of a calculated frequency, and
 * how many times it stands above the floor, which is the median line from 5 Hz to 400 Hz. Null when
 * the frequency lies beyond the spectrum or the floor is zero.
 */
export function lineOverFloor(
  spectrum: AmplitudeSpectrum,
  frequencyHz: number,
  shareOfFrequency = 0.015,
): LineOverFloor | null {
  const half = Math.max(frequencyHz * shareOfFrequency, spectrum.dfHz / 2);
  const near = bandLines(spectrum, { lowHz: frequencyHz - half, highHz: frequencyHz + half });
  const floorLines = bandLines(spectrum, ENVELOPE_FLOOR_BAND);
  const floor = median(spectrum.rms.slice(floorLines.from, floorLines.to + 1));
  if (near.to < near.from || !(floor > 0)) return null;
  const candidates = spectrum.rms.slice(near.from, near.to + 1);
  const rms = candidates.reduce((highest, value) => Math.max(highest, value), 0);
  const line = near.from + candidates.indexOf(rms);
  return { frequencyHz: line * spectrum.dfHz, rms, overFloor: rms / floor };
}

function median(values: Float64Array): number {
  const sorted = values.slice().sort();
  const middle = sorted.length / 2;
  const upper = sorted[Math.floor(middle)] ?? NaN;
  const lower = sorted[Math.ceil(middle) - 1] ?? NaN;
  return (upper + lower) / 2;
}
