import { fromPolar, size, subtract, ZERO } from '../complex';
import { fail, ok, type Result } from '../result';
import { buildAnswer, type PlaneAnswer } from './build-answer';
import { rootMeanSquare } from './influence-fit';
import type { FittedWeight, JobInput, JobRun } from './job-input';
import { missOf, predictRun, type Prediction, type PredictionBasis } from './predict-run';
import { slipHypotheses, type SlipHypothesis, type SlipInput } from './slip-hypotheses';
import { solveJob } from './solve-job';
import type { PolarUnbalance } from './weights-ledger';

/** Weights hang to 2° and 2 % or so: this share of their effect is no contradiction (practice). */
const FITTING_SHARE = 0.08;

/** How well one slip explains a check run. */
export type SlipTest = {
  readonly slip: SlipHypothesis['slip'];
  readonly words: string;
  /** rms over points of measured minus expected, were this slip what happened. */
  readonly miss: number;
  /** Within the band at every point; null where no band is known. */
  readonly inside: boolean | null;
  /** Were it so: the total from the runs before, and what to add after what the check run shows. */
  readonly total: readonly (PolarUnbalance & { readonly planeId: number })[];
  readonly add: readonly (PolarUnbalance & { readonly planeId: number })[];
};

/**
 * Recomputes a missed check run under the common slips and ranks them by miss, smallest first. A slip
 * that explains the run is a question to the person at the machine, never a correction by itself;
 * degrees counted with rotation and lead read as lag explain a run equally well.
 *
 * @returns the slips ranked, or a failure where the check run is not in the job or nothing can be solved
 * Source: linear model, one altered entry at a time.
 * @example S07 → 'angles counted with rotation' 0.08 mm/s, as entered 5.81
 */
export function slipTests(input: SlipInput): Result<SlipTest[]> {
  const at = input.job.runs.findIndex(({ id }) => id === input.checkRunId);
  const check = input.job.runs[at];
  if (!check)
    return fail('no-run', 'The check run is not part of this job. Choose a check run of the job.');
  const before = { ...input.job, runs: input.job.runs.slice(0, at) };
  const asEntered = { job: before, check, fitted: input.fitted };
  const tests: SlipTest[] = [];
  for (const hypothesis of slipHypotheses(before, input)) {
    const test = testOf(hypothesis, hypothesis.alter(asEntered));
    if (test.ok) tests.push(test.value);
    else if (hypothesis.slip === 'as entered') return test;
  }
  return ok(tests.sort((a, b) => a.miss - b.miss));
}

function testOf(
  { slip, words }: SlipHypothesis,
  story: {
    readonly job: JobInput;
    readonly check: JobRun;
    readonly fitted: readonly FittedWeight[];
  },
): Result<SlipTest> {
  const { job, check, fitted } = story;
  const others = check.weights;
  const solution = solveJob({ ...job, weightsNow: others });
  if (!solution.ok) return solution;
  const basis = solution.value;
  const predicted = predictRun(basis, job, [...others, ...fitted]);
  const misses = missOf(predicted.map(allowing(basis)), check.vectors);
  const kind = job.points.length === job.planes.length ? 'exact' : 'least squares';
  const task = { input: job, basis, meanRpm: basis.speed.meanRpm };
  const answer = buildAnswer(task, kind);
  if (!answer.ok) return answer;
  const hanging = { weightsNow: [...others, ...fitted], now: check.vectors, nowRuns: 1 };
  const more = buildAnswer({ ...task, basis: { ...basis, ...hanging } }, kind);
  if (!more.ok) return more;
  return ok({
    slip,
    words,
    miss: rootMeanSquare(misses.map(({ miss }) => miss)),
    inside: misses.some(({ inside }) => inside === null)
      ? null
      : misses.every(({ inside }) => inside),
    total: answer.value.total.map(unbalanceOnly),
    add: more.value.add.map(unbalanceOnly),
  });
}

/** The band with what no scatter of base readings shows: a weight hangs a little off, a large reading scatters more. */
function allowing({ now }: PredictionBasis): (point: Prediction) => Prediction {
  return (point) => {
    const before = now.find(({ pointId }) => pointId === point.pointId);
    const vector = fromPolar(point.amplitude, point.lagDeg);
    const effect = size(
      subtract(vector, before ? fromPolar(before.amplitude, before.lagDeg) : ZERO),
    );
    const band = point.band === null ? null : Math.hypot(point.band, FITTING_SHARE * effect);
    return { ...point, band };
  };
}

function unbalanceOnly({
  planeId,
  unbalanceGmm,
  angleDeg,
}: PlaneAnswer): PolarUnbalance & { readonly planeId: number } {
  return { planeId, unbalanceGmm, angleDeg };
}
