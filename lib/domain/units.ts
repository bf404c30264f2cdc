declare const brand: unique symbol;

/** A number that carries its unit in the type, so that an angle cannot stand where a speed belongs. */
export type Unit<Name extends string> = number & { readonly [brand]: Name };

/** Frequency, 1/s. */
export type Hz = Unit<'Hz'>;
/** Rotor speed, revolutions per minute. */
export type Rpm = Unit<'r/min'>;
/** Phase of the 1x component as lag, degrees in [0, 360): see `lagDeg`. */
export type LagDeg = Unit<'deg lag'>;
/** Angle on the rotor, degrees against rotation from the mark, in [0, 360): see `rotorDeg`. */
export type RotorDeg = Unit<'deg against rotation'>;

/** Standard acceleration of free fall, m/s² (exact by definition, CGPM 1901). */
export const STANDARD_GRAVITY_M_S2 = 9.80665;

/** Marks a plain number as a frequency in hertz. */
export function hz(value: number): Hz {
  return value as Hz;
}

/** Marks a plain number as a speed in revolutions per minute. */
export function rpm(value: number): Rpm {
  return value as Rpm;
}

/** Speed in r/min to frequency of one turn in Hz. Example: `hzFromRpm(rpm(1500))` is 25. */
export function hzFromRpm(speed: Rpm): Hz {
  return hz(speed / 60);
}

/** Speed in r/min to angular speed in rad/s. Example: `radPerSFromRpm(rpm(60))` is 2π. */
export function radPerSFromRpm(speed: Rpm): number {
  return (speed * 2 * Math.PI) / 60;
}

/**
 * Any finite angle in degrees brought into [0, 360).
 * Example: `normaliseDeg(-10)` is 350, `normaliseDeg(720)` is 0.
 */
export function normaliseDeg(deg: number): number {
  // In range already: handed back bit for bit (and −0 as 0).
  if (deg >= 0 && deg < 360) return deg + 0;
  const turned = ((deg % 360) + 360) % 360;
  return turned === 360 ? 0 : turned;
}

/** An angle on the rotor: degrees against rotation from the mark, normalised to [0, 360). */
export function rotorDeg(deg: number): RotorDeg {
  return normaliseDeg(deg) as RotorDeg;
}

/**
 * A phase lag: the turn of the rotor, in degrees, from the instant the mark passes the tacho to the
 * next positive peak of the stated quantity; normalised to [0, 360).
 */
export function lagDeg(deg: number): LagDeg {
  return normaliseDeg(deg) as LagDeg;
}

/** The short way round from `from` to `to`, degrees in (−180, 180]. Example: 350 → 10 is 20. */
export function shortTurnDeg(from: number, to: number): number {
  const turn = normaliseDeg(to - from);
  return turn > 180 ? turn - 360 : turn;
}
