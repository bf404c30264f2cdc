import { clockHours, senseSeenFrom, type Sense, type ViewingEnd } from '../drawing/face-view';
import { arcMm, type NamedPosition } from '../drawing/rotor-place';
import { normaliseDeg, shortTurnDeg } from '../units';

/** A place on a correction plane and how it is looked at. */
export type PlaceToDescribe = {
  readonly angleDeg: number;
  readonly radiusMm: number;
  readonly positions?: readonly NamedPosition[];
  /** The way the rotor turns as seen from the drive end. */
  readonly rotationFromDriveEnd: Sense;
  readonly viewingEnd: ViewingEnd;
};

/** One place in several ways at once; all of them mean the same spot. */
export type PlaceWords = {
  readonly angleDeg: number;
  readonly withRotationDeg: number;
  /** Along the rim from the mark, going against rotation, mm. */
  readonly arcMm: number;
  /** Nearest named position; the offset runs against rotation from it, degrees. */
  readonly nearest: { readonly label: string; readonly offsetDeg: number } | null;
  /** Mark parked on top, seen from the viewing end: hours:minutes. */
  readonly clock: string;
  readonly seenTurning: Sense;
};

/**
 * A place on the rotor in degrees both ways, arc in mm, nearest position and clock, so that two people
 * can check each other.
 *
 * @param place angle in degrees against rotation from the mark, radius in mm
 * Source: definitions of the conversions.
 * @example 36.1° on 400 mm, seen turning clockwise → 252 mm, clock 10:48
 */
export function describePlace(place: PlaceToDescribe): PlaceWords {
  const angleDeg = normaliseDeg(place.angleDeg);
  const seenTurning = senseSeenFrom(place.rotationFromDriveEnd, place.viewingEnd);
  return {
    angleDeg,
    withRotationDeg: normaliseDeg(-angleDeg),
    arcMm: arcMm(angleDeg, place.radiusMm),
    nearest: nearestOf(angleDeg, place.positions ?? []),
    clock: clockText(clockHours(angleDeg, seenTurning)),
    seenTurning,
  };
}

/** Clock hours as people read them, to the minute. Example: 10.8 is "10:48"; 0 is "12:00". */
export function clockText(hours: number): string {
  const minutes = Math.round(hours * 60) % 720;
  const hour = Math.floor(minutes / 60);
  return `${hour === 0 ? 12 : hour}:${String(minutes % 60).padStart(2, '0')}`;
}

function nearestOf(angleDeg: number, positions: readonly NamedPosition[]): PlaceWords['nearest'] {
  const offsets = positions.map(({ label, angleDeg: at }) => ({
    label,
    offsetDeg: shortTurnDeg(at, angleDeg),
  }));
  const [first, ...rest] = offsets;
  if (!first) return null;
  return rest.reduce(
    (best, next) => (Math.abs(next.offsetDeg) < Math.abs(best.offsetDeg) ? next : best),
    first,
  );
}
