import { fail, ok, type Result } from '../result';
import { radPerSFromRpm, rpm } from '../units';

/** A grade at a speed, and what it allows a rotor. */
export type PermissibleUnbalance = {
  /** Permissible specific unbalance e_per, µm (the same number in g·mm/kg). */
  readonly specificUm: number;
  /** Permissible residual unbalance U_per of the whole rotor, g·mm. */
  readonly totalGmm: number;
};

/** Where the mass centre lies between tolerance planes A and B, m from A. */
export type LeverGeometry = {
  readonly apartM: number;
  readonly massCentreFromAM: number;
  readonly arrangement: 'inboard' | 'overhung';
};

/** Share limits of ISO 21940-11, from memory. */
const LIMITS = {
  inboard: { least: 0.3, most: 0.7 },
  overhung: { least: 0.3, most: 1.3 },
} as const;

/**
 * Permissible residual unbalance of a rotor of rigid behaviour: `e_per·Ω = G`,
 * `U_per = 1000·G·m/Ω` in g·mm, with G in mm/s, m in kg and Ω at the highest service speed.
 *
 * @returns a failure where grade, mass or speed is not above zero
 * Source: ISO 21940-11 (definition of the grade).
 * @example G 6.3, 210 kg, 1480 r/min → 8536.3 g·mm
 */
export function permissibleUnbalance(
  gradeMmS: number,
  massKg: number,
  speedRpm: number,
): Result<PermissibleUnbalance> {
  const missing = [
    { name: 'grade', value: gradeMmS, field: 'gradeMmS' },
    { name: 'rotor mass', value: massKg, field: 'massKg' },
    { name: 'speed', value: speedRpm, field: 'speedRpm' },
  ].find(({ value }) => !(value > 0 && Number.isFinite(value)));
  if (missing)
    return fail(
      'not-positive',
      `The ${missing.name} must be above zero to compute a tolerance. Enter it and compute again.`,
      missing.field,
    );
  const specificUm = (1000 * gradeMmS) / radPerSFromRpm(rpm(speedRpm));
  return ok({ specificUm, totalGmm: specificUm * massKg });
}

/**
 * Permissible residual unbalance shared out to the two tolerance planes by the lever rule,
 * `A = U·L_B/L`, `B = U·L_A/L`, each kept within 0.3–0.7 of the total (inboard) or 0.3–1.3 (overhung).
 *
 * @param totalGmm U_per of the whole rotor, g·mm
 * Source: ISO 21940-11, lever rule and share limits (limits from memory).
 * @example 38 891.7 g·mm, centre 0.80 m from A, planes 1.90 m apart → A 22 516, B 16 375 g·mm
 */
export function shareByLever(
  totalGmm: number,
  geometry: LeverGeometry,
): Result<{ readonly aGmm: number; readonly bGmm: number }> {
  if (!(geometry.apartM > 0))
    return fail(
      'not-positive',
      'The tolerance planes need a distance above zero. Enter the distance between the bearings.',
      'apartM',
    );
  const { least, most } = LIMITS[geometry.arrangement];
  const limited = (share: number) => totalGmm * Math.min(most, Math.max(least, share));
  const shareB = geometry.massCentreFromAM / geometry.apartM;
  return ok({ aGmm: limited(1 - shareB), bGmm: limited(shareB) });
}
