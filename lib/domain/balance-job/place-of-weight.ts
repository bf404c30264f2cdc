import { fail, ok, type Result } from '../result';
import { normaliseDeg, rotorDeg, shortTurnDeg, type RotorDeg } from '../units';

/** Where a weight hangs, as a person gave it. */
export type TypedPlace = {
  /** A fixed position, whose angle is known; wins over degrees. */
  readonly position: { readonly label: string; readonly angleDeg: number } | null;
  readonly angleDeg: number | null;
  /** The way the person counted from the mark to the weight. */
  readonly angleSense: 'against' | 'with' | '';
  /** Arc along the rim from the mark, the same way round, mm. */
  readonly arcMm: number | null;
  readonly radiusMm: number;
};

/** Two ways of saying one place may differ by this much before the step stops, degrees. */
const AGREEMENT_DEG = 10;

/**
 * The rotor angle (degrees against rotation from the mark) of a place given as position, or as
 * degrees with the way they were counted; an arc length, where given too, must agree within 10°.
 * A full turn (360) is the mark itself.
 *
 * @returns the angle in [0, 360), or a failure naming the field
 * @example placeOfWeight({ position: null, angleDeg: 75, angleSense: 'with', arcMm: null, radiusMm: 400 }) is 285
 * Source: definition (conversion of the sense of counting).
 */
export function placeOfWeight(typed: TypedPlace): Result<RotorDeg> {
  const counted = countedAngle(typed);
  if (!counted.ok || typed.arcMm === null) return counted;
  const arcDeg = (typed.arcMm / typed.radiusMm) * (180 / Math.PI);
  const arcAngle = typed.angleSense === 'with' ? normaliseDeg(-arcDeg) : normaliseDeg(arcDeg);
  const apart = Math.abs(shortTurnDeg(arcAngle, counted.value));
  if (apart <= AGREEMENT_DEG) return counted;
  return fail(
    'places-disagree',
    `The arc of ${typed.arcMm} mm at radius ${typed.radiusMm} mm is ${arcDeg.toFixed(0)}° from the mark, ` +
      `${apart.toFixed(0)}° away from the angle given. Look at the rotor again before going on.`,
    'arcMm',
  );
}

function countedAngle(typed: TypedPlace): Result<RotorDeg> {
  if (typed.position) return ok(rotorDeg(typed.position.angleDeg));
  if (typed.angleDeg === null)
    return fail(
      'input',
      'Write the angle from the mark in degrees, or choose a position.',
      'angleDeg',
    );
  if (typed.angleSense === '')
    return fail(
      'input',
      'Say which way you went from the mark to the weight: against or with rotation.',
      'angleSense',
    );
  return ok(rotorDeg(typed.angleSense === 'with' ? -typed.angleDeg : typed.angleDeg));
}
