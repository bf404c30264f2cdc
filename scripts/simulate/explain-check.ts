import type { FittedWeight, JobInput, JobRun } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { slipHypotheses } from '@/lib/domain/balancing/slip-hypotheses';
import { slipTests, type SlipTest } from '@/lib/domain/balancing/slip-tests';

/** Without a known band a miss counts from this share of the base reading up, as on the screens. */
const MISSED_SHARE_OF_BASE = 0.2;

/** What the best slip says of a job: its entries put right, what is on the rotor, what to add. */
export type Explanation = {
  readonly slip: SlipTest['slip'];
  readonly job: JobInput;
  readonly on: FittedWeight[];
  readonly add: SlipTest['add'];
};

/** Whether a check run was not as the answer predicted. */
export function isMissed(input: JobInput, solution: JobSolution, check: JobRun): boolean {
  const base = input.runs[0]?.vectors ?? [];
  const predicted = predictRun(solution, input, check.weights);
  return missOf(predicted, check.vectors).some(({ pointId, miss }) => {
    const band = predicted.find((point) => point.pointId === pointId)?.band ?? null;
    const before = base.find((point) => point.pointId === pointId)?.amplitude ?? 0;
    return miss > (band ?? MISSED_SHARE_OF_BASE * before);
  });
}

/** The best slip where it explains the check run within the band, with the entries put right; or null. */
export function explanationOf(
  input: JobInput,
  check: JobRun,
  fitted: readonly FittedWeight[],
): Explanation | null {
  const asked = { job: input, checkRunId: check.id, fitted };
  const tests = slipTests(asked);
  const best = tests.ok ? tests.value[0] : undefined;
  if (!best || best.slip === 'as entered' || best.inside !== true) return null;
  const at = input.runs.findIndex(({ id }) => id === check.id);
  const before = { ...input, runs: input.runs.slice(0, at) };
  const hypothesis = slipHypotheses(before, asked).find(({ words }) => words === best.words);
  const story = hypothesis?.alter({ job: before, check, fitted });
  if (!story) return null;
  const on = [...story.check.weights, ...story.fitted];
  const runs = [...story.job.runs, { ...story.check, weights: on }];
  return { slip: best.slip, job: { ...story.job, runs }, on, add: best.add };
}
