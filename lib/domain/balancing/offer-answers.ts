import { fail, ok, type Failure, type Result } from '../result';
import { buildAnswer, type Answer, type AnswerTask } from './build-answer';
import type { Condition } from './condition';
import type { JobInput } from './job-input';
import type { JobSolution } from './job-solution';
import type { TrialCheck } from './trial-checks';

/** Below this multiple of the scatter a lag means nothing (practice). */
const HEARD_ABOVE_SCATTER = 3;
/** From here the planes are one and the same to the points. */
const INDISTINGUISHABLE = 1e4;
/** A change below this share of the reading is only rounding of the arithmetic. */
const ROUNDING = 1e-9;

/** The part of a solution that may be fitted. */
export type Offer = Pick<JobSolution, 'answer' | 'alternatives' | 'withheld'>;

/**
 * What may be fitted: nothing where a trial was not heard (change/noise < 5) or the readings are below 3
 * times their scatter, and a failure where a trial changed nothing at all; an equal weight in each plane where the scaled condition number is above 15;
 * otherwise the exact or least-squares answer with min-max and static pair beside it.
 * Source: limits from practice. Example: S09 → static pair, exact answer withheld.
 */
export function offerAnswers(
  task: AnswerTask,
  learned: Pick<JobSolution, 'condition' | 'trials'>,
): Result<Offer> {
  const { input } = task;
  const refused = unheardTrial(input, learned.trials) ?? unheardNow(task);
  if (refused)
    return ok({ answer: null, alternatives: [], withheld: { failure: refused, answer: null } });
  const silent = silentTrial(task, learned.trials);
  if (silent) return { ok: false, failure: silent };
  const kind = input.points.length === input.planes.length ? 'exact' : 'least squares';
  const full = buildAnswer(task, kind);
  if (!full.ok) return full;
  const pairs = input.planes.length > 1 ? built(task, 'static pair') : [];
  if (learned.condition.verdict === 'withhold')
    return ok(
      withheldOffer(input, learned.condition, { full: full.value, pair: pairs[0] ?? null }),
    );
  const minMax = kind === 'exact' ? [] : built(task, 'min-max');
  return ok({ answer: full.value, alternatives: [...minMax, ...pairs], withheld: null });
}

function built(task: AnswerTask, kind: Answer['kind']): Answer[] {
  const answer = buildAnswer(task, kind);
  return answer.ok ? [answer.value] : [];
}

function withheldOffer(
  input: JobInput,
  condition: Condition,
  answers: { readonly full: Answer; readonly pair: Answer | null },
): Offer {
  const useless = condition.number >= INDISTINGUISHABLE;
  return {
    answer: answers.pair,
    alternatives: [],
    withheld: {
      failure: conditionFailure(input, condition),
      answer: useless ? null : answers.full,
    },
  };
}

function unheardTrial(input: JobInput, trials: readonly TrialCheck[]): Failure | null {
  for (const plane of input.planes) {
    const own = trials.filter(({ planeIds }) => planeIds.includes(plane.id));
    const [first] = own;
    if (!first || own.some(({ verdict }) => verdict !== 'refuse')) continue;
    return fail(
      'trial-too-small',
      `The trial weight in plane ${plane.name} changed the reading by ${(first.changeOverNoise ?? 0).toFixed(2)} times the noise, and less than 5 times cannot be told from scatter. ` +
        'Fit a heavier trial weight within the force cap, or average longer.',
    ).failure;
  }
  return null;
}

/** Dividing by a change of nothing gives tons: with two planes the arithmetic alone does not notice. */
function silentTrial({ input, basis }: AnswerTask, trials: readonly TrialCheck[]): Failure | null {
  const largest = Math.max(0, ...basis.model.asFound.map(({ amplitude }) => amplitude));
  const changed = ({ points }: TrialCheck) =>
    points.some(({ changeAmplitude }) => changeAmplitude > ROUNDING * largest);
  for (const plane of input.planes) {
    const own = trials.filter(({ planeIds }) => planeIds.includes(plane.id));
    if (own.length === 0 || own.some(changed)) continue;
    return fail(
      'no-response',
      `The trial weight in plane ${plane.name} changed nothing at any point, so no answer can be computed. Check that it was fitted, that the run was read anew and that the sensors work.`,
    ).failure;
  }
  return null;
}

function unheardNow({ basis }: AnswerTask): Failure | null {
  const scatterOf = (pointId: number) =>
    basis.noise.find((n) => n.pointId === pointId)?.scatter ?? 0;
  const heard = basis.now.some(
    ({ pointId, amplitude }) => amplitude >= HEARD_ABOVE_SCATTER * scatterOf(pointId),
  );
  if (heard) return null;
  return fail(
    'below-scatter',
    `Every 1x reading is below ${HEARD_ABOVE_SCATTER} times the scatter of repeats, so its lag means nothing. Stop here: a further trim cannot be aimed.`,
  ).failure;
}

function conditionFailure(input: JobInput, condition: Condition): Failure {
  const names = input.planes.map(({ name }) => name).join(' and ');
  if (condition.number >= INDISTINGUISHABLE)
    return fail(
      'planes-indistinguishable',
      `Planes ${names} act the same at every point, so no answer can tell them apart. Use planes further apart or another point; an equal weight in each is offered instead.`,
    ).failure;
  return fail(
    'ill-conditioned',
    `Planes ${names} act almost alike at the points (condition number ${condition.number.toFixed(1)}, limit 15): small errors become large weights that fight each other. An equal weight in each is offered; the exact answer needs an engineer.`,
  ).failure;
}
