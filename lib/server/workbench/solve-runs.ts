import 'server-only';
import type { z } from 'zod';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { jobFromTypedRuns } from '@/lib/domain/balancing/typed-runs';
import { ok } from '@/lib/domain/result';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { typedRunsInput } from '@/lib/schemas/workbench-input';
import { answerDto } from '../balance-job/answer-dto';
import { computation } from '../computation';

const NAMES = ['1', '2'];

/** One or two planes from typed runs: what to fit where, or in words why there is no answer. */
export const solveRuns = computation(
  { permission: 'workbench:use', input: typedRunsInput },
  (typed) => {
    const job = jobFromTypedRuns({
      ...typed,
      planes: typed.planes.map((plane, index) => ({ ...plane, name: NAMES[index] ?? '' })),
      points: typed.planes.map((_, index) => `point ${NAMES[index] ?? ''}`),
      base: [typed.base],
      trials: typed.trials.map((trial) => ({ ...trial, stays: trial.stays === 'stays on' })),
      rotor: typed.rotorMassKg === null ? null : { massKg: typed.rotorMassKg },
    });
    if (!job.ok) return job;
    const solution = solveJob(job.value);
    return solution.ok ? ok(solvedRuns(typed, job.value, solution.value)) : solution;
  },
);

function solvedRuns(
  typed: z.output<typeof typedRunsInput>,
  job: JobInput,
  solution: JobSolution,
): SolvedRuns {
  return {
    unit: typed.unit,
    rotationFromDriveEnd: typed.rotationFromDriveEnd,
    planes: job.planes.map(({ id, name, radiusMm }) => ({ id, name, radiusMm })),
    points: job.points.map(({ id, label }) => ({ id, label })),
    answer: answerDto(job, solution, 'correction'),
    refusal: solution.answer ? null : (solution.withheld?.failure.message ?? null),
    staying: solution.weightsNow.map(({ planeId, massG, angleDeg }) => ({
      planeId,
      massG,
      angleDeg,
    })),
    walks: job.points.map((_, point) =>
      job.runs.flatMap(({ purpose, vectors }, index) => {
        const vector = vectors[point];
        const label = purpose === 'base' ? 'base' : `trial ${NAMES[index - 1] ?? ''}`;
        return vector ? [{ label, amplitude: vector.amplitude, lagDeg: vector.lagDeg }] : [];
      }),
    ),
  };
}
