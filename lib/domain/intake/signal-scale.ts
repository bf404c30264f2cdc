import type { VibrationQuantity } from '../signal/quantity';
import { STANDARD_GRAVITY_M_S2 } from '../units';
import { quantityOfUnit } from './column-name';
import type { SignalUnit, TimeUnit } from './column-layout';

/** How values of a unit become the kept quantity: multiply by `scale`. */
export type SignalScale = {
  readonly quantity: VibrationQuantity;
  readonly scale: number;
  readonly keptUnit: 'm/s2' | 'mm/s' | 'um';
};

const SCALES: Readonly<Record<SignalUnit, number>> = {
  g: STANDARD_GRAVITY_M_S2,
  'm/s2': 1,
  'mm/s': 1,
  'in/s': 25.4,
  um: 1,
  mil: 25.4,
};
const KEPT_UNITS = { acceleration: 'm/s2', velocity: 'mm/s', displacement: 'um' } as const;
const SECONDS: Readonly<Record<TimeUnit, number>> = { s: 1, ms: 1e-3, us: 1e-6 };

/**
 * The factor from a unit to the kept one: g → 9.80665 m/s², in/s → 25.4 mm/s, mil → 25.4 µm. The raw
 * samples stay as they came; whoever computes multiplies. Example: `signalScale('mil').scale` is 25.4.
 */
export function signalScale(unit: SignalUnit): SignalScale {
  const quantity = quantityOfUnit(unit);
  return { quantity, scale: SCALES[unit], keptUnit: KEPT_UNITS[quantity] };
}

/** A new array of samples times a scale. Example: `scaled([1, 2], 25.4)` is `[25.4, 50.8]`. */
export function scaled(samples: Float64Array, scale: number): Float64Array {
  return samples.map((value) => value * scale);
}

/** Seconds in one unit of time. Example: `secondsPer('ms')` is 0.001. */
export function secondsPer(unit: TimeUnit): number {
  return SECONDS[unit];
}

/** Whether a column's unit is one of a signal. */
export function isSignalUnit(unit: SignalUnit | TimeUnit | null): unit is SignalUnit {
  return unit !== null && unit in SCALES;
}

/** Whether a column's unit is one of time. */
export function isTimeUnit(unit: SignalUnit | TimeUnit | null): unit is TimeUnit {
  return unit !== null && unit in SECONDS;
}
