import type { Sense, ViewingEnd } from '@/lib/domain/drawing/face-view';
import type { NamedPosition } from '@/lib/domain/drawing/rotor-place';
import type { DecimalMark } from '@/lib/format';

/** The plane that is drawn. */
export type FacePlane = {
  /** “Plane L”. */
  name: string;
  radiusMm: number;
  /** How the rotor turns, seen from the drive end. */
  rotationFromDriveEnd: Sense;
  /** Numbered places that can take a weight; left out where the rim is free. */
  positions?: readonly NamedPosition[];
  /** What the mark is: “white paint”, “keyway”. */
  markLabel?: string;
  /** Of the site; a point where left out. */
  decimalMark?: DecimalMark;
};

/** On the rotor now; hung on to learn; the answer; taken off again. */
export type WeightState = 'on' | 'trial' | 'proposed' | 'removed';

export type FaceWeight = {
  id: number | string;
  massG: number;
  /** Degrees against rotation from the mark. */
  angleDeg: number;
  /** Short: when or what: “fitted 14 Feb”. */
  label?: string;
  state: WeightState;
};

/** The 1x readings of one point, in the order they were taken. */
export type FaceReadings = {
  /** “mm/s rms”. */
  unit: string;
  /** “bearing A horizontal”. */
  point: string;
  /** How the site reads phase; lag where left out. */
  phaseShown?: 'lag' | 'lead';
  vectors: readonly FaceVector[];
};

export type FaceVector = {
  /** “base”, “trial L”, “check”. */
  label: string;
  amplitude: number;
  lagDeg: number;
};

export const STATE_WORDS: Readonly<Record<WeightState, string>> = {
  on: 'on the rotor',
  trial: 'trial weight',
  proposed: 'proposed',
  removed: 'taken off',
};

export type { Sense, ViewingEnd };
