import { size, subtract, ZERO, type Complex } from '../complex';
import { fail, type Failure } from '../result';
import { columnOf, scaledSingularValues } from './complex-matrix';

/** Below this share of the largest singular value a direction counts as not tried. */
const RANK_LIMIT = 1e-6;

/**
 * Why runs cannot be solved for as-found vectors and coefficients (rank below planes + 1), or null
 * where they can.
 *
 * @param unbalances per run the unbalance per plane, g·mm
 * @param planeNames in the same order
 * Example: one run only → 'no-trial', naming the plane that never carried a weight.
 */
export function explainRank(
  unbalances: readonly (readonly Complex[])[],
  planeNames: readonly string[],
): Failure | null {
  if (unbalances.length === 0)
    return fail('no-runs', 'There is no run to compute from. Record a base run first.').failure;
  const still = planeNames.filter((_, i) => !changes(columnOf(unbalances, i)));
  if (still.length > 0) return neverTried(still);
  const values = scaledSingularValues(unbalances.map((u) => [{ re: 1, im: 0 }, ...u]));
  const full = values.length === planeNames.length + 1;
  if (full && (values.at(-1) ?? 0) > RANK_LIMIT * (values[0] ?? 0)) return null;
  return fail(
    'planes-together',
    `The planes ${planeNames.join(' and ')} were only ever changed together, so the runs cannot tell them apart. ` +
      'Make one more run in which only one of them is changed.',
  ).failure;
}

function neverTried(planes: readonly string[]): Failure {
  const named = planes.length === 1 ? `plane ${planes[0] ?? ''}` : `planes ${planes.join(' and ')}`;
  return fail(
    'no-trial',
    `No run tells what a weight in ${named} does. Fit a trial weight there and make a trial run.`,
  ).failure;
}

function changes(column: readonly Complex[]): boolean {
  const first = column[0] ?? ZERO;
  const largest = Math.max(...column.map(size));
  return column.some((u) => size(subtract(u, first)) > RANK_LIMIT * largest);
}
