import { normaliseDeg, shortTurnDeg } from '../units';

/** A fixed place that can take a weight. */
export type NamedPosition = { readonly label: string; readonly angleDeg: number };

/** How a rotor angle reads among fixed positions. */
export type PositionWords =
  | { readonly kind: 'at'; readonly label: string }
  | { readonly kind: 'between'; readonly from: string; readonly to: string }
  | { readonly kind: 'none' };

/** Closer than this to a position is at it, degrees. */
const AT_DEG = 0.5;

/**
 * Length of the arc along the rim from the mark, mm, going against rotation: `α·π/180·r`, α taken
 * into [0, 360), radius in mm.
 *
 * Example: `arcMm(36.1, 400)` is about 252. Source: definition of the radian.
 */
export function arcMm(angleDeg: number, radiusMm: number): number {
  return (normaliseDeg(angleDeg) * Math.PI * radiusMm) / 180;
}

/**
 * The position a rotor angle is at, or the two it lies between (in the order of counting against
 * rotation). With no positions, or only one that it is not at, `none`.
 *
 * Example: among 1 at 0°, 2 at 90°, 3 at 180°, 4 at 270°, an angle of 124° is between 2 and 3.
 */
export function positionWords(
  angleDeg: number,
  positions: readonly NamedPosition[],
): PositionWords {
  const behind = [...positions].sort(
    (a, b) => normaliseDeg(angleDeg - a.angleDeg) - normaliseDeg(angleDeg - b.angleDeg),
  );
  const at = behind.find(({ angleDeg: deg }) => Math.abs(shortTurnDeg(deg, angleDeg)) <= AT_DEG);
  if (at) return { kind: 'at', label: at.label };
  const before = behind[0];
  const after = behind.at(-1);
  if (!before || !after || before === after) return { kind: 'none' };
  return { kind: 'between', from: before.label, to: after.label };
}
