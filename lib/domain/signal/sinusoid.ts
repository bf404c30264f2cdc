/**
 * Displacement, µm peak-to-peak, of one sinusoid from its velocity, mm/s rms, at `frequencyHz` > 0:
 * `D = 2·√2·1000·v/(2πf)`. Example: 4.5 mm/s rms at 1480 r/min is 82.12 µm p-p.
 */
export function displacementPpUm(velocityRmsMmS: number, frequencyHz: number): number {
  return (2 * Math.SQRT2 * 1000 * velocityRmsMmS) / (2 * Math.PI * frequencyHz);
}

/**
 * Velocity, mm/s rms, of one sinusoid from its displacement, µm peak-to-peak, at `frequencyHz`.
 * Example: 50 µm p-p at 2970 r/min is 5.498 mm/s rms.
 */
export function velocityRmsFromDisplacementPp(displacementPp: number, frequencyHz: number): number {
  return (displacementPp * 2 * Math.PI * frequencyHz) / (2 * Math.SQRT2 * 1000);
}

/** rms of one sinusoid from its peak: `peak/√2`. Never for a broad-band value. */
export function rmsFromPeak(peak: number): number {
  return peak / Math.SQRT2;
}

/** Peak of one sinusoid from its rms: `√2·rms`. From a broad-band rms it is a *derived peak*. */
export function peakFromRms(rms: number): number {
  return rms * Math.SQRT2;
}
