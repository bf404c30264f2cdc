import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import { Answer } from '@/entities/answer';
import { JobPlane, JobPoint, Run, RunVector, type BalanceJob } from '@/entities/balance-job';
import { CoefficientReuse } from '@/entities/coefficient-reuse';
import type { Point } from '@/entities/bearing';
import type { Plane } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { nextStep, type Step } from '@/lib/domain/balance-job/next-step';

export type VisibleJob = Loaded<BalanceJob, 'machine' | 'rotor' | 'setup' | 'site'>;

export type LoadedWeight = Loaded<Weight, 'plane' | 'position' | 'fittedBy' | 'endedBy'>;

export type LoadedRun = { run: Run; vectors: RunVector[] };

/** A job with everything its arithmetic and its order of work depend on. */
export type LoadedJob = {
  job: VisibleJob;
  planes: Plane[];
  points: Loaded<Point, 'bearing'>[];
  runs: LoadedRun[];
  /** Every weight fitted in this job, ended ones too, in the order fitted. */
  weights: LoadedWeight[];
  /** Older weights that came off after the first run: the arithmetic counts them. */
  removed: LoadedWeight[];
  /** Older weights that came off, or were found gone, before the first run: every run was without them. */
  goneBefore: LoadedWeight[];
  /** Mass that each plane may still carry beside all that hangs there now, g; null without a limit. */
  roomG: ReadonlyMap<number, number | null>;
  answers: Answer[];
  /** Coefficients of the book used instead of trial runs; null where there are none. */
  reuse: CoefficientReuse | null;
  step: Step;
};

/** Loads what hangs on a job, in a fixed number of statements. */
export async function loadJob(em: EntityManager, job: VisibleJob): Promise<LoadedJob> {
  const order = { orderBy: { order: 'asc' } } as const;
  const planes = await em.find(JobPlane, { job: job.id }, { ...order, populate: ['plane'] });
  const points = await em.find(
    JobPoint,
    { job: job.id },
    { ...order, populate: ['point.bearing'] },
  );
  const runs = await em.find(Run, { job: job.id }, { orderBy: { number: 'asc' } });
  const vectors = await em.find(RunVector, { run: { job: job.id } }, { orderBy: { id: 'asc' } });
  const weights = await em.find(
    Weight,
    { job: job.id },
    { orderBy: { id: 'asc' }, populate: ['plane', 'position', 'fittedBy', 'endedBy'] },
  );
  const ended = await em.find(
    Weight,
    { endedInJob: job.id },
    { orderBy: { id: 'asc' }, populate: ['plane', 'position', 'fittedBy', 'endedBy'] },
  );
  const answers = await em.find(Answer, { job: job.id }, { orderBy: { number: 'asc' } });
  const onRotor = await em.find(Weight, { rotor: job.rotor.id, endedAt: null });
  const reuse = await em.findOne(CoefficientReuse, { job: job.id, withdrawnAt: null });
  const loaded = {
    job,
    planes: planes.map(({ plane }) => plane.$),
    points: points.map(({ point }) => point.$),
    runs: runs.map((run) => ({ run, vectors: vectors.filter((v) => v.run.id === run.id) })),
    weights,
    removed: ended.filter(({ endedAt }) => isAfterFirst(runs, endedAt)),
    goneBefore: ended.filter(({ endedAt }) => !isAfterFirst(runs, endedAt)),
    roomG: new Map(planes.map(({ plane }) => [plane.id, roomOf(plane.$, onRotor)])),
    answers,
    reuse,
  };
  return { ...loaded, step: stepOf(loaded) };
}

function roomOf({ id, maxGTotal }: Plane, onRotor: readonly Weight[]): number | null {
  if (!maxGTotal) return null;
  const hung = onRotor.filter(({ plane }) => plane.id === id);
  return Math.max(0, maxGTotal - hung.reduce((total, { massG }) => total + massG, 0));
}

function isAfterFirst([first]: readonly Run[], endedAt: Date | null | undefined): boolean {
  return Boolean(first && endedAt && endedAt > first.takenAt);
}

function stepOf(loaded: Omit<LoadedJob, 'step'>): Step {
  const newest = loaded.answers.at(-1);
  return nextStep({
    state: loaded.job.state,
    planeIds: loaded.planes.map((plane) => plane.id),
    runs: loaded.runs.map(({ run }) => ({
      number: run.number,
      purpose: run.purpose,
      state: run.state,
      weightIds: run.weightsState.map((weight) => weight.weightId),
    })),
    weights: [
      ...loaded.weights.map((weight) => ({
        id: weight.id,
        planeId: weight.plane.id,
        purpose: weight.purpose,
        on: weight.endedAt === null,
        stays: weight.stays ?? null,
        answerNumber: weight.answerNumber ?? null,
      })),
      ...loaded.removed.map((weight) => takenOff(weight, loaded.answers)),
    ],
    answerNumber: newest?.number ?? null,
    answerAfterRun: newest?.afterRunNumber ?? null,
    reusesBook: loaded.reuse !== null,
    checkOnly: loaded.job.kind === 'check only',
  });
}

/** An older weight that came off is a correction of the answer that stood then. */
function takenOff(weight: Weight, answers: readonly Answer[]) {
  const { endedAt } = weight;
  const before = answers.findLast(({ acceptedAt }) => endedAt && acceptedAt <= endedAt);
  return {
    id: weight.id,
    planeId: weight.plane.id,
    purpose: 'correction' as const,
    on: true,
    stays: null,
    answerNumber: before?.number ?? null,
  };
}
