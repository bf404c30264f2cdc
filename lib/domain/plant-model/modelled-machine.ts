import type { Complex } from '../complex';

/**
 * A rotor on two bearings: correction planes, measuring points, and what ails it. Invented machines
 * for the demo plant, built on the physics that the rest of the domain assumes.
 */
export type ModelledMachine = {
  readonly nominalSpeedRpm: number;
  readonly planes: readonly ModelledPlane[];
  readonly points: readonly ModelledPoint[];
  readonly faults: readonly Fault[];
};

/** A plane whose unbalance has a history. Angles against rotation from the mark. */
export type ModelledPlane = {
  readonly name: string;
  /** Unbalance on day 0, g·mm. */
  readonly startGmm: Complex;
  /** Steady drift, g·mm per day: wear or build-up. */
  readonly driftGmmPerDay: Complex;
  /** Sudden changes from their day on: a weight lost, build-up shed, a wheel cleaned. */
  readonly steps: readonly UnbalanceStep[];
};

/** A sudden change of unbalance; `resets` puts it in place of what was there, drift begun anew. */
export type UnbalanceStep = {
  readonly day: number;
  readonly gmm: Complex;
  readonly resets?: boolean;
};

/** A measuring point: a mode of the support in its direction answers the unbalance. */
export type ModelledPoint = {
  readonly name: string;
  readonly direction: 'H' | 'V' | 'A';
  /** Place of the sensor from the tacho in the direction of rotation, degrees. */
  readonly fromTachoDeg: number;
  readonly mode: SupportMode;
  /** Share of each plane's force that reaches the point, in the order of the planes. */
  readonly leverage: readonly number[];
  /** Size of what is not tied to the shaft speed, mm/s rms. */
  readonly broadBandRmsMmS: number;
};

/** One mode of rotor on support: where it resonates, how it is damped, what it moves. */
export type SupportMode = {
  readonly naturalSpeedRpm: number;
  readonly dampingRatio: number;
  readonly modalMassKg: number;
};

/** A fault beside unbalance; it grows in a straight line from `fromDay` over `growsOverDays`. */
export type Fault = {
  readonly fromDay: number;
  /** 0: there at once. */
  readonly growsOverDays: number;
} & (
  | { readonly kind: 'soft foot'; readonly horizontalRmsMmS: number; readonly lagDeg: number }
  | { readonly kind: 'misalignment'; readonly twiceRmsMmS: number; readonly axialRmsMmS: number }
  | {
      readonly kind: 'bearing defect';
      /** Point nearest to the bearing. */
      readonly point: string;
      /** Ball pass frequency of the ring as a multiple of the shaft speed. */
      readonly passOrder: number;
      /** Peak of one knock when fully grown, m/s². */
      readonly knockPeakMS2: number;
      /** Velocity the knocks leave in the band of the limits, mm/s rms. */
      readonly velocityRmsMmS: number;
    }
);
