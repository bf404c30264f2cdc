import { add, scale, size, subtract, type Complex } from '../complex';
import { fail, ok, type Failure, type Result } from '../result';
import { theilSen, valueOnLine } from './theil-sen';

/** Unbalance of one plane at a time, g·mm, angle against rotation from the mark. */
export type DriftPoint = { readonly day: number; readonly unbalanceGmm: Complex };

/** How unbalance moves over the months. */
export type DriftLine = {
  /** The line at the last reading, g·mm. */
  readonly nowGmm: Complex;
  readonly perDayGmm: Complex;
  /** Net way over the way travelled, 0 to 1: 1 is a straight march. */
  readonly straightness: number;
  /** Straight enough over enough readings to forecast by. */
  readonly isForecast: boolean;
  readonly lastDay: number;
  readonly readings: number;
};

const STRAIGHTNESS_MIN = 0.8;
const READINGS_MIN = 6;

/**
 * Drift of an unbalance vector: slope by the median of pairwise slopes in both components, and how
 * straight the track runs. It may be forecast when straightness exceeds 0.8 over at least 6
 * readings. Points in order of time since the last break; unbalance is `U = V/H` with a graded
 * coefficient of that set-up and speed. Fails below 2 points and where all are of one time.
 *
 * Example: 0, 10, 20 g·mm at 0° on days 0, 1, 2 drift 10 g·mm a day at 0°, straightness 1.
 */
export function driftLine(
  points: readonly DriftPoint[],
): Result<DriftLine, Failure<'NOT_ENOUGH' | 'NOT_FINITE' | 'SAME_X'>> {
  const last = points.at(-1);
  if (last === undefined || points.length < 2)
    return fail('NOT_ENOUGH', 'A drift line needs at least 2 readings with a lag: take another.');
  const re = theilSen(points.map(({ day, unbalanceGmm }) => ({ x: day, y: unbalanceGmm.re })));
  if (!re.ok) return re;
  const im = theilSen(points.map(({ day, unbalanceGmm }) => ({ x: day, y: unbalanceGmm.im })));
  if (!im.ok) return im;
  const straightness = straightnessOf(points.map(({ unbalanceGmm }) => unbalanceGmm));
  return ok({
    nowGmm: { re: valueOnLine(re.value, last.day), im: valueOnLine(im.value, last.day) },
    perDayGmm: { re: re.value.slope, im: im.value.slope },
    straightness,
    isForecast: straightness > STRAIGHTNESS_MIN && points.length >= READINGS_MIN,
    lastDay: last.day,
    readings: points.length,
  });
}

/** Unbalance expected `days` after the last reading. Example: 0 days give `nowGmm`. */
export function driftedTo(line: DriftLine, days: number): Complex {
  return add(line.nowGmm, scale(line.perDayGmm, days));
}

function straightnessOf(track: readonly Complex[]): number {
  const way = (from: Complex | undefined, to: Complex | undefined): number =>
    from === undefined || to === undefined ? 0 : size(subtract(to, from));
  const path = track.slice(1).reduce((total, to, i) => total + way(track[i], to), 0);
  return path === 0 ? 0 : way(track[0], track.at(-1)) / path;
}
