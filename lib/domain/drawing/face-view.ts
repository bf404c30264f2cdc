import { normaliseDeg } from '../units';

/** The way something turns as it is seen: clockwise or counter-clockwise. */
export type Sense = 'cw' | 'ccw';
/** The end a person stands at while looking at the rotor. */
export type ViewingEnd = 'drive-end' | 'other-end';

/** A place on a drawing, x to the right and y down, as SVG has it. */
export type Place = { readonly x: number; readonly y: number };

/**
 * The way the rotor turns as seen from the given end. Stored is the sense seen from the drive end;
 * walking round to the other end turns it over.
 *
 * Example: `senseSeenFrom('cw', 'other-end')` is `'ccw'`.
 * Source: definition.
 */
export function senseSeenFrom(rotationFromDriveEnd: Sense, end: ViewingEnd): Sense {
  if (end === 'drive-end') return rotationFromDriveEnd;
  return opposite(rotationFromDriveEnd);
}

/** The other way round. Example: `opposite('cw')` is `'ccw'`. */
export function opposite(sense: Sense): Sense {
  return sense === 'cw' ? 'ccw' : 'cw';
}

/** The end across. Example: `otherEnd('drive-end')` is `'other-end'`. */
export function otherEnd(end: ViewingEnd): ViewingEnd {
  return end === 'drive-end' ? 'other-end' : 'drive-end';
}

/**
 * Where a rotor angle (or a lag, which runs the same way) stands on a drawing with the mark on top:
 * degrees clockwise from the top, [0, 360). Angles count against rotation, so a rotor seen turning
 * clockwise has them counter-clockwise.
 *
 * Example: 90° against rotation on a rotor seen turning clockwise is `screenDeg(90, 'cw')` = 270, at nine o'clock.
 * Source: definition of the rotor angle.
 */
export function screenDeg(rotorAngleDeg: number, seenTurning: Sense): number {
  return normaliseDeg(seenTurning === 'cw' ? -rotorAngleDeg : rotorAngleDeg);
}

/**
 * The same place on a clock face, mark parked on top: hours in [0, 12).
 *
 * Example: 36.1° on a rotor seen turning clockwise is `clockHours(36.1, 'cw')` ≈ 10.80 (10:48).
 * Source: (12 − α/30) where the rotor is seen turning clockwise, α/30 otherwise.
 */
export function clockHours(rotorAngleDeg: number, seenTurning: Sense): number {
  return screenDeg(rotorAngleDeg, seenTurning) / 30;
}

/**
 * From polar to SVG: `degFromTop` degrees clockwise from straight up, at `radius` round `centre`.
 * Rounded to a thousandth, because sines differ in their last digit between JavaScript engines and a
 * server must draw exactly what the browser draws.
 *
 * Example: `polarPlace({ x: 0, y: 0 }, 10, 90)` is `{ x: 10, y: 0 }`.
 */
export function polarPlace(centre: Place, radius: number, degFromTop: number): Place {
  const angle = (degFromTop * Math.PI) / 180;
  return {
    x: thousandths(centre.x + radius * Math.sin(angle)),
    y: thousandths(centre.y - radius * Math.cos(angle)),
  };
}

function thousandths(value: number): number {
  return Math.round(value * 1000) / 1000 + 0;
}
