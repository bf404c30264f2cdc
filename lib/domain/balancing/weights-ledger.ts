import { angleDeg, fromPolar, size, sum, type Complex } from '../complex';
import type { FittedWeight } from './job-input';

/** An unbalance as people read it: g·mm, degrees against rotation from the mark. */
export type PolarUnbalance = { readonly unbalanceGmm: number; readonly angleDeg: number };

/** What the weights of one plane come to. */
export type LedgerSum = PolarUnbalance & {
  readonly pieces: number;
  /** One weight at the given radius that acts like all of them, g. */
  readonly equivalentMassG: number;
  /** Sum of the single sizes, g·mm: how much hangs there whatever its direction. */
  readonly sizesGmm: number;
  /** More than three times as much hangs there as acts: fewer weights would do the same. */
  readonly cleanUp: boolean;
};

/** Sizes may be this many times their vector sum before a clean-up is suggested (common practice). */
const CLEAN_UP_RATIO = 3;

/**
 * Unbalance of a weight as a vector, `U = m·r·e^{+jα}` in g·mm; mass in g, radius to its centre of
 * mass in mm, α in degrees against rotation from the mark.
 * Source: definition. Example: 15 g at 400 mm, 0° is 6000 g·mm along the real axis.
 */
export function unbalanceOf(weight: Omit<FittedWeight, 'planeId'>): Complex {
  return fromPolar(weight.massG * weight.radiusMm, weight.angleDeg);
}

/** The vector sum of the weights in each plane, in the order of `planeIds`, g·mm. */
export function unbalanceByPlane(
  weights: readonly FittedWeight[],
  planeIds: readonly number[],
): Complex[] {
  return planeIds.map((id) => sum(weights.filter((w) => w.planeId === id).map(unbalanceOf)));
}

/** A vector in g·mm as size and angle. Example: `{ re: 0, im: 5 }` is 5 g·mm at 90°. */
export function polarUnbalance(vector: Complex): PolarUnbalance {
  return { unbalanceGmm: size(vector), angleDeg: angleDeg(vector) };
}

/**
 * Weights of one plane added up as vectors: g·mm and angle against rotation, number of pieces, the
 * single weight at `radiusMm` that acts the same, and whether a clean-up is worth it (the sizes add
 * up to more than three times the vector sum).
 *
 * @param radiusMm radius of the equivalent weight, mm, above 0
 * Source: vector sum. Example: 26 g at 35° and 3 g at 295°, both at 400 mm, are 10 260 g·mm at 28.4°.
 */
export function ledgerSum(
  weights: readonly Omit<FittedWeight, 'planeId'>[],
  radiusMm: number,
): LedgerSum {
  const total = polarUnbalance(sum(weights.map(unbalanceOf)));
  const sizesGmm = weights.reduce((all, w) => all + w.massG * w.radiusMm, 0);
  return {
    ...total,
    pieces: weights.length,
    equivalentMassG: total.unbalanceGmm / radiusMm,
    sizesGmm,
    cleanUp: weights.length > 1 && sizesGmm > CLEAN_UP_RATIO * total.unbalanceGmm,
  };
}
