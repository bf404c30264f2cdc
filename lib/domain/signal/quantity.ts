import type { AmplitudeSpectrum } from './amplitude-spectrum';
import { inverseFft, fft } from './fft';
import { lagDeg, type LagDeg } from '../units';

/** What a vibration record measures; kept as m/s², mm/s and µm. */
export type VibrationQuantity = 'acceleration' | 'velocity' | 'displacement';

type Conversion = {
  readonly from: VibrationQuantity;
  readonly to: VibrationQuantity;
  readonly lowHz: number;
};

const INTEGRATIONS: Readonly<Record<VibrationQuantity, number>> = {
  acceleration: 0,
  velocity: 1,
  displacement: 2,
};
const SI_PER_KEPT_UNIT: Readonly<Record<VibrationQuantity, number>> = {
  acceleration: 1,
  velocity: 1e-3,
  displacement: 1e-6,
};

/**
 * Factor that turns the size of one sinusoid at `frequencyHz` > 0 from one quantity into another,
 * same detector, units m/s², mm/s and µm: `(2πf)^(integrations of from − of to)`.
 *
 * Example: `sizeFactor('acceleration', 'velocity', 159.155)` is about 1 (mm/s per m/s²).
 */
export function sizeFactor(
  from: VibrationQuantity,
  to: VibrationQuantity,
  frequencyHz: number,
): number {
  const order = INTEGRATIONS[from] - INTEGRATIONS[to];
  return (
    (SI_PER_KEPT_UNIT[from] / SI_PER_KEPT_UNIT[to]) * Math.pow(2 * Math.PI * frequencyHz, order)
  );
}

/**
 * Lag of one sinusoid as another quantity, degrees: each integration adds 90 (velocity lags
 * acceleration), each differentiation takes 90 away.
 *
 * Example: an acceleration lag of 127.8 is a velocity lag of 217.8.
 */
export function lagAs(lag: number, from: VibrationQuantity, to: VibrationQuantity): LagDeg {
  return lagDeg(lag + 90 * (INTEGRATIONS[to] - INTEGRATIONS[from]));
}

/**
 * A spectrum as another quantity, line by line. When integrating, lines below `lowHz` are zero,
 * because dividing sensor drift by a small frequency makes a slope that is not vibration; line 0 is
 * always zero then.
 */
export function spectrumAs(spectrum: AmplitudeSpectrum, conversion: Conversion): AmplitudeSpectrum {
  const { from, to } = conversion;
  if (from === to) return spectrum;
  const first = firstLine(conversion, spectrum.dfHz);
  const rms = spectrum.rms.map((value, k) =>
    k < first ? 0 : value * sizeFactor(from, to, k * spectrum.dfHz),
  );
  return { ...spectrum, rms };
}

/**
 * A record as another quantity, through the frequency domain (each line divided or multiplied by
 * j2πf): nothing below `lowHz` is integrated, mean removed. The record is read as periodic, so its
 * two ends influence each other; any length.
 */
export function samplesAs(
  samples: Float64Array,
  sampleRateHz: number,
  conversion: Conversion,
): Float64Array {
  const { from, to } = conversion;
  if (from === to) return samples.slice();
  const n = samples.length;
  const dfHz = sampleRateHz / n;
  const first = firstLine(conversion, dfHz);
  const quarterTurns = INTEGRATIONS[from] - INTEGRATIONS[to];
  const lines = fft(samples, new Float64Array(n));
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  for (let k = first; 2 * k < n; k++) {
    const factor = sizeFactor(from, to, k * dfHz);
    // Differentiation turns by +90°, integration by −90°: Re of 2·X·jᵐ suffices, its twin is implied.
    const turn = (quarterTurns * Math.PI) / 2;
    const c = 2 * factor * Math.cos(turn);
    const s = 2 * factor * Math.sin(turn);
    re[k] = (lines.re[k] ?? 0) * c - (lines.im[k] ?? 0) * s;
    im[k] = (lines.re[k] ?? 0) * s + (lines.im[k] ?? 0) * c;
  }
  return inverseFft(re, im).re;
}

function firstLine({ from, to, lowHz }: Conversion, dfHz: number): number {
  const integrating = INTEGRATIONS[to] > INTEGRATIONS[from];
  return integrating ? Math.max(1, Math.ceil(lowHz / dfHz - 1e-9)) : 1;
}
