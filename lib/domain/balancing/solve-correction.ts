import { add, scale, size, sum, ZERO, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import { apply, pseudoInverse, type ComplexMatrix } from './complex-matrix';

/** What a correction is computed from: vectors per point, coefficients point by plane, weights. */
export type CorrectionTask = {
  readonly now: readonly Complex[];
  readonly coefficients: ComplexMatrix;
  /** How much each point counts; 1 each where not given. */
  readonly pointWeights?: readonly number[];
  /** The most that each plane may be given, g·mm; null: no limit. Kept by `solveWithinLimits` only. */
  readonly limitsGmm?: readonly (number | null)[];
};

const MIN_MAX_ROUNDS = 400;

/**
 * The unbalance to add per plane, g·mm, that minimises `‖W·(V_now + H·C)‖₂`. As many points as
 * planes: the exact solution. More points: least squares.
 *
 * @returns unbalance per plane, or a failure where there are fewer points than planes or a plane
 *   has no effect at any point
 * Source: least squares on influence coefficients, textbooks.
 * @example V_now 3.873 at 219°, H 0.3688 mm/s per kg·mm at 2.9° → 10 502 g·mm at 36.1°
 */
export function solveCorrection(task: CorrectionTask): Result<Complex[]> {
  const planes = task.coefficients[0]?.length ?? 0;
  if (task.now.length < planes)
    return fail(
      'too-few-points',
      `${planes} planes need readings at ${planes} points or more, and there are ${task.now.length}. Read more points or use fewer planes.`,
    );
  const weighted = weightRows(task);
  const unmoved = weighted.coefficients.every((row) => row.every((h) => size(h) === 0));
  if (unmoved)
    return fail(
      'no-response',
      'The trial weight changed nothing at any point, so no answer can be computed. Check that it was fitted and that the sensors work.',
    );
  const inverse = pseudoInverse(weighted.coefficients);
  return ok(apply(inverse, weighted.now).map((u) => scale(u, -1)));
}

/**
 * The correction whose largest weighted residual is smallest, by Lawson's iteration: points that
 * stay high count more in the next least-squares round. The best round is handed back, so the
 * largest residual is never above that of plain least squares.
 * Source: C. L. Lawson's reweighting, numerical textbooks.
 * Example: three points that read 1, 1 and −1 with one plane of coefficient 1 each give 0 as
 * correction and 1 as largest residual, where least squares leaves 4/3 at one point.
 */
export function solveMinMax(task: CorrectionTask): Result<Complex[]> {
  const first = solveCorrection(task);
  if (!first.ok) return first;
  const own = task.now.map((_, p) => task.pointWeights?.[p] ?? 1);
  let best = first.value;
  let lowest = largestOf(weightedSizes(task, own, best));
  let shares = own.map(() => 1);
  let answer = first.value;
  for (let round = 0; round < MIN_MAX_ROUNDS; round++) {
    const sizes = weightedSizes(task, own, answer);
    shares = nextShares(shares, sizes);
    const next = solveCorrection({
      ...task,
      pointWeights: own.map((w, p) => w * Math.sqrt(shares[p] ?? 0)),
    });
    if (!next.ok) break;
    answer = next.value;
    const largest = largestOf(weightedSizes(task, own, answer));
    if (largest < lowest) [best, lowest] = [answer, largest];
  }
  return ok(best);
}

/**
 * The same unbalance in every plane (a static pair in two planes) that minimises the weighted
 * residual: one complex unknown, which stays well determined where planes are too close together.
 *
 * @returns unbalance for each plane, g·mm, or a failure where equal weights have no effect
 * Source: least squares with one unknown.
 */
export function solveStaticPair(task: CorrectionTask): Result<Complex[]> {
  const { coefficients, now } = weightRows(task);
  const together = coefficients.map((row) => sum(row));
  const answer = solveCorrection({ now, coefficients: together.map((h) => [h]) });
  if (!answer.ok) return answer;
  const each = answer.value[0] ?? ZERO;
  return ok((task.coefficients[0] ?? []).map(() => each));
}

/**
 * Unbalance that is equal and opposite in two planes and minimises the weighted residual: the couple
 * part alone.
 *
 * @returns unbalance for the first and the second plane, g·mm, or a failure where there are not two planes
 *   or a couple has no effect
 * Source: least squares with one unknown.
 */
export function solveCouplePair(task: CorrectionTask): Result<Complex[]> {
  const { coefficients, now } = weightRows(task);
  if (coefficients.some((row) => row.length !== 2))
    return fail('not-two-planes', 'A couple is corrected in two planes. Choose two.');
  const apart = coefficients.map(([first = ZERO, second = ZERO]) => [
    add(first, scale(second, -1)),
  ]);
  const answer = solveCorrection({ now, coefficients: apart });
  if (!answer.ok) return answer;
  const each = answer.value[0] ?? ZERO;
  return ok([each, scale(each, -1)]);
}

/** What the points show after unbalance `added` (g·mm per plane): `V_now + H·C`. */
export function residualAfter(
  task: Pick<CorrectionTask, 'now' | 'coefficients'>,
  added: readonly Complex[],
): Complex[] {
  return apply(task.coefficients, added).map((effect, p) => add(task.now[p] ?? ZERO, effect));
}

function weightRows(task: CorrectionTask): { now: Complex[]; coefficients: Complex[][] } {
  const weightOf = (p: number) => task.pointWeights?.[p] ?? 1;
  return {
    now: task.now.map((v, p) => scale(v, weightOf(p))),
    coefficients: task.coefficients.map((row, p) => row.map((h) => scale(h, weightOf(p)))),
  };
}

function weightedSizes(
  task: CorrectionTask,
  weights: readonly number[],
  added: readonly Complex[],
): number[] {
  return residualAfter(task, added).map((v, p) => (weights[p] ?? 1) * size(v));
}

function nextShares(shares: readonly number[], sizes: readonly number[]): number[] {
  const raised = shares.map((share, p) => share * (sizes[p] ?? 0));
  const total = raised.reduce((all, share) => all + share, 0);
  return total > 0 ? raised.map((share) => share / total) : raised.map(() => 1);
}

function largestOf(values: readonly number[]): number {
  return Math.max(0, ...values);
}
