/** Points of a reduced curve: sample numbers, rising, and the values there. */
export type ReducedCurve = { readonly indices: Uint32Array; readonly values: Float64Array };

/**
 * Reduces a record to at most two points a bucket, the lowest and the highest sample of each, in the
 * order they occurred, so that no extreme is lost. Records of at most `2·buckets` samples come back
 * whole. `buckets` ≥ 1.
 *
 * Example: 1 000 000 samples in 800 buckets give 1600 points.
 */
export function downsampleMinMax(samples: Float64Array, buckets: number): ReducedCurve {
  const n = samples.length;
  if (n <= 2 * buckets) {
    return { indices: Uint32Array.from({ length: n }, (_, i) => i), values: samples.slice() };
  }
  const indices = new Uint32Array(2 * buckets);
  for (let bucket = 0; bucket < buckets; bucket++) {
    const from = Math.floor((bucket * n) / buckets);
    const to = Math.floor(((bucket + 1) * n) / buckets);
    const [low, high] = extremes(samples, from, to);
    indices[2 * bucket] = Math.min(low, high);
    indices[2 * bucket + 1] = Math.max(low, high);
  }
  return { indices, values: Float64Array.from(indices, (i) => samples[i] ?? 0) };
}

function extremes(samples: Float64Array, from: number, to: number): [number, number] {
  let low = from;
  let high = from;
  let lowest = samples[from] ?? 0;
  let highest = lowest;
  for (let i = from + 1; i < to; i++) {
    const value = samples[i] ?? 0;
    if (value < lowest) {
      lowest = value;
      low = i;
    } else if (value > highest) {
      highest = value;
      high = i;
    }
  }
  return [low, high];
}
