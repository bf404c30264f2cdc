import 'server-only';
import type { Answer } from '@/entities/answer';
import type { Run } from '@/entities/balance-job';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { CheckVerdict } from '@/lib/schemas/balance-job';
import { fittedWeights, jobInput } from './job-input';
import type { LoadedJob, LoadedRun } from './load-job';

type Predicted = ReturnType<typeof predictRun>;
type Misses = ReturnType<typeof missOf>;

/** The newest check run beside the first base run and beside what its answer predicted. */
export function checkVerdict(loaded: LoadedJob): CheckVerdict | null {
  const check = loaded.runs.findLast(
    ({ run }) => run.purpose === 'check' && run.state !== 'lined through',
  );
  const base = loaded.runs.find(({ run }) => run.purpose === 'base' && run.state === 'kept');
  if (!check || !base) return null;
  const predicted = predictedFor(loaded, check);
  const misses = predicted ? missOf(predicted, vectorsOf(check)) : [];
  const points = loaded.points.flatMap((point) => {
    const now = vectorAt(check, point.id);
    const before = vectorAt(base, point.id);
    if (!now || !before) return [];
    return {
      pointId: point.id,
      label: point.label,
      before: before.amplitude,
      now: now.amplitude,
      lagDeg: now.lagDeg,
      ...expectation(predicted, misses, point.id),
      reductionPct: before.amplitude > 0 ? 100 * (1 - now.amplitude / before.amplitude) : 0,
    };
  });
  return { runId: check.run.id, points };
}

function vectorAt({ vectors }: LoadedRun, pointId: number) {
  return vectors.find((vector) => vector.point.id === pointId);
}

function expectation(predicted: Predicted | null, misses: Misses, pointId: number) {
  const expected = predicted?.find((point) => point.pointId === pointId);
  if (!expected) return { predicted: null, miss: null, band: null };
  const { amplitude, lagDeg, band } = expected;
  const miss = misses.find((point) => point.pointId === pointId)?.miss ?? null;
  return { predicted: { amplitude, lagDeg }, miss, band };
}

/** What the answer before this run said about the weights that were really on. */
function predictedFor(loaded: LoadedJob, { run }: LoadedRun): Predicted | null {
  const answer = loaded.answers.findLast(({ afterRunNumber }) => afterRunNumber < run.number);
  if (!answer) return null;
  const input = inputsOf(loaded, answer, run);
  const solution = solveJob(input);
  if (!solution.ok) return null;
  return predictRun(solution.value, input, fittedWeights(run.weightsState));
}

/** Where runs behind the answer were corrected since, the prediction follows from the corrected ones. */
function inputsOf(loaded: LoadedJob, answer: Answer, check: Run): JobInput {
  const corrected = loaded.runs.some(
    ({ run }) => run.replaces && run.purpose !== 'check' && run.createdAt > answer.acceptedAt,
  );
  if (!corrected) return answer.inputs;
  const before = loaded.runs.filter(({ run }) => run.takenAt < check.takenAt);
  return jobInput({ ...loaded, runs: before }, before.at(-1)?.run.weightsState ?? []);
}

function vectorsOf({ vectors }: LoadedRun) {
  return vectors.map(({ point, amplitude, lagDeg }) => ({
    pointId: point.id,
    amplitude,
    lagDeg,
  }));
}
