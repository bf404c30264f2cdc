import type { LagDeg } from '../units';
import type { Band } from './band';
import type { VibrationQuantity } from './quantity';
import type { TachoFlank } from './tacho-edges';

/** A tacho beside a record: known instants of the mark, or a column sampled with the record. */
export type TachoInput =
  | { readonly edgesS: Float64Array }
  | { readonly samples: Float64Array; readonly flank?: TachoFlank };

/** A record to be analysed; samples in m/s², mm/s or µm according to `quantity`. */
export type WaveformInput = {
  readonly samples: Float64Array;
  readonly sampleRateHz: number;
  readonly quantity: VibrationQuantity;
  readonly tacho?: TachoInput;
  readonly speedRpm?: number;
  readonly band: Band;
};

/** Size and lag of one order as velocity; no lag without a tacho. */
export type VelocityOrder = {
  readonly order: number;
  readonly frequencyHz: number;
  readonly amplitudeRmsMmS: number;
  readonly lagDeg: LagDeg | null;
  readonly scatterRmsMmS: number | null;
};
