import 'server-only';
import type { WeightOnRotor } from '@/entities/balance-job';
import type { JobKind } from '@/lib/domain/balance-job/job-kinds';
import type {
  CoefficientSource,
  FittedWeight,
  JobInput,
  JobRun,
} from '@/lib/domain/balancing/job-input';
import type { LoadedJob, LoadedRun } from './load-job';
import { changedOnRotor } from './weights-on-rotor';

/** What the arithmetic needs of a job: its kept runs, and what hangs on the rotor now. */
export function jobInput(
  loaded: LoadedJob,
  on: readonly WeightOnRotor[] = changedOnRotor(loaded),
): JobInput {
  const { job, planes, points } = loaded;
  const kept = loaded.runs.filter(({ run }) => run.state === 'kept');
  return {
    unit: job.unit,
    planes: planes.map(({ id, name, radiusMm, fromAM }) => ({
      ...{ id, name, radiusMm, fromAM },
      roomG: loaded.roomG.get(id) ?? null,
    })),
    points: points.map(({ id, label }) => ({ id, label })),
    runs: kept.map(jobRun),
    weightsNow: fittedWeights(on),
    coefficientsFrom: coefficientSource(loaded),
    rotor: jobRotor(loaded),
    only: ONLY[job.kind] ?? null,
  };
}

const ONLY: Partial<Record<JobKind, 'static' | 'couple'>> = {
  'static only': 'static',
  'couple only': 'couple',
};

/** A job that gave up the coefficient book after its first check run learns from all its own runs. */
function coefficientSource({ reuse, answers }: LoadedJob): CoefficientSource {
  const begun = answers[0]?.inputs.coefficientsFrom?.kind === 'stored';
  if (!reuse) return { kind: begun ? 'all runs' : 'learning runs' };
  const { speedRpm, coefficients } = reuse;
  return { kind: 'stored', speedRpm, coefficients };
}

/** What has changed on the rotor since the job began, as the arithmetic takes it. */
export function weightsNow(loaded: LoadedJob): FittedWeight[] {
  return fittedWeights(changedOnRotor(loaded));
}

/** Weights of a run's snapshot, as the arithmetic takes them. */
export function fittedWeights(state: readonly WeightOnRotor[]): FittedWeight[] {
  return state.map(({ planeId, massG, radiusMm, angleDeg }) => ({
    planeId,
    massG,
    radiusMm,
    angleDeg,
  }));
}

function jobRun({ run, vectors }: LoadedRun): JobRun {
  return {
    id: run.id,
    label: `run ${run.number}`,
    purpose: run.purpose,
    speedRpm: run.speedRpm,
    // A kept run with a reason was held first and kept by an engineer.
    speedAccepted: Boolean(run.stateReason),
    vectors: vectors.map(({ point, amplitude, lagDeg }) => ({
      pointId: point.id,
      amplitude,
      lagDeg,
    })),
    weights: fittedWeights(run.weightsState),
  };
}

function jobRotor({ job }: LoadedJob): JobInput['rotor'] {
  const rotor = job.rotor.$;
  if (!rotor.massKg) return null;
  return {
    massKg: rotor.massKg,
    balanceGrade: rotor.balanceGrade,
    serviceSpeedRpm: job.machine.$.nominalSpeedRpm,
    arrangement: rotor.overhung ? 'overhung' : 'inboard',
    tolerancePlanesApartM: rotor.bearingSpanM,
    massCentreFromAM: rotor.centreOfMassFromAM,
  };
}
