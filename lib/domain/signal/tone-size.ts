import { windowOf } from './window';

/**
 * Rms size of the tone at an exact frequency, by Hann-weighted correlation over the whole record:
 * `√2·|Σ w·(x − mean)·e^{−jωt}| / Σw`. No spectrum line is needed; at least 4 cycles should lie in
 * the record. There is no lag, because nothing says when the mark passed.
 *
 * Example: 5·cos(2π·25.3t) over 1 s read at 25.3 Hz is 5/√2.
 */
export function toneSizeRms(
  samples: Float64Array,
  sampleRateHz: number,
  frequencyHz: number,
): number {
  const n = samples.length;
  const mean = samples.reduce((sum, value) => sum + value, 0) / n;
  const step = (2 * Math.PI * frequencyHz) / sampleRateHz;
  let re = 0;
  let im = 0;
  let weight = 0;
  windowOf('hann', n).forEach((w, i) => {
    const value = w * ((samples[i] ?? 0) - mean);
    re += value * Math.cos(step * i);
    im += value * Math.sin(step * i);
    weight += w;
  });
  return (Math.SQRT2 * Math.hypot(re, im)) / weight;
}
