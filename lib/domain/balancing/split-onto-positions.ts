import { fail, ok, type Result } from '../result';
import { normaliseDeg, shortTurnDeg } from '../units';
import { splitMass, type AngledMass } from './move-weight';

/** A fixed place that can take a weight; `maxG` null: no limit stated. */
export type SplitPosition = {
  readonly label: string;
  readonly angleDeg: number;
  readonly maxG: number | null;
};

/** What one position carries. */
export type PositionShare = { readonly label: string } & AngledMass;

/** Closer than this to a position is at it, degrees. */
const AT_DEG = 0.5;

/**
 * A weight carried by the positions on either side of it (component correction), all on one radius; by
 * one position alone where it lies within 0.5° of it.
 *
 * @param mass grams and degrees against rotation
 * @returns the shares in g, in the order of counting against rotation, or a failure where the
 *   neighbours are half a turn or more apart, or where a share is more than its position takes
 * Source: law of sines, see `splitMass`. @example 23.5 g at 137° on nine blades 40° apart, the first
 *   at 0° → 14.28 g on blade 4 and 10.69 g on blade 5
 */
export function splitOntoPositions(
  mass: AngledMass,
  positions: readonly SplitPosition[],
): Result<PositionShare[]> {
  const behind = positions.toSorted(
    (a, b) => normaliseDeg(mass.angleDeg - a.angleDeg) - normaliseDeg(mass.angleDeg - b.angleDeg),
  );
  const at = behind.find(
    ({ angleDeg }) => Math.abs(shortTurnDeg(angleDeg, mass.angleDeg)) <= AT_DEG,
  );
  if (at) return withinLimits([{ ...at, massG: mass.massG }]);
  const [before, after] = [behind[0], behind.at(-1)];
  if (
    !before ||
    !after ||
    normaliseDeg(after.angleDeg - before.angleDeg) >= 180 ||
    before === after
  )
    return fail(
      'no-pair',
      'No two positions stand on either side of the weight less than half a turn apart. Choose another plane or another radius.',
      'angleDeg',
    );
  const shares = splitMass(mass, [before.angleDeg, after.angleDeg]);
  if (!shares.ok) return shares;
  const [first, second] = shares.value;
  return withinLimits([
    { ...before, massG: first.massG },
    { ...after, massG: second.massG },
  ]);
}

function withinLimits(shares: readonly (SplitPosition & AngledMass)[]): Result<PositionShare[]> {
  const over = shares.find(({ massG, maxG }) => maxG !== null && massG > maxG);
  if (over)
    return fail(
      'too-heavy',
      `Position ${over.label} would carry ${over.massG.toFixed(1)} g and takes ${String(over.maxG)} g at most. Use another radius, or spread it over more positions.`,
      'maxG',
    );
  return ok(shares.map(({ label, massG, angleDeg }) => ({ label, massG, angleDeg })));
}
