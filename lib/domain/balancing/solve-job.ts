import { fail, ok, type Result } from '../result';
import type { AnswerTask } from './build-answer';
import { checkJobInput } from './check-job-input';
import { conditionOf } from './condition';
import { runName, type JobInput } from './job-input';
import { jobNotices } from './job-notices';
import { BALANCE_METHOD, type JobSolution } from './job-solution';

export type { JobSolution } from './job-solution';
import { offerAnswers } from './offer-answers';
import { predictRun, type PredictionBasis } from './predict-run';
import { readingNoise } from './reading-noise';
import { coefficientMatrix, pointVectors, responseModel } from './response-model';
import { speedEquality, type SpeedEquality } from './speed-equality';
import { toleranceEstimate } from './tolerance-estimate';
import { trialChecks } from './trial-checks';
import { runBlocks, stepEstimates, weightSteps, weightsKey, type RunBlock } from './weight-steps';

/**
 * The whole arithmetic of a balance job: one linear fit `V_k = V_free + H·u_k` over its runs with what was
 * on the rotor in each, the correction that minimises `‖W·(V_now + H·C)‖₂`, and what must come with it.
 * Units: readings in the job's unit, lag; weights in g, mm, degrees against rotation; r/min. Input angles
 * of any turn are accepted here, typed ones are checked by `parseAngle`.
 *
 * @returns the solution, or a failure in words where nothing can be computed: runs incomplete, speeds
 *   apart (> 1 %), a weight of no mass, a plane without trial, planes only ever changed together
 * Source: influence coefficients, textbooks; limits from practice.
 * @example S01, base 3.88/3.85/3.89 and 15 g at 0° → add 26.27 g at 36.1°
 */
export function solveJob(input: JobInput): Result<JobSolution> {
  const checked = checkJobInput(input);
  if (!checked.ok) return checked;
  const speed = speedEquality(input.runs);
  if (speed.verdict === 'hold') return speedFailure(input, speed);
  const model = responseModel(input, input.coefficientsFrom);
  if (!model.ok) return model;
  const blocks = runBlocks(input.runs, input.points);
  const noise = readingNoise(input, blocks);
  const state = stateNow(input, blocks, { model: model.value, noise });
  const basis = { model: model.value, noise, ...state };
  const task: AnswerTask = { input, basis, meanRpm: speed.meanRpm };
  const tolerance = toleranceEstimate(task);
  if (!tolerance.ok) return tolerance;
  const matrix = coefficientMatrix(model.value, input);
  const steps = weightSteps(blocks);
  const allRuns = responseModel(input, { kind: 'all runs' });
  const learned = {
    condition: conditionOf(matrix),
    trials: trialChecks(input, steps, { noise, model: model.value }),
  };
  const offer = offerAnswers(task, learned);
  if (!offer.ok) return offer;
  const solution = {
    method: BALANCE_METHOD,
    ...basis,
    allRuns: allRuns.ok ? allRuns.value : null,
    speed,
    ...learned,
    estimates: stepEstimates(steps, matrix, {
      planeIds: input.planes.map(({ id }) => id),
      points: input.points,
    }),
    ...offer.value,
    tolerance: tolerance.value,
  } as const;
  return ok({ ...solution, notices: jobNotices(input, solution) });
}

type State = Omit<PredictionBasis, 'model' | 'noise'> & Pick<JobSolution, 'nowFrom' | 'nowRunIds'>;

/** The newest block of runs with what is on now; where none ran so, what the model says of it. */
function stateNow(
  input: JobInput,
  blocks: readonly RunBlock[],
  known: Pick<PredictionBasis, 'model' | 'noise'>,
): State {
  const weightsNow = input.weightsNow ?? input.runs.at(-1)?.weights ?? [];
  const key = weightsKey(weightsNow);
  const block = blocks.findLast((candidate) => candidate.key === key);
  if (block)
    return {
      weightsNow,
      now: pointVectors(block.vectors, input.points),
      nowRuns: block.runs.length,
      nowFrom: 'measured',
      nowRunIds: block.runs.map(({ id }) => id),
    };
  const bare = { ...known, weightsNow: [], now: known.model.asFound, nowRuns: 1 };
  const now = predictRun(bare, input, weightsNow);
  return {
    weightsNow,
    now: now.map(({ pointId, amplitude, lagDeg }) => ({ pointId, amplitude, lagDeg })),
    nowRuns: 1,
    nowFrom: 'model',
    nowRunIds: [],
  };
}

function speedFailure(input: JobInput, speed: SpeedEquality): Result<never> {
  const run = input.runs.find(({ id }) => id === speed.worstRunId);
  return fail(
    'speed-differs',
    `The speed of ${run ? runName(run) : 'a run'} is ${speed.worstPct.toFixed(2)} % off the runs before it (limit 1 %), and size and lag change with speed. Repeat the run at the same speed, or let an engineer keep it.`,
    'runs',
  );
}
