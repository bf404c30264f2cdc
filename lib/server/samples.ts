import 'server-only';
/** How samples stand in a bytea column; little-endian. */
export type SampleFormat = 'f32le' | 'f64le';

export type EncodedSamples = { format: SampleFormat; bytes: Buffer };

/**
 * Samples as bytes, bit for bit: in float32 only where every value survives it exactly, which halves
 * the size of 16-bit exports; otherwise in float64 (docs/adr/0006).
 */
export function encodeSamples(samples: Float64Array): EncodedSamples {
  const narrow = Float32Array.from(samples);
  const survives = samples.every((value, i) => Object.is(narrow[i], value) && !Number.isNaN(value));
  return survives
    ? { format: 'f32le', bytes: bytesOf(narrow) }
    : { format: 'f64le', bytes: bytesOf(samples.slice()) };
}

/** The samples of such bytes. They are copied first: a pg Buffer may start at any offset. */
export function decodeSamples(format: SampleFormat, bytes: Uint8Array): Float64Array {
  const aligned = new Uint8Array(bytes).buffer;
  if (bytes.byteLength % (format === 'f32le' ? 4 : 8) !== 0)
    throw new Error(`${bytes.byteLength} bytes are no whole number of ${format} samples`);
  return format === 'f32le'
    ? Float64Array.from(new Float32Array(aligned))
    : new Float64Array(aligned);
}

function bytesOf(values: Float32Array | Float64Array): Buffer {
  return Buffer.from(values.buffer, values.byteOffset, values.byteLength);
}
