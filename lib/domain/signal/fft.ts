import FFT from 'fft.js';

/** Complex lines of a discrete transform, real and imaginary part in separate arrays. */
export type ComplexLines = { readonly re: Float64Array; readonly im: Float64Array };

/**
 * Discrete Fourier transform of a complex sequence of any length N ≥ 1:
 * `X_k = Σ x_n e^{−j2πkn/N}`, unscaled. Powers of two go through a radix-4 kernel, other lengths
 * through the chirp transform (L. Bluestein, IEEE Trans. Audio Electroacoust. 18, 1970): nothing is
 * padded or trimmed. `im` must be as long as `re`.
 *
 * Example: `fft([1, 2, 3, 4], [0, 0, 0, 0])` is `re [10, −2, −2, −2]`, `im [0, 2, 0, −2]`.
 */
export function fft(re: Float64Array, im: Float64Array): ComplexLines {
  if (re.length <= 1) return { re: re.slice(), im: im.slice() };
  return isPowerOfTwo(re.length) ? radixFft(re, im) : chirpFft(re, im);
}

/** Inverse of `fft`: `x_n = (1/N) Σ X_k e^{+j2πkn/N}`. Example: `inverseFft(fft(x, y))` is `x, y`. */
export function inverseFft(re: Float64Array, im: Float64Array): ComplexLines {
  // Swapping real and imaginary part before and after turns the forward transform into the inverse.
  const swapped = fft(im, re);
  const n = re.length;
  return { re: swapped.im.map((v) => v / n), im: swapped.re.map((v) => v / n) };
}

/**
 * Lines 0 … ⌊N/2⌋ of the discrete Fourier transform of a real record of any length N ≥ 1, unscaled;
 * the other lines are their conjugates. Example: `realFft([1, 2, 3, 4])` is `re [10, −2, −2]`,
 * `im [0, 2, 0]`.
 */
export function realFft(samples: Float64Array): ComplexLines {
  const n = samples.length;
  const lines = Math.floor(n / 2) + 1;
  if (n >= 2 && isPowerOfTwo(n)) return radixRealFft(samples, lines);
  if (n % 2 === 0 && n > 0) return halfLengthFft(samples, lines);
  const full = fft(samples, new Float64Array(n));
  return { re: full.re.slice(0, lines), im: full.im.slice(0, lines) };
}

function isPowerOfTwo(n: number): boolean {
  return (n & (n - 1)) === 0;
}

const plans = new Map<number, FFT>();
const LARGEST_KEPT_PLAN = 2 ** 17;
let latestLargePlan: FFT | null = null;

// A plan is a table of sines that depends on the length alone: the 17 small ones and the latest
// large one are kept, because the chirp transform asks for the same large one three times.
function planFor(n: number): FFT {
  const known = n > LARGEST_KEPT_PLAN ? latestLargePlan : plans.get(n);
  if (known?.size === n) return known;
  const plan = new FFT(n);
  if (n > LARGEST_KEPT_PLAN) latestLargePlan = plan;
  else plans.set(n, plan);
  return plan;
}

// Plain arrays are the faster storage for this kernel, until collecting them costs more than they
// save. Filling with a fraction tells the engine at once that they hold doubles.
function storage(length: number): number[] | Float64Array {
  return length > 2 ** 17 ? new Float64Array(length) : new Array<number>(length).fill(0.5);
}

function radixFft(re: Float64Array, im: Float64Array): ComplexLines {
  const n = re.length;
  const input = storage(2 * n);
  for (let i = 0; i < n; i++) {
    input[2 * i] = re[i] ?? 0;
    input[2 * i + 1] = im[i] ?? 0;
  }
  const output = storage(2 * n);
  planFor(n).transform(output, input);
  return split(output, n);
}

function radixRealFft(samples: Float64Array, lines: number): ComplexLines {
  const n = samples.length;
  const input = storage(n);
  for (let i = 0; i < n; i++) input[i] = samples[i] ?? 0;
  const output = storage(2 * n);
  planFor(n).realTransform(output, input);
  return split(output, lines);
}

function split(interleaved: number[] | Float64Array, lines: number): ComplexLines {
  const re = new Float64Array(lines);
  const im = new Float64Array(lines);
  for (let k = 0; k < lines; k++) {
    re[k] = interleaved[2 * k] ?? 0;
    im[k] = interleaved[2 * k + 1] ?? 0;
  }
  return { re, im };
}

// Even samples as real part, odd samples as imaginary part: half the work, then disentangled.
function halfLengthFft(samples: Float64Array, lines: number): ComplexLines {
  const half = samples.length / 2;
  const even = new Float64Array(half);
  const odd = new Float64Array(half);
  for (let i = 0; i < half; i++) {
    even[i] = samples[2 * i] ?? 0;
    odd[i] = samples[2 * i + 1] ?? 0;
  }
  const z = fft(even, odd);
  const re = new Float64Array(lines);
  const im = new Float64Array(lines);
  for (let k = 0; k < lines; k++) {
    const a = k % half;
    const b = (half - k) % half;
    const zr = z.re[a] ?? 0;
    const zi = z.im[a] ?? 0;
    const cr = z.re[b] ?? 0;
    const ci = z.im[b] ?? 0;
    const angle = (-Math.PI * k) / half;
    const c = Math.cos(angle);
    const s = Math.sin(angle);
    const oddRe = (zi + ci) / 2;
    const oddIm = (cr - zr) / 2;
    re[k] = (zr + cr) / 2 + c * oddRe - s * oddIm;
    im[k] = (zi - ci) / 2 + c * oddIm + s * oddRe;
  }
  return { re, im };
}

function chirpFft(re: Float64Array, im: Float64Array): ComplexLines {
  const n = re.length;
  const chirp = chirpOf(n);
  const length = 2 ** Math.ceil(Math.log2(2 * n - 1));
  const a = times(re, im, chirp, length);
  const kernel = kernelOf(chirp, length);
  const spectrum = radixFft(a.re, a.im);
  const kernelSpectrum = radixFft(kernel.re, kernel.im);
  const convolved = inverseFft(...product(spectrum, kernelSpectrum));
  return times(convolved.re, convolved.im, chirp, n);
}

function chirpOf(n: number): ComplexLines {
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  for (let k = 0; k < n; k++) {
    // The square is reduced as an integer first, so that long records keep every digit of the angle.
    const angle = (Math.PI * ((k * k) % (2 * n))) / n;
    re[k] = Math.cos(angle);
    im[k] = -Math.sin(angle);
  }
  return { re, im };
}

function kernelOf(chirp: ComplexLines, length: number): ComplexLines {
  const re = new Float64Array(length);
  const im = new Float64Array(length);
  chirp.re.forEach((value, k) => {
    const conjugate = -(chirp.im[k] ?? 0);
    re[k] = value;
    im[k] = conjugate;
    if (k > 0) {
      re[length - k] = value;
      im[length - k] = conjugate;
    }
  });
  return { re, im };
}

function times(
  re: Float64Array,
  im: Float64Array,
  chirp: ComplexLines,
  length: number,
): ComplexLines {
  const outRe = new Float64Array(length);
  const outIm = new Float64Array(length);
  chirp.re.forEach((c, k) => {
    const s = chirp.im[k] ?? 0;
    const x = re[k] ?? 0;
    const y = im[k] ?? 0;
    outRe[k] = x * c - y * s;
    outIm[k] = x * s + y * c;
  });
  return { re: outRe, im: outIm };
}

function product(a: ComplexLines, b: ComplexLines): [Float64Array, Float64Array] {
  const re = new Float64Array(a.re.length);
  const im = new Float64Array(a.re.length);
  for (let k = 0; k < re.length; k++) {
    const ar = a.re[k] ?? 0;
    const ai = a.im[k] ?? 0;
    const br = b.re[k] ?? 0;
    const bi = b.im[k] ?? 0;
    re[k] = ar * br - ai * bi;
    im[k] = ar * bi + ai * br;
  }
  return [re, im];
}
