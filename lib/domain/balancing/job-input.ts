/** A correction plane of the job. `fromAM`: axial place from tolerance plane A, m. */
export type JobPlane = {
  readonly id: number;
  readonly name: string;
  readonly radiusMm: number;
  readonly fromAM?: number | null;
  /** Mass that may still be hung there, g at this radius; null or left out: no limit. */
  readonly roomG?: number | null;
};

/** A measuring point. `weight` says how much it counts in the answer (1 unless said otherwise). */
export type JobPoint = { readonly id: number; readonly label: string; readonly weight?: number };

/** The 1x component at a point: size in the job's unit, phase as lag in degrees. */
export type PointVector = {
  readonly pointId: number;
  readonly amplitude: number;
  readonly lagDeg: number;
};

/** A weight on the rotor: grams at a radius, angle in degrees against rotation from the mark. */
export type FittedWeight = {
  readonly planeId: number;
  readonly massG: number;
  readonly radiusMm: number;
  readonly angleDeg: number;
};

/** A run and everything fitted since the job began that was on the rotor while it ran. */
export type JobRun = {
  readonly id: number;
  readonly label?: string;
  readonly purpose: 'base' | 'trial' | 'check' | 'trim';
  readonly speedRpm: number;
  /** An engineer kept this run although its speed is off. */
  readonly speedAccepted?: boolean;
  readonly vectors: readonly PointVector[];
  readonly weights: readonly FittedWeight[];
};

/** One influence coefficient, per g·mm; `spreadPerGmm`: rms distance of the estimates (n − 1). */
export type StoredCoefficient = {
  readonly planeId: number;
  readonly pointId: number;
  readonly rePerGmm: number;
  readonly imPerGmm: number;
  readonly spreadPerGmm?: number | null;
};

/** Where the coefficients of the answer come from. */
export type CoefficientSource =
  /** The base and trial runs: first answer and trims use the same coefficients. */
  | { readonly kind: 'learning runs' }
  | { readonly kind: 'all runs' }
  | { readonly kind: 'chosen runs'; readonly runIds: readonly number[] }
  | {
      readonly kind: 'stored';
      readonly speedRpm: number;
      readonly coefficients: readonly StoredCoefficient[];
    };

/** What the tolerance estimate needs. Places along the axis in m from tolerance plane A. */
export type JobRotor = {
  readonly massKg: number;
  /** Balance quality grade G, mm/s; null where no grade is asked for. */
  readonly balanceGrade?: number | null;
  /** Highest service speed; the mean speed of the runs where it is not given. */
  readonly serviceSpeedRpm?: number | null;
  readonly arrangement?: 'inboard' | 'overhung';
  readonly tolerancePlanesApartM?: number | null;
  readonly massCentreFromAM?: number | null;
};

/** Everything an answer depends on. */
export type JobInput = {
  readonly unit: 'mm/s rms' | 'µm p-p';
  readonly planes: readonly JobPlane[];
  readonly points: readonly JobPoint[];
  /** In the order they were made. */
  readonly runs: readonly JobRun[];
  /** What is on the rotor now of all that was fitted since the job began; the last run's unless given. */
  readonly weightsNow?: readonly FittedWeight[];
  readonly coefficientsFrom?: CoefficientSource;
  /** Known scatter of one reading in the job's unit, used where no run was repeated. */
  readonly scatter?: number | null;
  readonly rotor?: JobRotor | null;
  /** With two planes: correct only the static or only the couple part. */
  readonly only?: 'static' | 'couple' | null;
};

/** What a run is called in a sentence. */
export function runName(run: Pick<JobRun, 'id' | 'label'>): string {
  return run.label ?? `run ${run.id}`;
}
