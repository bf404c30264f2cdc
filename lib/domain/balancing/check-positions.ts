import { fail, ok, type Result } from '../result';
import { shortTurnDeg } from '../units';

/** Two positions nearer than this cannot be told apart on a rim, degrees. */
const APART_DEG = 1;

/**
 * Whether fixed positions (degrees against rotation) can be told apart: none within 1° of another.
 *
 * @returns the angles themselves, or a failure naming the two
 * @example checkPositions([0, 51.43, 102.86]) is good; checkPositions([0, 0.5]) fails
 * Source: common practice (no single published source).
 */
export function checkPositions(anglesDeg: readonly number[]): Result<readonly number[]> {
  for (const [index, angle] of anglesDeg.entries()) {
    const near = anglesDeg.findIndex(
      (other, at) => at > index && Math.abs(shortTurnDeg(angle, other)) < APART_DEG,
    );
    if (near >= 0)
      return fail(
        'positions-close',
        `Positions ${index + 1} and ${near + 1} are less than ${APART_DEG}° apart. Give each its own place.`,
        'positions',
      );
  }
  return ok(anglesDeg);
}
