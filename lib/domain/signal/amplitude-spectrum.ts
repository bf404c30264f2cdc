import { fft, realFft } from './fft';
import { coherentGain, enbwBins, windowOf, type WindowKind } from './window';

/**
 * A one-sided spectrum of line sizes. `rms[k]` is the rms size at `k·dfHz` in the unit of the record,
 * corrected by the window's coherent gain; line 0 and, for an even block, the last line have no twin
 * and are not doubled.
 */
export type AmplitudeSpectrum = {
  readonly dfHz: number;
  readonly sampleRateHz: number;
  readonly blockLength: number;
  readonly averages: number;
  readonly window: WindowKind;
  readonly enbwBins: number;
  readonly rms: Float64Array;
};

/** How a record is cut into blocks: `overlap` is a share of the block in [0, 1). */
export type Blocks = {
  readonly window: WindowKind;
  readonly blockLength: number;
  readonly overlap: number;
};

/**
 * Amplitude spectrum of the whole record as one block: mean removed, windowed, rms line sizes
 * corrected by coherent gain (`√2·|X|/Σw`). Any length ≥ 2; nothing is padded. Same numbers as the
 * square root of `scipy.signal.periodogram(…, scaling='spectrum', detrend='constant')`.
 *
 * Example: 3·sin(2π50t) for 1 s at 1024 Hz with Hann has `rms[50]` = 3/√2.
 */
export function amplitudeSpectrum(
  samples: Float64Array,
  sampleRateHz: number,
  window: WindowKind = 'hann',
): AmplitudeSpectrum {
  return averagedSpectrum(samples, sampleRateHz, {
    window,
    blockLength: samples.length,
    overlap: 0,
  });
}

/**
 * Spectrum averaged in power over overlapping blocks (P. D. Welch, IEEE Trans. Audio
 * Electroacoust. 15, 1967): each block has its own mean removed. Samples after the last whole block
 * take no part; `averages` says how many blocks did. A block longer than the record becomes the
 * record. Same numbers as the square root of `scipy.signal.welch(…, scaling='spectrum')`.
 */
export function averagedSpectrum(
  samples: Float64Array,
  sampleRateHz: number,
  blocks: Blocks,
): AmplitudeSpectrum {
  const n = Math.min(blocks.blockLength, samples.length);
  const window = windowOf(blocks.window, n);
  const step = Math.max(1, n - Math.floor(n * blocks.overlap));
  const averages = Math.floor((samples.length - n) / step) + 1;
  const power = new Float64Array(Math.floor(n / 2) + 1);
  for (let block = 0; block + 1 < averages; block += 2) {
    const first = windowed(samples, block * step, window);
    addPairPower(power, first, windowed(samples, (block + 1) * step, window));
  }
  if (averages % 2 === 1) {
    addPower(power, windowed(samples, (averages - 1) * step, window));
  }
  const lineScale = 1 / (n * coherentGain(window));
  return {
    dfHz: sampleRateHz / n,
    sampleRateHz,
    blockLength: n,
    averages,
    window: blocks.window,
    enbwBins: enbwBins(window),
    rms: power.map((p, k) => Math.sqrt((twins(k, n) * p) / averages) * lineScale),
  };
}

/** Peak sizes of the lines: √2 times rms, because each line is read as one sinusoid. */
export function peakLines(spectrum: AmplitudeSpectrum): Float64Array {
  const n = spectrum.blockLength;
  return spectrum.rms.map((value, k) => value * Math.sqrt(twins(k, n)));
}

/**
 * Power density in unit²/Hz: line power divided by the noise bandwidth in hertz. Same numbers as
 * `scipy.signal.welch(…, scaling='density')`.
 */
export function powerDensity(spectrum: AmplitudeSpectrum): Float64Array {
  const bandwidthHz = spectrum.dfHz * spectrum.enbwBins;
  return spectrum.rms.map((value) => (value * value) / bandwidthHz);
}

function twins(line: number, n: number): number {
  return line === 0 || 2 * line === n ? 1 : 2;
}

function windowed(samples: Float64Array, from: number, window: Float64Array): Float64Array {
  const block = samples.slice(from, from + window.length);
  const mean = block.reduce((sum, value) => sum + value, 0) / block.length;
  return block.map((value, i) => (value - mean) * (window[i] ?? 0));
}

function addPower(power: Float64Array, block: Float64Array): void {
  const { re, im } = realFft(block);
  for (let k = 0; k < power.length; k++) {
    const r = re[k] ?? 0;
    const i = im[k] ?? 0;
    power[k] = (power[k] ?? 0) + r * r + i * i;
  }
}

// Two real blocks in one complex transform: |X₁|² + |X₂|² = (|Z_k|² + |Z_{N−k}|²)/2.
function addPairPower(power: Float64Array, first: Float64Array, second: Float64Array): void {
  const { re, im } = fft(first, second);
  const n = first.length;
  for (let k = 0; k < power.length; k++) {
    const a = re[k] ?? 0;
    const b = im[k] ?? 0;
    const c = re[(n - k) % n] ?? 0;
    const d = im[(n - k) % n] ?? 0;
    power[k] = (power[k] ?? 0) + (a * a + b * b + c * c + d * d) / 2;
  }
}
