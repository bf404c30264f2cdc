import { fail, ok, type Failure, type Result } from '../result';
import { averagedSpectrum } from './amplitude-spectrum';
import { bandRms, type Band } from './band';
import { spectrumAs, type VibrationQuantity } from './quantity';
import { shaftOrders, type ShaftOrders } from './shaft-orders';
import type { VelocityOrder, WaveformInput } from './waveform-input';
import { waveformStats, type WaveformStats } from './waveform-stats';

/** The method that made a set of derived values; the version rises when any number could change. */
export const WAVEFORM_METHOD = { id: 'waveform-analysis', version: 1 } as const;

/** Fewest samples from which anything is derived. */
export const SAMPLES_MIN = 16;
/** Longest block of one transform; longer records are averaged over half-overlapping blocks. */
export const BLOCK_LENGTH_MAX = 2 ** 20;

/** Everything that is derived from a kept record, with the settings it was made with. */
export type WaveformAnalysis = {
  readonly method: typeof WAVEFORM_METHOD;
  readonly settings: {
    readonly quantity: VibrationQuantity;
    readonly window: 'hann';
    readonly blockLength: number;
    readonly averages: number;
    readonly enbwBins: number;
    readonly band: Band;
    readonly statedSpeedRpm: number | null;
  };
  readonly stats: WaveformStats;
  readonly overallVelocityRmsMmS: number;
  readonly spectrum: {
    readonly dfHz: number;
    readonly velocityRmsMmS: Float64Array;
    readonly accelerationRmsMS2: Float64Array;
  };
  readonly oneXShare: number | null;
} & ShaftOrders;

/**
 * What a kept record is kept with: time statistics in the record's unit; Hann spectrum (rms lines,
 * coherent gain) as velocity and acceleration; overall velocity rms in the band (power of the lines
 * over the noise bandwidth); speed, 1x to 3x size and lag as velocity (see `shaftOrders`); and the
 * share `(1x/overall)²` of the band's energy, null when 1x lies outside the band. The record is one
 * block up to 2²⁰ samples, else averaged over half-overlapping blocks of that length. Velocity lines
 * below the band's lower edge are zero when they come from acceleration.
 *
 * Fails on fewer than 16 samples, values that are not finite, a rate or stated speed that is not
 * above zero, and a band that is empty or lies beyond half the sample rate.
 */
export function analyseWaveform(
  input: WaveformInput,
): Result<
  WaveformAnalysis,
  Failure<'TOO_SHORT' | 'NOT_FINITE' | 'RATE_ZERO' | 'SPEED_ZERO' | 'BAND_EMPTY'>
> {
  const refused = refusal(input);
  if (refused !== null) return refused;
  const { samples, sampleRateHz, quantity, band } = input;
  const spectrum = averagedSpectrum(samples, sampleRateHz, {
    window: 'hann',
    blockLength: Math.min(samples.length, BLOCK_LENGTH_MAX),
    overlap: samples.length > BLOCK_LENGTH_MAX ? 0.5 : 0,
  });
  const lowHz = band.lowHz;
  const velocity = spectrumAs(spectrum, { from: quantity, to: 'velocity', lowHz });
  const acceleration = spectrumAs(spectrum, { from: quantity, to: 'acceleration', lowHz });
  const overallVelocityRmsMmS = bandRms(velocity, band);
  const orders = shaftOrders(input, spectrum);
  return ok({
    method: WAVEFORM_METHOD,
    settings: {
      quantity,
      window: 'hann' as const,
      blockLength: spectrum.blockLength,
      averages: spectrum.averages,
      enbwBins: spectrum.enbwBins,
      band: { lowHz, highHz: Math.min(band.highHz, sampleRateHz / 2) },
      statedSpeedRpm: input.speedRpm ?? null,
    },
    stats: waveformStats(samples),
    overallVelocityRmsMmS,
    spectrum: {
      dfHz: spectrum.dfHz,
      velocityRmsMmS: velocity.rms,
      accelerationRmsMS2: acceleration.rms,
    },
    oneXShare: shareOfEnergy(orders.oneX, overallVelocityRmsMmS, band),
    ...orders,
  });
}

function shareOfEnergy(oneX: VelocityOrder | null, overall: number, band: Band): number | null {
  if (oneX === null || overall <= 0) return null;
  const inside = oneX.frequencyHz >= band.lowHz && oneX.frequencyHz <= band.highHz;
  return inside ? (oneX.amplitudeRmsMmS / overall) ** 2 : null;
}

type Refusal = ReturnType<
  typeof fail<'TOO_SHORT' | 'NOT_FINITE' | 'RATE_ZERO' | 'SPEED_ZERO' | 'BAND_EMPTY'>
>;

function refusal(input: WaveformInput): Refusal | null {
  const { samples, sampleRateHz, speedRpm, band } = input;
  if (samples.length < SAMPLES_MIN) {
    return fail(
      'TOO_SHORT',
      `The record has ${samples.length} samples and at least ${SAMPLES_MIN} are needed: record for longer.`,
    );
  }
  if (!samples.every(Number.isFinite)) {
    return fail('NOT_FINITE', 'The record holds values that are not numbers: export it again.');
  }
  if (!isAboveZero(sampleRateHz)) {
    return fail('RATE_ZERO', 'The sample rate must be above 0 Hz.', 'sampleRateHz');
  }
  if (speedRpm !== undefined && !isAboveZero(speedRpm)) {
    return fail(
      'SPEED_ZERO',
      'The speed must be above 0 r/min: leave it empty if it is not known.',
      'speedRpm',
    );
  }
  if (!isInside(band, sampleRateHz / 2)) {
    return fail(
      'BAND_EMPTY',
      `The band ${band.lowHz}–${band.highHz} Hz holds nothing of a record sampled at ${sampleRateHz} Hz: sample faster or choose another band.`,
      'band',
    );
  }
  return null;
}

function isAboveZero(value: number): boolean {
  return value > 0 && Number.isFinite(value);
}

function isInside({ lowHz, highHz }: Band, topHz: number): boolean {
  return lowHz > 0 && highHz > lowHz && lowHz < topHz;
}
