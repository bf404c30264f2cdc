import { centrifugalForceN, weightN } from './centrifugal-force';
import { runName, type JobInput } from './job-input';
import type { JobNotice, JobSolution } from './job-solution';

type Known = Omit<JobSolution, 'notices'>;

const MISFIT_PER_SCATTER = 3;
const DIFFERENCE_PCT = 10;
const LARGE_CHANGE_PCT = 200;
/** A trial of more than this share of the static load is twice what practice allows: a decimal point, often. */
const HEAVY_TRIAL_PCT = 20;
const FIGHTING = 0.3;
const RISE = 1.2;

/**
 * What must be said beside a solution: doubtful speeds, scatter, trials, condition, misfit, fitted weights
 * that answered differently, points that would rise. In the order in which they matter to a reader.
 * Example: S01 after its first check run says that the fitted weight answered 13 % differently.
 */
export function jobNotices(input: JobInput, solution: Known): JobNotice[] {
  return [
    ...runNotices(input, solution),
    ...trialNotices(input, solution),
    ...answerNotices(input, solution),
    ...fitNotices(input, solution),
  ];
}

function runNotices(input: JobInput, { speed, noise, nowFrom }: Known): JobNotice[] {
  const notices: JobNotice[] = [];
  if (speed.verdict === 'warn' || speed.worstPct > 1)
    notices.push({
      code: 'speed',
      message: `The speed of ${nameOf(input, speed.worstRunId)} is ${speed.worstPct.toFixed(2)} % off the runs before it; size and lag change with speed.`,
    });
  if (noise.some(({ from }) => from === 'unknown'))
    notices.push({
      code: 'no-repeats',
      message:
        'No run was repeated, so the scatter is unknown and the answer has no stated uncertainty. Repeat the base run two or three times.',
    });
  if (noise.some(({ base }) => base && !base.good))
    notices.push({
      code: 'repeats-scatter',
      message:
        'The base runs scatter more than 5 % or 5°: let the machine warm up, look for a loose part, a beat or a resonance, and repeat them.',
    });
  if (nowFrom === 'model')
    notices.push({
      code: 'now-from-model',
      message:
        'No run was made with what is on the rotor now; its state follows from the other runs.',
    });
  return notices;
}

function trialNotices(input: JobInput, { trials }: Known): JobNotice[] {
  return trials.flatMap(({ runId, verdict, points }): JobNotice[] => {
    const name = nameOf(input, runId);
    const wide: JobNotice[] =
      verdict === 'wide'
        ? [
            {
              code: 'trial-wide',
              message: `The weight of ${name} was heard at 5 to 10 times the noise: the answer has a wide band. A heavier trial weight or longer averaging narrows it.`,
            },
          ]
        : [];
    const weak: JobNotice[] =
      verdict === 'unknown' && !points.some(({ thirtyRule }) => thirtyRule)
        ? [
            {
              code: 'trial-weak',
              message: `The weight of ${name} moved no reading by 30 % in size or 30° in phase, and the scatter is not known: this answer may be noise. Repeat the base run to learn the scatter, or fit a heavier trial weight.`,
            },
          ]
        : [];
    const large: JobNotice[] = points.some(({ changePct }) => changePct > LARGE_CHANGE_PCT)
      ? [
          {
            code: 'trial-large',
            message: `The weight of ${name} changed the reading by more than twice its size. Check its mass and look for a resonance.`,
          },
        ]
      : [];
    return [...heavyTrial(input, runId), ...wide, ...weak, ...large];
  });
}

/** Nothing else tells a mass typed ten times too large before the answer, as much too large, hangs. */
function heavyTrial({ runs, rotor, planes }: JobInput, runId: number): JobNotice[] {
  const run = runs.find(({ id }) => id === runId);
  if (!run || !rotor?.massKg) return [];
  const unbalance = Math.max(0, ...run.weights.map((w) => w.massG * w.radiusMm));
  const loadN = weightN(rotor.massKg) / Math.min(2, planes.length);
  const pct = (100 * centrifugalForceN(unbalance, run.speedRpm)) / loadN;
  if (pct <= HEAVY_TRIAL_PCT) return [];
  return [
    {
      code: 'trial-heavy',
      message: `The trial weight entered for ${runName(run)} pulls with ${pct.toFixed(0)} % of the static load, and 10 % is usual. Weigh it again and look at the decimal point before any weight of this answer is fitted.`,
    },
  ];
}

function answerNotices(input: JobInput, solution: Known): JobNotice[] {
  const { condition, answer, now } = solution;
  const notices: JobNotice[] = [];
  if (condition.verdict === 'caution')
    notices.push({
      code: 'condition',
      message: `The planes act much alike at the points (condition number ${condition.number.toFixed(1)}): small errors grow into grams. Look at the uncertainty before fitting.`,
    });
  if (answer && answer.add.length > 1 && answer.sumOverTotal < FIGHTING)
    notices.push({
      code: 'opposing-weights',
      message:
        'The weights of this answer mostly cancel each other. That is right for a couple, and a sign of doubt otherwise: compare with the static pair.',
    });
  if (answer?.kind === 'within limits') notices.push(limitNotice(input, solution));
  const rising = input.points.filter(({ id }) => {
    const before = now.find(({ pointId }) => pointId === id)?.amplitude ?? 0;
    const after = answer?.predicted.find(({ pointId }) => pointId === id)?.amplitude ?? 0;
    return after > RISE * before;
  });
  if (rising.length > 0)
    notices.push({
      code: 'point-rises',
      message: `This answer raises the reading at ${rising.map(({ label }) => label).join(', ')} by more than 20 %.`,
    });
  return notices;
}

function limitNotice(input: JobInput, { answer, alternatives }: Known): JobNotice {
  const free = alternatives.find(({ kind }) => kind === 'exact' || kind === 'least squares');
  const over = input.planes.flatMap(({ id, name, roomG }) => {
    const asked = free?.add.find(({ planeId }) => planeId === id)?.massG ?? 0;
    return roomG !== null && roomG !== undefined && asked > roomG
      ? [`${asked.toFixed(0)} g in plane ${name}, where ${roomG.toFixed(0)} g may still be hung`]
      : [];
  });
  const left = answer?.largestPredicted ?? 0;
  return {
    code: 'plane-limit',
    message: `Without limits the answer asks for ${over.join(' and ')}. The best within the limits is given; it leaves up to ${left.toFixed(2)} ${input.unit} instead of ${(free?.largestPredicted ?? 0).toFixed(2)}. Take old weights off, or use a larger radius, for less.`,
  };
}

function fitNotices(input: JobInput, solution: Known): JobNotice[] {
  const { allRuns, estimates, noise } = solution;
  const scatter = Math.max(0, ...noise.map((n) => n.scatter ?? 0));
  const notices: JobNotice[] = [];
  if (allRuns && scatter > 0 && allRuns.misfitRms > MISFIT_PER_SCATTER * scatter)
    notices.push({
      code: 'misfit',
      message: `Over all runs the fit misses by ${allRuns.misfitRms.toFixed(3)} ${input.unit}, more than 3 times the scatter of ${scatter.toFixed(3)}; ${nameOf(input, allRuns.worstRunId)} fits worst. Check the weights entered for it.`,
    });
  const trialRuns = new Set(solution.model.source === 'stored' ? [] : solution.model.runIds);
  for (const e of estimates.filter(({ runId }) => !trialRuns.has(runId))) {
    if (e.differencePct <= DIFFERENCE_PCT || e.purpose === 'trial') continue;
    const label = input.points.find(({ id }) => id === e.pointId)?.label ?? '';
    notices.push({
      code: 'estimate-differs',
      message: `The weight fitted before ${nameOf(input, e.runId)} answered ${e.differencePct.toFixed(0)} % differently from the coefficients at ${label}: check angle and mass of what was fitted.`,
    });
  }
  return notices;
}

function nameOf(input: JobInput, runId: number | null): string {
  const run = input.runs.find(({ id }) => id === runId);
  return run ? runName(run) : 'one run';
}
