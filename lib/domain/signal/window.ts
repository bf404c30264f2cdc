/** The windows a spectrum can be made with. */
export type WindowKind = 'rectangular' | 'hann' | 'hamming' | 'blackman' | 'flat-top';

// Flat-top is not one window: this is the five-term set that scipy.signal.windows.flattop uses.
const COSINE_TERMS: Readonly<Record<WindowKind, readonly number[]>> = {
  rectangular: [1],
  hann: [0.5, -0.5],
  hamming: [0.54, -0.46],
  blackman: [0.42, -0.5, 0.08],
  'flat-top': [0.21557895, -0.41663158, 0.277263158, -0.083578947, 0.006947368],
};

/**
 * Periodic (DFT-even) window of n ≥ 1 points: `w_i = Σ a_m cos(2πmi/n)`, i = 0 … n−1. The symmetric
 * form is never used, because its gains differ at small n. Coefficients: F. J. Harris, Proc. IEEE
 * 66(1), 1978; flat-top as in `scipy.signal.windows.flattop`.
 *
 * Example: `windowOf('hann', 4)` is `[0, 0.5, 1, 0.5]`.
 */
export function windowOf(kind: WindowKind, n: number): Float64Array {
  const window = new Float64Array(n);
  COSINE_TERMS[kind].forEach((a, m) => {
    if (m === 0) window.fill(a);
    else addCosine(window, a, m);
  });
  return window;
}

/** Coherent gain `Σw/N`, by which line sizes are divided. Example: 0.5 for Hann. */
export function coherentGain(window: Float64Array): number {
  return sumOf(window) / window.length;
}

/**
 * Equivalent noise bandwidth `N·Σw²/(Σw)²` in lines, by which sums of power over a band are divided.
 * Example: 1.5 for Hann, 3.7702 for the flat-top used here.
 */
export function enbwBins(window: Float64Array): number {
  const sum = sumOf(window);
  return (window.length * window.reduce((total, w) => total + w * w, 0)) / (sum * sum);
}

function addCosine(window: Float64Array, a: number, m: number): void {
  const n = window.length;
  for (let i = 0; i < n; i++) {
    window[i] = (window[i] ?? 0) + a * Math.cos((2 * Math.PI * ((m * i) % n)) / n);
  }
}

function sumOf(window: Float64Array): number {
  return window.reduce((total, w) => total + w, 0);
}
