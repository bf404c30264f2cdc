import type { Failure } from '../result';
import type { Answer } from './build-answer';
import type { Condition } from './condition';
import type { FittedWeight, PointVector } from './job-input';
import type { PointNoise } from './reading-noise';
import type { ResponseModel } from './response-model';
import type { SpeedEquality } from './speed-equality';
import type { ToleranceEstimate } from './tolerance-estimate';
import type { TrialCheck } from './trial-checks';
import type { StepEstimate } from './weight-steps';

/** Method and version that results name, so that an old answer can be recomputed. */
export const BALANCE_METHOD = 'influence-fit/1';

/** All that follows from the runs of a balance job; plain numbers and texts only. */
export type JobSolution = {
  readonly method: typeof BALANCE_METHOD;
  readonly model: ResponseModel;
  /** The fit over all runs beside the model in use; null where it cannot be made. */
  readonly allRuns: ResponseModel | null;
  readonly weightsNow: readonly FittedWeight[];
  readonly now: readonly PointVector[];
  /** Whether `now` was measured with these weights on, in which runs; or follows from the model. */
  readonly nowFrom: 'measured' | 'model';
  readonly nowRunIds: readonly number[];
  readonly nowRuns: number;
  readonly noise: readonly PointNoise[];
  readonly speed: SpeedEquality;
  readonly condition: Condition;
  readonly trials: readonly TrialCheck[];
  readonly estimates: readonly StepEstimate[];
  /** What to fit; null where nothing can be answered for. */
  readonly answer: Answer | null;
  readonly alternatives: readonly Answer[];
  /** Why the exact answer is not offered; `answer` is the one withheld, for an engineer to accept. */
  readonly withheld: { readonly failure: Failure; readonly answer: Answer | null } | null;
  readonly tolerance: ToleranceEstimate | null;
  readonly notices: readonly JobNotice[];
};

/** Something a person must see beside an answer. */
export type JobNotice = {
  readonly code:
    | 'speed'
    | 'no-repeats'
    | 'repeats-scatter'
    | 'trial-wide'
    | 'trial-weak'
    | 'trial-large'
    | 'trial-heavy'
    | 'condition'
    | 'opposing-weights'
    | 'plane-limit'
    | 'misfit'
    | 'estimate-differs'
    | 'now-from-model'
    | 'point-rises';
  readonly message: string;
};
