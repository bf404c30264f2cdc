import 'server-only';
import type { z } from 'zod';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { jobFromTypedRuns } from '@/lib/domain/balancing/typed-runs';
import { fail, ok, type Failure, type Result } from '@/lib/domain/result';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { typedRunsInput } from '@/lib/schemas/workbench-input';
import { answerDto } from '../balance-job/answer-dto';
import { trialCheckDtos } from '../balance-job/solution-dto';
import { computation } from '../computation';

type Typed = z.output<typeof typedRunsInput>;

const NAMES = ['1', '2'];

/** One or two planes from typed runs: what to fit where, or in words why there is no answer. */
export const solveRuns = computation(
  { permission: 'workbench:use', input: typedRunsInput },
  (typed) => {
    const job = jobOf(typed);
    if (!job.ok) return job;
    const solution = solveJob(job.value);
    return solution.ok ? ok(solvedRuns(typed, job.value, solution.value)) : solution;
  },
);

function jobOf(typed: Typed): Result<JobInput> {
  const job = jobFromTypedRuns({
    ...typed,
    planes: typed.planes.map((plane, index) => ({ ...plane, name: NAMES[index] ?? '' })),
    points: typed.planes.map((_, index) => `point ${NAMES[index] ?? ''}`),
    base: [typed.base],
    trials: typed.trials.map((trial) => ({ ...trial, stays: trial.stays === 'stays on' })),
    rotor: typed.rotorMassKg === null ? null : { massKg: typed.rotorMassKg },
  });
  if (!job.ok) return atTypedField(job.failure);
  const runs = job.value.runs.map((run, index) => ({
    ...run,
    label: index === 0 ? 'the base run' : `the trial run in plane ${NAMES[index - 1] ?? ''}`,
  }));
  return ok({ ...job.value, runs });
}

/** The base run is typed once, so its readings stand at “base.0”, not at “base.0.0”. */
function atTypedField({ code, message, field }: Failure): Result<never> {
  return fail(code, message, field?.replace(/^base\.0\./, 'base.'));
}

function solvedRuns(typed: Typed, job: JobInput, solution: JobSolution): SolvedRuns {
  const refusal = refusalOf(job, solution);
  return {
    unit: typed.unit,
    rotationFromDriveEnd: typed.rotationFromDriveEnd,
    angleSense: typed.angleSense,
    planes: job.planes.map(({ id, name, radiusMm }) => ({ id, name, radiusMm })),
    points: job.points.map(({ id, label }) => ({ id, label })),
    answer: refusal === null ? answerDto(job, solution, 'correction') : null,
    refusal,
    trialChecks: trialCheckDtos(job, solution),
    forcePctOfRotorWeight: (solution.answer?.add ?? []).map((plane) => plane.forcePctOfRotorWeight),
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

/** Planes that act alike get no weights here: typed runs are then mostly the same run typed twice. */
function refusalOf({ planes }: JobInput, { answer, withheld }: JobSolution): string | null {
  if (withheld?.failure.code === 'planes-indistinguishable') {
    const names = planes.map(({ name }) => name).join(' and ');
    return `The trial runs of planes ${names} changed every point alike, so the planes cannot be told apart. Check that each run was typed with its own readings; otherwise choose planes further apart or another point.`;
  }
  return answer ? null : (withheld?.failure.message ?? null);
}
