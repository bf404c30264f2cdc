import { normaliseDeg } from '../units';
import type { FittedWeight, JobInput, JobRun } from './job-input';
import { weightsKey } from './weight-steps';

/** A check run that missed its prediction, and what is known of the fitting before it. */
export type SlipInput = {
  readonly job: JobInput;
  readonly checkRunId: number;
  /** The weights fitted just before the check run, as entered. */
  readonly fitted: readonly FittedWeight[];
  /** Pitch of fixed positions, degrees, where weights go to numbered positions. */
  readonly pitchDeg?: number | null;
  /** Another radius at which the weight could hang, mm. */
  readonly otherRadiusMm?: number | null;
};

/** A trial of the job, in order of the runs, that has stayed on since its own run. */
export const TRIAL_STAYED = [
  'first trial stayed on',
  'second trial stayed on',
  'third trial stayed on',
] as const;

/** A job up to a check run, the check run, and the weights fitted for it. */
export type SlipStory = {
  readonly job: JobInput;
  /** Its `weights` are those on besides the fitted ones. */
  readonly check: JobRun;
  readonly fitted: readonly FittedWeight[];
};

/** A common slip and what the entries would have been. */
export type SlipHypothesis = {
  readonly slip:
    | 'as entered'
    | 'angles counted with rotation'
    | 'lead read as lag'
    | 'fitted 180° off'
    | 'not fitted'
    | 'planes swapped'
    | 'channels swapped'
    | 'trial left on'
    | (typeof TRIAL_STAYED)[number]
    | 'earlier weight gone'
    | 'mass ten times too small'
    | 'mass ten times too large'
    | 'one position further'
    | 'one position back'
    | 'other radius';
  readonly words: string;
  readonly alter: (story: SlipStory) => SlipStory;
};

/**
 * The slips that can be told for a job, each as a change of what was entered. Those that need two planes,
 * two points, positions, another radius or a trial weight taken off are left out where there are none.
 * Source: list of common slips from practice. Example: a one-plane job has no 'planes swapped'.
 */
export function slipHypotheses(job: JobInput, input: SlipInput): SlipHypothesis[] {
  const separated = (story: SlipStory) => apart(story);
  const all = [
    ...ALWAYS,
    ...(job.planes.length === 2 ? [planesSwapped(job)] : []),
    ...(job.points.length === 2 ? [channelsSwapped(job)] : []),
    ...weightHypotheses(job, input),
    ...placeHypotheses(input),
  ];
  return all.map((hypothesis) => ({
    ...hypothesis,
    alter: (story) => hypothesis.alter(separated(story)),
  }));
}

const ALWAYS: readonly SlipHypothesis[] = [
  { slip: 'as entered', words: 'Everything is as entered.', alter: (story) => story },
  {
    slip: 'angles counted with rotation',
    words: 'All angles of weights were counted with rotation instead of against it.',
    alter: (story) => everyWeight(story, (w) => ({ ...w, angleDeg: normaliseDeg(-w.angleDeg) })),
  },
  {
    slip: 'lead read as lag',
    words: 'The instrument shows phase as lead, and it was entered as lag.',
    alter: ({ job, check, fitted }) => ({
      job: { ...job, runs: job.runs.map(mirrored) },
      check: mirrored(check),
      fitted,
    }),
  },
  {
    slip: 'fitted 180° off',
    words: 'The weight was fitted on the opposite side.',
    alter: (story) => turned(story, 180),
  },
  {
    slip: 'not fitted',
    words: 'The weight was never fitted, or it came off.',
    alter: (story) => ({ ...story, fitted: [] }),
  },
  {
    slip: 'mass ten times too small',
    words: 'A tenth of the entered mass was fitted.',
    alter: (story) => fittedAs(story, (w) => ({ ...w, massG: w.massG / 10 })),
  },
  {
    slip: 'mass ten times too large',
    words: 'Ten times the entered mass was fitted.',
    alter: (story) => fittedAs(story, (w) => ({ ...w, massG: w.massG * 10 })),
  },
];

function planesSwapped({ planes }: JobInput): SlipHypothesis {
  const [first, second] = planes;
  return {
    slip: 'planes swapped',
    words: 'The weights of the two planes were swapped when fitting.',
    alter: (story) =>
      fittedAs(story, (w) => ({
        ...w,
        planeId: (w.planeId === first?.id ? second?.id : first?.id) ?? w.planeId,
      })),
  };
}

function channelsSwapped({ points }: JobInput): SlipHypothesis {
  const [first, second] = points;
  return {
    slip: 'channels swapped',
    words: 'The readings of the two points were swapped in the check run.',
    alter: (story) => ({
      ...story,
      check: {
        ...story.check,
        vectors: story.check.vectors.map((v) => ({
          ...v,
          pointId: (v.pointId === first?.id ? second?.id : first?.id) ?? v.pointId,
        })),
      },
    }),
  };
}

function weightHypotheses(job: JobInput, input: SlipInput): SlipHypothesis[] {
  const check = input.job.runs.find(({ id }) => id === input.checkRunId);
  const on = new Set((check?.weights ?? []).map((w) => weightsKey([w])));
  const takenOff = job.runs
    .filter(({ purpose }) => purpose === 'trial')
    .flatMap(({ weights }) => weights)
    .filter((w) => !on.has(weightsKey([w])));
  const trials = [...new Map(takenOff.map((w) => [weightsKey([w]), w])).values()];
  const besides = (check?.weights.length ?? 0) > input.fitted.length;
  const gone: SlipHypothesis = {
    slip: 'earlier weight gone',
    words: 'The weights fitted earlier in this job are no longer on the rotor.',
    alter: (story) => ({ ...story, fitted: [...story.fitted, ...story.check.weights.map(undone)] }),
  };
  return [...trialsLeftOn(job, trials), ...(besides ? [gone] : [])];
}

/** All trials at the end, and each trial by itself from its run on: then later trial runs had it too. */
function trialsLeftOn(
  { planes, runs }: JobInput,
  trials: readonly FittedWeight[],
): SlipHypothesis[] {
  if (trials.length === 0) return [];
  const all: SlipHypothesis = {
    slip: 'trial left on',
    words:
      trials.length > 1
        ? 'The trial weights that were to come off are all on the rotor now.'
        : 'A trial weight that was to come off is still on the rotor.',
    alter: (story) => ({ ...story, fitted: [...story.fitted, ...trials] }),
  };
  const stayed = trials.flatMap((trial, at): SlipHypothesis[] => {
    const slip = TRIAL_STAYED[at];
    const own = runs.findLastIndex((run) => carries(run, trial));
    if (!slip || (trials.length === 1 && own === runs.length - 1)) return [];
    const after = new Set(runs.slice(own + 1).map(({ id }) => id));
    const withTrial = (run: JobRun): JobRun =>
      after.has(run.id) ? { ...run, weights: [...run.weights, trial] } : run;
    return [
      {
        slip,
        words: `The trial weight of plane ${planes.find(({ id }) => id === trial.planeId)?.name ?? ''} has stayed on the rotor since its run.`,
        alter: (story) => ({
          ...story,
          job: { ...story.job, runs: story.job.runs.map(withTrial) },
          fitted: [...story.fitted, trial],
        }),
      },
    ];
  });
  return [all, ...stayed];
}

function carries({ weights }: JobRun, weight: FittedWeight): boolean {
  return weights.some((other) => weightsKey([other]) === weightsKey([weight]));
}

function placeHypotheses({ pitchDeg, otherRadiusMm }: SlipInput): SlipHypothesis[] {
  const positions: SlipHypothesis[] = pitchDeg
    ? [
        {
          slip: 'one position further',
          words: 'The weight hangs one position further against rotation.',
          alter: (story) => turned(story, pitchDeg),
        },
        {
          slip: 'one position back',
          words: 'The weight hangs one position back, with rotation.',
          alter: (story) => turned(story, -pitchDeg),
        },
      ]
    : [];
  const radius: SlipHypothesis[] = otherRadiusMm
    ? [
        {
          slip: 'other radius',
          words: `The weight hangs at a radius of ${otherRadiusMm} mm.`,
          alter: (story) => fittedAs(story, (w) => ({ ...w, radiusMm: otherRadiusMm })),
        },
      ]
    : [];
  return [...positions, ...radius];
}

/** The check run's other weights on one side, the fitted ones on the other. */
function apart(story: SlipStory): SlipStory {
  const rest = [...story.check.weights];
  for (const weight of story.fitted) {
    const at = rest.findIndex((other) => weightsKey([other]) === weightsKey([weight]));
    if (at >= 0) rest.splice(at, 1);
  }
  return { ...story, check: { ...story.check, weights: rest } };
}

function everyWeight(story: SlipStory, change: (w: FittedWeight) => FittedWeight): SlipStory {
  const altered = (run: JobRun) => ({ ...run, weights: run.weights.map(change) });
  return {
    job: { ...story.job, runs: story.job.runs.map(altered) },
    check: altered(story.check),
    fitted: story.fitted.map(change),
  };
}

function fittedAs(story: SlipStory, change: (w: FittedWeight) => FittedWeight): SlipStory {
  return { ...story, fitted: story.fitted.map(change) };
}

function turned(story: SlipStory, deg: number): SlipStory {
  return fittedAs(story, (w) => ({ ...w, angleDeg: normaliseDeg(w.angleDeg + deg) }));
}

function mirrored(run: JobRun): JobRun {
  return {
    ...run,
    vectors: run.vectors.map((v) => ({ ...v, lagDeg: normaliseDeg(-v.lagDeg) })),
  };
}

/** A weight that undoes another: the same unbalance on the opposite side. */
function undone(weight: FittedWeight): FittedWeight {
  return { ...weight, angleDeg: normaliseDeg(weight.angleDeg + 180) };
}
