import { angleDeg, divide, fromPolar, size } from '../complex';
import { normaliseDeg } from '../units';
import type { PointVector, StoredCoefficient } from './job-input';

/** How a plane is known to answer, at the point that hears it best. */
export type KnownResponse = {
  /** Size of the coefficient, per g·mm. */
  readonly perGmm: number;
  readonly amplitudeNow: number;
  /** Where a weight lowers this reading most, degrees against rotation. */
  readonly loweringDeg: number;
};

/**
 * What the coefficient book says of a trial weight in one plane: at the point that hears it best, how much
 * a g·mm changes the reading, and the place opposite the heavy side, where it goes down.
 *
 * @param now readings now, same unit as the coefficients
 * @returns null where the book has nothing for the plane
 * Source: linear model, the angle of −V/H. Example: 4.39 at 107° with 24.9° → lowers most at 262.1°.
 */
export function knownResponse(
  planeId: number,
  book: readonly StoredCoefficient[],
  now: readonly PointVector[],
): KnownResponse | null {
  const heard = book
    .filter((c) => c.planeId === planeId)
    .flatMap(({ pointId, rePerGmm, imPerGmm }) => {
      const reading = now.find((vector) => vector.pointId === pointId);
      return reading ? [{ reading, h: { re: rePerGmm, im: imPerGmm } }] : [];
    });
  const [first] = heard.sort((a, b) => size(b.h) - size(a.h));
  if (!first || size(first.h) === 0) return null;
  const { reading, h } = first;
  const heavy = angleDeg(divide(fromPolar(reading.amplitude, reading.lagDeg), h));
  return {
    perGmm: size(h),
    amplitudeNow: reading.amplitude,
    loweringDeg: normaliseDeg(heavy + 180),
  };
}
