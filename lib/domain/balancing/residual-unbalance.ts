import { add, scale, size, sum, ZERO, type Complex } from '../complex';
import { apply, pseudoInverse, type ComplexMatrix } from './complex-matrix';

/**
 * Residual unbalance in the correction planes, estimated in place: `U = H⁺·V_now`, g·mm per plane (the
 * correction is its negative). With more points than planes the least-squares estimate.
 * Source: influence coefficients; called an estimate in place by ISO 21940-14's reasoning (from memory).
 * Example: 0.15 mm/s with 0.369 mm/s per kg·mm is 407 g·mm.
 */
export function residualInPlanes(now: readonly Complex[], coefficients: ComplexMatrix): Complex[] {
  return apply(pseudoInverse(coefficients), now);
}

/**
 * Unbalance of correction planes moved to tolerance planes A (at 0) and B (at `apartM`) as vectors:
 * `A = Σ U·(L − z)/L`, `B = Σ U·z/L`; force and couple stay the same. Planes outside the bearings may
 * lie below 0 or above L.
 *
 * @param fromAM axial place of each correction plane, m from A, in the order of `unbalance`
 * Source: statics, lever rule. Example: a plane halfway gives half to A and half to B.
 */
export function moveToTolerancePlanes(
  unbalance: readonly Complex[],
  fromAM: readonly number[],
  apartM: number,
): { readonly a: Complex; readonly b: Complex } {
  const shareB = fromAM.map((z) => z / apartM);
  return {
    a: sum(unbalance.map((u, i) => scale(u, 1 - (shareB[i] ?? 0)))),
    b: sum(unbalance.map((u, i) => scale(u, shareB[i] ?? 0))),
  };
}

/**
 * Static and couple part of a pair of unbalances: `S = (A + B)/2` in each plane, `C = (A − B)/2`
 * added in the first and taken from the second.
 * Source: definition. Example: 10 and 10 in line are static 10, couple 0.
 */
export function staticAndCouple(
  first: Complex,
  second: Complex,
): { readonly staticPart: Complex; readonly couplePart: Complex } {
  return {
    staticPart: scale(add(first, second), 0.5),
    couplePart: scale(add(first, scale(second, -1)), 0.5),
  };
}

/**
 * How much of a set of vectors does not cancel: |vector sum| over the sum of sizes, 0 to 1; 1 for none.
 * Below 0.3 large weights fight each other. Example: 10 and −10 give 0.
 */
export function sumOverTotal(vectors: readonly Complex[]): number {
  const sizes = vectors.reduce((total, v) => total + size(v), 0);
  return sizes === 0 ? 1 : size(vectors.reduce(add, ZERO)) / sizes;
}
