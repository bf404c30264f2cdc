import type { AmplitudeSpectrum } from './amplitude-spectrum';
import { bandRms, type Band } from './band';

/** Level of one third-octave band; null where the spectrum has no power there. */
export type ThirdOctaveLevel = { readonly centreHz: number; readonly levelDb: number | null };

/** The bands by which two records of one point are compared: centres 10 Hz to 1000 Hz. */
export const COMPARED_THIRD_OCTAVES: Band = { lowHz: 10, highHz: 1000 };

/**
 * Third-octave levels `20·log₁₀(rms)` re 1 unit of the spectrum, for the bands whose centres lie
 * between the two edges of `centres`, both included. Base-ten bands of IEC 61260-1: centre
 * `1000·10^(k/10)` Hz, edges a factor `10^(1/20)` either side.
 */
export function thirdOctaveLevels(spectrum: AmplitudeSpectrum, centres: Band): ThirdOctaveLevel[] {
  const first = Math.ceil(10 * Math.log10(centres.lowHz / 1000) - 1e-9);
  const last = Math.floor(10 * Math.log10(centres.highHz / 1000) + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => {
    const centreHz = 1000 * 10 ** ((first + i) / 10);
    const band = { lowHz: centreHz * 10 ** -0.05, highHz: centreHz * 10 ** 0.05 };
    const rms = bandRms(spectrum, band);
    return { centreHz, levelDb: rms > 0 ? 20 * Math.log10(rms) : null };
  });
}

/**
 * How unlike two spectra of one quantity are: the distance of their third-octave levels from 10 Hz to
 * 1000 Hz, in dB. Zero for equal spectra; a record twice as large everywhere is 6.02 dB away. Null
 * when no band is shared.
 */
export function thirdOctaveDistanceDb(a: AmplitudeSpectrum, b: AmplitudeSpectrum): number | null {
  return levelDistanceDb(
    thirdOctaveLevels(a, COMPARED_THIRD_OCTAVES),
    thirdOctaveLevels(b, COMPARED_THIRD_OCTAVES),
  );
}

/**
 * Rms of the differences of two sets of third-octave levels, band by band in the same order, over the
 * bands that both have, in dB; null when they share none.
 *
 * Example: levels of 10 and 20 dB against 13 and 16 dB are √12.5 dB apart.
 */
export function levelDistanceDb(
  a: readonly ThirdOctaveLevel[],
  b: readonly ThirdOctaveLevel[],
): number | null {
  const squares = a.flatMap(({ levelDb }, i) => {
    const other = b[i]?.levelDb ?? null;
    return levelDb === null || other === null ? [] : [(levelDb - other) ** 2];
  });
  if (squares.length === 0) return null;
  return Math.sqrt(squares.reduce((sum, square) => sum + square, 0) / squares.length);
}
