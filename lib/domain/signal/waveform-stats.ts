/** Time statistics of a record, in its own unit. */
export type WaveformStats = {
  readonly mean: number;
  readonly rms: number;
  readonly truePeak: number;
  readonly peakToPeak: number;
  readonly crest: number | null;
  readonly kurtosis: number | null;
};

/**
 * Mean, and of the record with its mean removed: rms, true peak (largest distance from the mean),
 * peak-to-peak, crest factor (true peak / rms) and Pearson kurtosis `m₄/m₂²` (biased; 3 for Gaussian
 * noise, 1.5 for a sine). Crest and kurtosis are null for a flat line, where they mean nothing.
 * Needs at least one sample. Source: textbook definitions.
 *
 * Example: `[1, −1, 1, −1]` has rms 1, true peak 1, crest 1, kurtosis 1.
 */
export function waveformStats(samples: Float64Array): WaveformStats {
  const n = samples.length;
  const mean = samples.reduce((sum, value) => sum + value, 0) / n;
  let second = 0;
  let fourth = 0;
  let lowest = Infinity;
  let highest = -Infinity;
  for (const value of samples) {
    const square = (value - mean) ** 2;
    second += square;
    fourth += square * square;
    if (value < lowest) lowest = value;
    if (value > highest) highest = value;
  }
  const rms = Math.sqrt(second / n);
  const truePeak = Math.max(highest - mean, mean - lowest);
  const flat = highest === lowest;
  return {
    mean,
    rms: flat ? 0 : rms,
    truePeak: flat ? 0 : truePeak,
    peakToPeak: highest - lowest,
    crest: flat ? null : truePeak / rms,
    kurtosis: flat ? null : fourth / n / (second / n) ** 2,
  };
}
