import { fail, ok, type Failure, type Result } from '../result';
import { median, percentileOfRising } from './order-statistics';

/** A point of a series; `x` of any origin. */
export type SeriesPoint = { readonly x: number; readonly y: number };

/** A line through a series, about the middle of its x. */
export type TheilSenLine = {
  readonly slope: number;
  /** Value at `centreX`: the median of `y − slope·(x − centreX)`. */
  readonly valueAtCentre: number;
  readonly centreX: number;
  /** All pairwise slopes, rising. */
  readonly slopes: Float64Array;
};

/**
 * Line by the median of pairwise slopes (Theil–Sen). Pairs of equal x are left out; x is centred
 * first, so that large time stamps cost no digits. Slope in unit of y per unit of x. Fails when a
 * number is not finite or no two points differ in x. Source: H. Theil 1950, P. K. Sen, JASA 1968.
 *
 * Example: (1, 9), (2, 15), (3, 19), (4, 20), (10, 45), (12, 55), (18, 78) have slope 4.
 */
export function theilSen(
  points: readonly SeriesPoint[],
): Result<TheilSenLine, Failure<'NOT_FINITE' | 'SAME_X'>> {
  if (!points.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)))
    return fail('NOT_FINITE', 'A reading has no number in it: line it through or correct it.');
  const centreX = middleX(points);
  const centred = points.map(({ x, y }) => ({ x: x - centreX, y }));
  const slopes = pairwiseSlopes(centred);
  if (slopes.length === 0)
    return fail('SAME_X', 'All readings are from one time: a trend needs readings of other days.');
  const slope = percentileOfRising(slopes, 0.5);
  return ok({
    slope,
    valueAtCentre: median(centred.map(({ x, y }) => y - slope * x)),
    centreX,
    slopes,
  });
}

/** Value of the line at `x`, counted from the same origin as the series. */
export function valueOnLine(line: TheilSenLine, x: number): number {
  return line.valueAtCentre + line.slope * (x - line.centreX);
}

function middleX(points: readonly SeriesPoint[]): number {
  const xs = points.map(({ x }) => x);
  const least = xs.reduce((low, x) => Math.min(low, x), Infinity);
  const most = xs.reduce((high, x) => Math.max(high, x), -Infinity);
  return least + (most - least) / 2;
}

function pairwiseSlopes(points: readonly SeriesPoint[]): Float64Array {
  const slopes = points.flatMap((one, i) =>
    points
      .slice(i + 1)
      .filter((other) => other.x !== one.x)
      .map((other) => (other.y - one.y) / (other.x - one.x)),
  );
  return Float64Array.from(slopes).sort();
}
