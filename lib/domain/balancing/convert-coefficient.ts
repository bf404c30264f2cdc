import { fromPolar, multiply, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import { shortTurnDeg } from '../units';

/** What of a set-up a coefficient at one point depends on. */
export type SetUpPlaces = {
  readonly mark: string;
  /** Place of the tacho, degrees from top in the direction of rotation. */
  readonly tachoDeg: number;
  readonly tachoEdge: 'rising' | 'falling';
  readonly rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
  /** The sensor at the point; null where it was not described. */
  readonly sensor: { readonly place: string; readonly turnedOver: boolean } | null;
};

/** A coefficient as it would be under another set-up. */
export type ConvertedCoefficient = {
  readonly coefficient: Complex;
  /** False where nothing that matters differs. */
  readonly converted: boolean;
};

/**
 * A coefficient under another set-up of the same rotor, machine and sensor place: a tacho moved by d in the
 * direction of rotation turns it by −d, a sensor turned over by 180°. A moved mark, another edge or a
 * sensor at another place cannot be converted.
 *
 * @param coefficient per g·mm, phase as lag, angles against rotation
 * @returns the coefficient, or a failure that says what differs
 * Source: definition of lag (the tacho meets the mark d later, so every lag falls by d).
 * @example 0.162 at 26.4° with the tacho moved 30° with rotation → 0.162 at 356.4°
 */
export function convertCoefficient(
  coefficient: Complex,
  from: SetUpPlaces,
  to: SetUpPlaces,
): Result<ConvertedCoefficient> {
  const differs = differenceOf(from, to);
  if (differs) return differs;
  const turnDeg = -shortTurnDeg(from.tachoDeg, to.tachoDeg) + (isTurnedOver(from, to) ? 180 : 0);
  if (turnDeg === 0) return ok({ coefficient, converted: false });
  return ok({ coefficient: multiply(coefficient, fromPolar(1, turnDeg)), converted: true });
}

/** What cannot be converted between two set-ups, in words; null where the rest can be. */
function differenceOf(from: SetUpPlaces, to: SetUpPlaces): Result<never> | null {
  if (from.mark !== to.mark || from.tachoEdge !== to.tachoEdge)
    return fail('mark-moved', 'The mark or the edge that the tacho sees is another one.');
  if (from.rotationFromDriveEnd !== to.rotationFromDriveEnd)
    return fail('rotation-differs', 'The rotor turns the other way.');
  if (from.sensor?.place !== to.sensor?.place)
    return fail('sensor-moved', 'The sensor sits at another place.');
  return null;
}

function isTurnedOver(from: SetUpPlaces, to: SetUpPlaces): boolean {
  return (from.sensor?.turnedOver ?? false) !== (to.sensor?.turnedOver ?? false);
}
