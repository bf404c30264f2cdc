import { ok, type Result } from '../result';
import { lagFromPhase, parseAngle, rotorDegFromWithRotation } from './convert-angle';
import type { FittedWeight, JobInput, JobRotor, JobRun, PointVector } from './job-input';

/** A reading as typed: size in the unit of the whole, phase in the sense of the whole. */
export type TypedReading = { readonly amplitude: number; readonly phaseDeg: number };

/** Runs typed on one page, nothing kept: one or two planes, base and trials in order. */
export type TypedRuns = {
  readonly unit: JobInput['unit'];
  readonly phaseSense: 'lag' | 'lead';
  readonly angleSense: 'against' | 'with';
  readonly speedRpm: number;
  readonly planes: readonly { readonly name: string; readonly radiusMm: number }[];
  readonly points: readonly string[];
  /** One reading per point; repeats of the base run one after the other. */
  readonly base: readonly (readonly TypedReading[])[];
  /** One trial per plane, in the order of the planes. */
  readonly trials: readonly {
    readonly massG: number;
    readonly radiusMm: number;
    readonly angleDeg: number;
    readonly stays: boolean;
    readonly readings: readonly TypedReading[];
  }[];
  readonly rotor?: JobRotor | null;
  /** Known scatter of one reading in the unit of the whole, where no run was repeated. */
  readonly scatter?: number | null;
};

/**
 * Typed runs as input of `solveJob`: senses converted once, each trial run with its own weight and those
 * that stayed on before it. Planes and points are numbered from 1, runs too.
 *
 * @returns the job, or the failure of the first angle outside 0 to 360 with its field
 * @example one plane, base and one trial that came off → two runs, nothing on the rotor now
 * Source: definition.
 */
export function jobFromTypedRuns(typed: TypedRuns): Result<JobInput> {
  const runs: JobRun[] = [];
  let on: FittedWeight[] = [];
  for (const [i, readings] of typed.base.entries()) {
    const vectors = vectorsOf(typed, readings, `base.${i}`);
    if (!vectors.ok) return vectors;
    runs.push(runOf(typed, { purpose: 'base', vectors: vectors.value, weights: [] }, runs.length));
  }
  for (const [i, trial] of typed.trials.entries()) {
    const vectors = vectorsOf(typed, trial.readings, `trials.${i}.readings`);
    if (!vectors.ok) return vectors;
    const angle = parseAngle(trial.angleDeg, `trials.${i}.angleDeg`);
    if (!angle.ok) return angle;
    const weight = {
      planeId: i + 1,
      massG: trial.massG,
      radiusMm: trial.radiusMm,
      angleDeg: typed.angleSense === 'with' ? rotorDegFromWithRotation(angle.value) : angle.value,
    };
    const weights = [...on, weight];
    runs.push(runOf(typed, { purpose: 'trial', vectors: vectors.value, weights }, runs.length));
    if (trial.stays) on = weights;
  }
  return ok({
    unit: typed.unit,
    planes: typed.planes.map((plane, i) => ({ id: i + 1, ...plane })),
    points: typed.points.map((label, i) => ({ id: i + 1, label })),
    runs,
    weightsNow: on,
    rotor: typed.rotor ?? null,
    scatter: typed.scatter ?? null,
  });
}

function vectorsOf(
  typed: TypedRuns,
  readings: readonly TypedReading[],
  field: string,
): Result<PointVector[]> {
  const vectors: PointVector[] = [];
  for (const [i, { amplitude, phaseDeg }] of readings.entries()) {
    const angle = parseAngle(phaseDeg, `${field}.${i}.phaseDeg`);
    if (!angle.ok) return angle;
    const lag = lagFromPhase({ deg: angle.value, sense: typed.phaseSense, to: 'positive peak' });
    vectors.push({ pointId: i + 1, amplitude, lagDeg: lag });
  }
  return ok(vectors);
}

function runOf(
  { speedRpm }: TypedRuns,
  run: Pick<JobRun, 'purpose' | 'vectors' | 'weights'>,
  before: number,
): JobRun {
  return { id: before + 1, label: `run ${before + 1}`, speedRpm, ...run };
}
