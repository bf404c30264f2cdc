import type { FittedWeight, JobInput, JobRun } from '@/lib/domain/balancing/job-input';
import type { Result } from '@/lib/domain/result';

export type Polar = { amp: number; deg: number };

/** The value of a result that a test expects to be there. */
export function valueOf<Value>(result: Result<Value>): Value {
  if (!result.ok) throw new Error(`${result.failure.code}: ${result.failure.message}`);
  return result.value;
}

/** The code of a failure that a test expects. */
export function codeOf(result: Result<unknown>): string {
  return result.ok ? 'ok' : result.failure.code;
}

/** A weight in plane `planeId`: grams at a radius, degrees against rotation. */
export function weight(
  planeId: number,
  massG: number,
  radiusMm: number,
  angleDeg: number,
): FittedWeight {
  return { planeId, massG, radiusMm, angleDeg };
}

/** A run with one reading per point, points numbered from 1. */
export function run(
  id: number,
  purpose: JobRun['purpose'],
  readings: readonly Polar[],
  weights: readonly FittedWeight[] = [],
  speedRpm = 1480,
): JobRun {
  const vectors = readings.map(({ amp, deg }, i) => ({
    pointId: i + 1,
    amplitude: amp,
    lagDeg: deg,
  }));
  return { id, purpose, speedRpm, vectors, weights };
}

/** A job with planes and points numbered from 1. */
export function job(
  radiiMm: readonly number[],
  points: number,
  runs: readonly JobRun[],
  over: Partial<JobInput> = {},
): JobInput {
  return {
    unit: 'mm/s rms',
    planes: radiiMm.map((radiusMm, i) => ({ id: i + 1, name: `P${i + 1}`, radiusMm })),
    points: Array.from({ length: points }, (_, i) => ({ id: i + 1, label: `Q${i + 1}` })),
    runs,
    ...over,
  };
}
