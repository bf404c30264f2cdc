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
/** An answer within limits must lower the largest reading to this share of it, or less. */
const WORTH_FITTING = 0.9;
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
  return bestOffer(task, learned.condition);
}

function bestOffer(task: AnswerTask, condition: Condition): Result<Offer> {
  const { input } = task;
  const kind = input.points.length === input.planes.length ? 'exact' : 'least squares';
  const full = buildAnswer(task, kind);
  if (!full.ok) return full;
  if (input.only) return partOnly(task, input.only, full.value);
  const pairs = input.planes.length > 1 ? built(task, 'static pair') : [];
  if (condition.verdict === 'withhold')
    return ok(withheldOffer(input, condition, { full: full.value, pair: pairs[0] ?? null }));
  const minMax = kind === 'exact' ? [] : built(task, 'min-max');
  return ok(withinRoom(task, full.value, [...minMax, ...pairs]));
}

/** The answer, or the best one within the room of the planes where it asks for more. */
function withinRoom(task: AnswerTask, full: Answer, others: readonly Answer[]): Offer {
  const [limited] = isOver(task.input, full) ? built(task, 'within limits') : [];
  if (!limited) return { answer: full, alternatives: others, withheld: null };
  const now = Math.max(0, ...task.basis.now.map(({ amplitude }) => amplitude));
  if (limited.largestPredicted < WORTH_FITTING * now)
    return { answer: limited, alternatives: [full, ...others], withheld: null };
  return { answer: null, alternatives: [], withheld: { failure: noRoom(task), answer: full } };
}

function noRoom({ input }: AnswerTask): Failure {
  const rooms = input.planes.flatMap(({ name, roomG }) =>
    typeof roomG === 'number' ? [`plane ${name} may carry ${roomG.toFixed(0)} g more`] : [],
  );
  return fail(
    'no-room',
    `Within the limits hardly anything can be gained: ${rooms.join(', ')}. Take weights off that hang there, or choose another plane or radius.`,
  ).failure;
}

function partOnly(task: AnswerTask, only: 'static' | 'couple', full: Answer): Result<Offer> {
  const pair = buildAnswer(task, only === 'static' ? 'static pair' : 'couple pair');
  return pair.ok ? ok({ answer: pair.value, alternatives: [full], withheld: null }) : pair;
}

/** Whether an answer asks for more than a plane may still carry. */
function isOver({ planes }: JobInput, { add }: Answer): boolean {
  return planes.some(({ id, roomG }) => {
    const asked = add.find(({ planeId }) => planeId === id)?.massG ?? 0;
    return roomG !== null && roomG !== undefined && asked > roomG;
  });
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
