import { add, angleDeg, fromPolar, size, ZERO, type Complex } from '../complex';
import { lagDeg, type LagDeg } from '../units';
import { normalFrom, type RandomSource } from './random-source';
import { overallFrom, type PointVibration } from './vibration-at';

/** How much repeated readings differ: σ = √(absolute² + (relative·size)²). */
export type ReadingScatter = { readonly absoluteMmS: number; readonly relative: number };

/** A reading as an instrument prints it: mm/s rms to 0.01, lag to 1°. */
export type ModelledReading = {
  readonly overallMmS: number;
  readonly oneXMmS: number;
  readonly lagDeg: LagDeg;
};

/**
 * A reading of one point: scatter added to the 1x vector (in both components) and to the rest, then
 * rounded as an instrument would. The 1x is never larger than the overall.
 *
 * Example: without scatter, 1x 3 at 47.4° beside a rest of 4 reads 5.00, 3.00 and 47°.
 */
export function measure(
  vibration: PointVibration,
  scatter: ReadingScatter,
  random: RandomSource,
): ModelledReading {
  const first = vibration.orders.find(({ order }) => order === 1);
  const made = first === undefined ? ZERO : fromPolar(first.rmsMmS, first.lagDeg);
  const oneX = scattered(made, scatter, random);
  const rest = Math.sqrt(Math.max(0, overallFrom(vibration) ** 2 - size(made) ** 2));
  const restRead = Math.abs(rest + sigmaOf(rest, scatter) * normalFrom(random));
  return {
    overallMmS: toHundredths(Math.hypot(size(oneX), restRead)),
    oneXMmS: toHundredths(size(oneX)),
    lagDeg: lagDeg(Math.round(angleDeg(oneX))),
  };
}

function scattered(vector: Complex, scatter: ReadingScatter, random: RandomSource): Complex {
  const sigma = sigmaOf(size(vector), scatter);
  return add(vector, { re: sigma * normalFrom(random), im: sigma * normalFrom(random) });
}

function sigmaOf(value: number, { absoluteMmS, relative }: ReadingScatter): number {
  return Math.hypot(absoluteMmS, relative * value);
}

function toHundredths(value: number): number {
  return Math.round(100 * value) / 100;
}
