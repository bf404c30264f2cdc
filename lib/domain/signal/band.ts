import type { AmplitudeSpectrum } from './amplitude-spectrum';

/** A frequency band, both edges included, Hz. */
export type Band = { readonly lowHz: number; readonly highHz: number };

/**
 * Rms over a band: `√(Σ rms_k² / ENBW)` over the lines from `lowHz` to `highHz`, both included. The
 * division by the noise bandwidth undoes the window's spreading of each tone over several lines.
 *
 * Example: 3·sin(2π50t) + sin(2π120t) with Hann over 10–400 Hz is √5.
 */
export function bandRms(spectrum: AmplitudeSpectrum, band: Band): number {
  const { from, to } = bandLines(spectrum, band);
  let power = 0;
  for (let k = from; k <= to; k++) power += (spectrum.rms[k] ?? 0) ** 2;
  return Math.sqrt(power / spectrum.enbwBins);
}

/** First and last line inside the band; `to < from` when no line falls inside. */
export function bandLines(
  spectrum: AmplitudeSpectrum,
  band: Band,
): { readonly from: number; readonly to: number } {
  // A line that lies on an edge belongs to the band although k·df carries a rounding error.
  const slack = 1e-9;
  const from = Math.max(0, Math.ceil(band.lowHz / spectrum.dfHz - slack));
  const to = Math.min(spectrum.rms.length - 1, Math.floor(band.highHz / spectrum.dfHz + slack));
  return { from, to };
}
