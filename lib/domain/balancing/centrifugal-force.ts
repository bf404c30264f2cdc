import { radPerSFromRpm, rpm, STANDARD_GRAVITY_M_S2 } from '../units';

/**
 * Centrifugal force of an unbalance at a speed, newtons: `F = m·r·Ω²`.
 *
 * @param unbalanceGmm mass times radius, g·mm
 * @param speedRpm r/min
 * Source: definition. Example: 30 g at 400 mm and 1480 r/min is 288.2 N.
 */
export function centrifugalForceN(unbalanceGmm: number, speedRpm: number): number {
  return unbalanceGmm * 1e-6 * radPerSFromRpm(rpm(speedRpm)) ** 2;
}

/**
 * The unbalance whose force at a speed is `forceN`, g·mm: `F/Ω²`.
 * Source: definition. Example: 288.2 N at 1480 r/min is about 12 000 g·mm.
 */
export function unbalanceOfForceGmm(forceN: number, speedRpm: number): number {
  return (forceN * 1e6) / radPerSFromRpm(rpm(speedRpm)) ** 2;
}

/** Weight of a mass in newtons. Example: 210 kg weigh 2059.4 N. Source: standard gravity. */
export function weightN(massKg: number): number {
  return massKg * STANDARD_GRAVITY_M_S2;
}
