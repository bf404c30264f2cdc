import { polarPlace, type Place, type Sense } from './face-view';

/** A circle on the drawing. */
export type Circle = { readonly centre: Place; readonly radius: number };

/** A curved arrow: the path of its shaft and the corners of its head. */
export type CurvedArrow = { readonly shaft: string; readonly head: string };

/** Length and width of an arrow head, in units of the drawing. */
export type HeadSize = { readonly length: number; readonly width: number };

/**
 * SVG path along a circle from `fromDeg` (clockwise from the top) over `sweepDeg`, positive
 * clockwise, |sweep| < 360.
 *
 * Example: a quarter from the top to the right of a circle of radius 10 round 0/0 is
 * `M 0 -10 A 10 10 0 0 1 10 0`.
 */
export function arcPath(circle: Circle, fromDeg: number, sweepDeg: number): string {
  const { centre, radius } = circle;
  const start = polarPlace(centre, radius, fromDeg);
  const end = polarPlace(centre, radius, fromDeg + sweepDeg);
  const large = Math.abs(sweepDeg) > 180 ? 1 : 0;
  const clockwise = sweepDeg > 0 ? 1 : 0;
  return `M ${pair(start)} A ${radius} ${radius} 0 ${large} ${clockwise} ${pair(end)}`;
}

/**
 * A curved arrow that points in `sense` as it is seen, beginning `startDeg` past the top in that
 * sense and `lengthDeg` long, its head at the far end.
 *
 * Example: `curvedArrow(circle, { sense: 'cw', startDeg: 25, lengthDeg: 90 }, head)` begins right of
 * the top and points downwards on the right; with `'ccw'` it is its mirror image.
 */
export function curvedArrow(
  circle: Circle,
  run: { readonly sense: Sense; readonly startDeg: number; readonly lengthDeg: number },
  head: HeadSize,
): CurvedArrow {
  const sign = run.sense === 'cw' ? 1 : -1;
  const from = sign * run.startDeg;
  const end = from + sign * run.lengthDeg;
  const { centre, radius } = circle;
  const headDeg = (head.length / radius) * (180 / Math.PI);
  const corners = [
    polarPlace(centre, radius + head.width / 2, end),
    polarPlace(centre, radius, end + sign * headDeg),
    polarPlace(centre, radius - head.width / 2, end),
  ];
  return { shaft: arcPath(circle, from, sign * run.lengthDeg), head: corners.map(pair).join(' ') };
}

function pair({ x, y }: Place): string {
  return `${round(x)} ${round(y)}`;
}

function round(value: number): number {
  return Math.round(value * 100) / 100 + 0;
}
