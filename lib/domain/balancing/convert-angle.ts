import { fail, ok, type Result } from '../result';
import { lagDeg, normaliseDeg, rotorDeg, type LagDeg, type RotorDeg } from '../units';
import type { Sense } from '../drawing/face-view';

/**
 * A typed angle: from 0 to 360 degrees, 360 being the mark itself. Anything else is refused, because
 * −10 or 720 on a note is more often a slip than a turn.
 *
 * @param typed degrees as a number, in the sense the person counts
 * @param field name of the input, for the failure
 * @returns degrees in [0, 360). Example: 360 is 0; −10 and 720 are refused.
 */
export function parseAngle(typed: number, field = 'angleDeg'): Result<number> {
  if (Number.isFinite(typed) && typed >= 0 && typed <= 360) return ok(normaliseDeg(typed));
  const same = Number.isFinite(typed) ? ` If a whole turn was meant, that is ${named(typed)}.` : '';
  return fail(
    'angle-range',
    `An angle runs from 0 to 360 degrees, and ${typed} lies outside. Count again from the mark and type what you read.${same}`,
    field,
  );
}

/** An angle counted with rotation as rotor angle: `360 − a`. Example: 75° is 285°. Source: definition. */
export function rotorDegFromWithRotation(withRotationDeg: number): RotorDeg {
  return rotorDeg(-withRotationDeg);
}

/**
 * A rotor angle as it reads for a person who counts in `sense`: `360 − a` with rotation, itself against.
 * Source: definition. Example: 285° reads as 75° with rotation.
 */
export function countedInSense(angleDeg: number, sense: 'against' | 'with'): number {
  return normaliseDeg(sense === 'with' ? -angleDeg : angleDeg);
}

/**
 * Position k of N equally spaced ones: `a₁ ± (k − 1)·360/N`, plus where numbers run against rotation.
 *
 * @param position k, 1 to `count`
 * @returns the rotor angle, or a failure where the position does not exist
 * Source: definition.
 * @example 4 of 7 numbered with rotation, number 1 at 10° → 215.71°
 */
export function angleOfPosition(
  position: number,
  ring: {
    readonly count: number;
    readonly firstDeg: number;
    readonly numbered: 'against' | 'with';
  },
): Result<RotorDeg> {
  if (!Number.isInteger(position) || position < 1 || position > ring.count)
    return fail(
      'no-position',
      `There is no position ${position} on this plane: they run from 1 to ${ring.count}. Choose one of them.`,
      'position',
    );
  const turn = ((position - 1) * 360) / ring.count;
  return ok(rotorDeg(ring.firstDeg + (ring.numbered === 'against' ? turn : -turn)));
}

/**
 * Angle of an arc along a rim, degrees: `(s/r)·180/π`, s and r in mm, s measured from the mark.
 *
 * @returns degrees in [0, 360), or a failure where the arc is longer than the rim or below zero
 * Source: definition of the radian. @example 512 mm along 400 mm → 73.34°
 */
export function angleOfArc(
  lengthMm: number,
  radiusMm: number,
  sense: 'against' | 'with' = 'against',
): Result<RotorDeg> {
  const around = 2 * Math.PI * radiusMm;
  if (!(radiusMm > 0) || !(lengthMm >= 0 && lengthMm <= around))
    return fail(
      'arc-range',
      `An arc of ${lengthMm} mm does not fit on a rim of ${radiusMm} mm radius, which is ${around.toFixed(0)} mm around. Measure again from the mark.`,
      'arcMm',
    );
  const deg = ((lengthMm / radiusMm) * 180) / Math.PI;
  return ok(rotorDeg(sense === 'against' ? deg : -deg));
}

/**
 * A clock reading with the mark parked on top as rotor angle: `(12 − h)·30` where the rotor is seen
 * turning clockwise, `h·30` where it is seen turning counter-clockwise.
 *
 * @param hours 0 to 12, with minutes as a fraction
 * Source: definition. Example: 10.8 (10:48) seen turning clockwise is 36°.
 */
export function angleOfClock(hours: number, seenTurning: Sense): Result<RotorDeg> {
  if (!(hours >= 0 && hours <= 12))
    return fail(
      'clock-range',
      `A clock reading runs from 0 to 12, and ${hours} lies outside. Read the clock again with the mark on top.`,
      'clock',
    );
  return ok(rotorDeg(seenTurning === 'cw' ? (12 - hours) * 30 : hours * 30));
}

/** What an instrument calls phase. */
export type PhaseReading = {
  readonly deg: number;
  readonly sense: 'lag' | 'lead';
  readonly to: 'positive peak' | 'negative peak' | 'positive-going zero crossing';
};

const TO_POSITIVE_PEAK: Readonly<Record<PhaseReading['to'], number>> = {
  'positive peak': 0,
  'negative peak': 180,
  'positive-going zero crossing': 90,
};

/**
 * A phase as an instrument gives it as lag to the positive peak, degrees: lead p is `360 − p`; to the
 * negative peak + 180; to the positive-going zero crossing + 90.
 * Source: definition. Example: a lead of 130° is a lag of 230°.
 */
export function lagFromPhase(phase: PhaseReading): LagDeg {
  const lag = phase.sense === 'lag' ? phase.deg : -phase.deg;
  return lagDeg(lag + TO_POSITIVE_PEAK[phase.to]);
}

/**
 * Readings taken before a change of the set-up as the set-up after it would have given them. A sensor
 * moved round the housing has no such rule: it needs a new set-up and new coefficients.
 */
export type SetUpChange =
  | { readonly kind: 'sensor turned over' }
  | { readonly kind: 'tacho moved with rotation'; readonly deg: number }
  | { readonly kind: 'mark moved against rotation'; readonly deg: number };

/**
 * A lag from before a change of the set-up, as lag after it: sensor turned over + 180; tacho moved d
 * in the direction of rotation − d; mark moved m against rotation − m.
 * Source: definition of lag. Example: 200° with the tacho moved 30° with rotation is 170°.
 */
export function lagAfterChange(lag: number, change: SetUpChange): LagDeg {
  return lagDeg(change.kind === 'sensor turned over' ? lag + 180 : lag - change.deg);
}

/**
 * A rotor angle from before a change of the set-up, as angle after it: only a moved mark changes it.
 * Source: definition. Example: 90° with the mark moved 25° against rotation is 65°.
 */
export function rotorDegAfterChange(angleDeg: number, change: SetUpChange): RotorDeg {
  return rotorDeg(change.kind === 'mark moved against rotation' ? angleDeg - change.deg : angleDeg);
}

function named(typed: number): string {
  return `${Number(normaliseDeg(typed).toFixed(2))}`;
}
