import type { AmplitudeSpectrum } from './amplitude-spectrum';
import { bandLines, type Band } from './band';

/** A tone found between the lines of a spectrum: its frequency and rms size. */
export type Peak = { readonly frequencyHz: number; readonly rms: number };

/**
 * The largest tone inside a band, interpolated over three lines; null where no line of the band
 * stands above both its neighbours. With Hann the two highest lines give the tone exactly
 * (`δ = (2r−1)/(r+1)`, size divided by the window's transform at δ); other windows use a parabola
 * through the logarithms (flat-top: for the frequency only). Source: textbooks (interpolated DFT).
 *
 * Example: a sine at 50.5 lines, where the highest Hann line is 15 % low, reads its true size.
 */
export function mainPeak(spectrum: AmplitudeSpectrum, band: Band): Peak | null {
  const { from, to } = bandLines(spectrum, band);
  let line = -1;
  for (let k = Math.max(1, from); k <= to; k++) {
    if (sizeAt(spectrum, k) > sizeAt(spectrum, line)) line = k;
  }
  const size = sizeAt(spectrum, line);
  const below = sizeAt(spectrum, line - 1);
  const above = sizeAt(spectrum, line + 1);
  if (line < 1 || size <= 0 || below > size || above > size) return null;
  const { offset, gain } =
    spectrum.window === 'hann' ? hannPeak(below, size, above) : parabola(below, size, above);
  // A flat-top line is its tone's size within 0.01 dB already; the parabola would spoil it.
  const rms = spectrum.window === 'flat-top' ? size : size * gain;
  return { frequencyHz: (line + offset) * spectrum.dfHz, rms };
}

function sizeAt(spectrum: AmplitudeSpectrum, line: number): number {
  return spectrum.rms[line] ?? 0;
}

type Offset = { readonly offset: number; readonly gain: number };

function hannPeak(below: number, size: number, above: number): Offset {
  const ratio = Math.max(below, above) / size;
  const distance = Math.max(0, (2 * ratio - 1) / (ratio + 1));
  if (distance === 0) return { offset: 0, gain: 1 };
  const x = Math.PI * distance;
  return {
    offset: above >= below ? distance : -distance,
    gain: ((1 - distance * distance) * x) / Math.sin(x),
  };
}

function parabola(below: number, size: number, above: number): Offset {
  if (below <= 0 || above <= 0) return { offset: 0, gain: 1 };
  const left = Math.log(below / size);
  const right = Math.log(above / size);
  const curvature = left + right;
  if (curvature === 0) return { offset: 0, gain: 1 };
  const offset = (left - right) / (2 * curvature);
  return { offset, gain: Math.exp((-(left - right) * offset) / 4) };
}
