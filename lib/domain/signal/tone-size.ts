import { windowOf } from './window';

/**
 * Rms sizes of tones at exact frequencies, by Hann-weighted correlation over the whole record:
 * `√2·|Σ w·(x − mean)·e^{−jωt}| / Σw`. No spectrum line is needed; at least 4 cycles should lie in
 * the record. There is no lag, because nothing says when the mark passed.
 *
 * Example: 5·cos(2π·25.3t) over 1 s read at 25.3 Hz is 5/√2.
 */
export function toneSizesRms(
  samples: Float64Array,
  sampleRateHz: number,
  frequenciesHz: readonly number[],
): number[] {
  const mean = samples.reduce((sum, value) => sum + value, 0) / samples.length;
  const window = windowOf('hann', samples.length);
  const weight = window.reduce((sum, w) => sum + w, 0);
  const weighted = window.map((w, i) => w * ((samples[i] ?? 0) - mean));
  return frequenciesHz.map((frequencyHz) => {
    const correlation = correlate(weighted, (2 * Math.PI * frequencyHz) / sampleRateHz);
    return (Math.SQRT2 * correlation) / weight;
  });
}

const EXACT_EVERY = 256;

// Turning a unit vector by a fixed angle is far quicker than a sine a sample; starting it afresh
// every 256 samples keeps its rounding below 1e-13.
function correlate(values: Float64Array, step: number): number {
  const stepRe = Math.cos(step);
  const stepIm = Math.sin(step);
  let re = 0;
  let im = 0;
  for (let from = 0; from < values.length; from += EXACT_EVERY) {
    const to = Math.min(values.length, from + EXACT_EVERY);
    let c = Math.cos(step * from);
    let s = Math.sin(step * from);
    for (let i = from; i < to; i++) {
      const value = values[i] ?? 0;
      re += value * c;
      im += value * s;
      const turned = c * stepRe - s * stepIm;
      s = c * stepIm + s * stepRe;
      c = turned;
    }
  }
  return Math.hypot(re, im);
}
