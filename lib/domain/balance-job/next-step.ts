/** A run as far as the order of work looks at it. */
export type StepRun = {
  readonly number: number;
  readonly purpose: 'base' | 'trial' | 'check';
  readonly state: 'kept' | 'held' | 'lined through';
  /** Ids of the job's weights that were on the rotor. */
  readonly weightIds: readonly number[];
};

/** A weight fitted in the job, as far as the order of work looks at it. */
export type StepWeight = {
  readonly id: number;
  readonly planeId: number;
  readonly purpose: 'trial' | 'correction' | 'found';
  readonly on: boolean;
  /** What was said of a trial weight after its run; null until somebody has said. */
  readonly stays: boolean | null;
  /** Number of the answer this weight belongs to; null for trials. */
  readonly answerNumber: number | null;
};

/** All that the order of work depends on. */
export type StepJob = {
  readonly state:
    'opened' | 'base taken' | 'answered' | 'signed' | 'stopped safe' | 'not a balance job';
  readonly planeIds: readonly number[];
  readonly runs: readonly StepRun[];
  readonly weights: readonly StepWeight[];
  readonly answerNumber: number | null;
  /** Number of the last run that stood when the newest answer was accepted. */
  readonly answerAfterRun: number | null;
  /** Coefficients of the book are used instead of trial runs. */
  readonly reusesBook: boolean;
  /** Nothing is hung: the base runs are all there is. */
  readonly checkOnly: boolean;
};

/** What comes next on the run sheet. */
export type Step =
  | { readonly step: 'base' }
  | { readonly step: 'fit trial'; readonly planeId: number }
  | { readonly step: 'trial run'; readonly weightId: number; readonly planeId: number }
  | { readonly step: 'settle trial'; readonly weightId: number; readonly planeId: number }
  | { readonly step: 'answer' }
  | { readonly step: 'fit correction'; readonly planeIds: readonly number[] }
  | { readonly step: 'decide' }
  | { readonly step: 'closed' };

/**
 * The next step of a balance job in the order the trade expects: base, then per plane trial weight,
 * trial run and the question whether the weight stays, then answer, fit, check, and trim or sign. With
 * coefficients from the book the trials are left out.
 * Source: common practice (no single published source).
 * Example: a job with an accepted base and no weights gives `{ step: 'fit trial', planeId }`.
 */
export function nextStep(job: StepJob): Step {
  if (job.state === 'opened') return { step: 'base' };
  if (job.state === 'base taken') return job.checkOnly ? { step: 'decide' } : learningStep(job);
  if (job.state === 'answered') return correctingStep(job);
  return { step: 'closed' };
}

function learningStep(job: StepJob): Step {
  const unsettled = job.weights.find((w) => w.purpose === 'trial' && w.on && w.stays === null);
  if (unsettled) {
    const { id: weightId, planeId } = unsettled;
    return wasRun(job, weightId)
      ? { step: 'settle trial', weightId, planeId }
      : { step: 'trial run', weightId, planeId };
  }
  const open = job.reusesBook
    ? undefined
    : job.planeIds.find((planeId) => !planeLearned(job, planeId));
  return open === undefined ? { step: 'answer' } : { step: 'fit trial', planeId: open };
}

function correctingStep(job: StepJob): Step {
  const after = job.answerAfterRun ?? 0;
  const checked = job.runs.some(
    (run) => run.purpose === 'check' && run.state !== 'lined through' && run.number > after,
  );
  if (checked) return { step: 'decide' };
  const fitted = new Set(
    job.weights
      .filter((w) => w.purpose === 'correction' && w.answerNumber === job.answerNumber && w.on)
      .map((w) => w.planeId),
  );
  return { step: 'fit correction', planeIds: job.planeIds.filter((id) => !fitted.has(id)) };
}

function planeLearned(job: StepJob, planeId: number): boolean {
  const trials = job.weights.filter((w) => w.purpose === 'trial' && w.planeId === planeId);
  return trials.some((trial) => wasRun(job, trial.id));
}

function wasRun(job: StepJob, weightId: number): boolean {
  return job.runs.some(
    (run) => run.purpose === 'trial' && run.state === 'kept' && run.weightIds.includes(weightId),
  );
}
