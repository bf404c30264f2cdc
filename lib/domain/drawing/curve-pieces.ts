/** A dated or timed value; null where nothing was measured. */
export type CurvePoint = { readonly x: number; readonly y: number | null };
/** A value that is there. */
export type SolidPoint = { readonly x: number; readonly y: number };

/** A spacing this many times the usual one is a gap. */
const GAP_FACTOR = 4;

/**
 * Cuts a curve wherever it must not be joined: at missing values, across gaps of more than four times
 * the usual (median) spacing, and at `breaks` (a balance between two readings). Points in rising x;
 * any unit of x.
 *
 * Example: values at 0, 1, 2 with a break at 1.5 give two pieces, `[0, 1]` and `[2]`.
 */
export function curvePieces(
  points: readonly CurvePoint[],
  breaks: readonly number[] = [],
): SolidPoint[][] {
  const limit = GAP_FACTOR * medianStep(points);
  const pieces: SolidPoint[][] = [];
  let last: SolidPoint | null = null;
  for (const { x, y } of points) {
    if (y === null) {
      last = null;
      continue;
    }
    const from = last;
    const joined: boolean =
      from !== null && x - from.x <= limit && !breaks.some((at) => at > from.x && at <= x);
    if (joined) pieces.at(-1)?.push({ x, y });
    else pieces.push([{ x, y }]);
    last = { x, y };
  }
  return pieces;
}

/** Index of the value nearest to `x` in a rising list; −1 where the list is empty. Example: `nearestIndex([0, 10], 6)` is 1. */
export function nearestIndex(rising: readonly number[], x: number): number {
  let low = 0;
  let high = rising.length - 1;
  if (high < 0) return -1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((rising[middle] ?? 0) <= x) low = middle;
    else high = middle;
  }
  return Math.abs((rising[high] ?? 0) - x) < Math.abs((rising[low] ?? 0) - x) ? high : low;
}

function medianStep(points: readonly CurvePoint[]): number {
  const steps: number[] = [];
  for (let i = 1; i < points.length; i++) {
    const step = (points[i]?.x ?? 0) - (points[i - 1]?.x ?? 0);
    if (step > 0) steps.push(step);
  }
  steps.sort((a, b) => a - b);
  return steps[steps.length >> 1] ?? Infinity;
}
