import { fail, ok, type Result } from '../result';
import { runName, type FittedWeight, type JobInput, type JobRun } from './job-input';

type Problem = Result<never> | null;

/**
 * Whether runs are complete enough to compute from: every run with a speed and one reading per point,
 * every weight with mass, radius and a plane of the job, as many points as planes.
 *
 * @returns nothing, or the first failure in words with the field it belongs to
 * Example: a trial weight of 0 g → 'weight-zero', naming run and plane.
 */
export function checkJobInput(input: JobInput): Result<null> {
  return (
    checkShape(input) ??
    firstProblem(input.runs, (run, i) => checkRun(input, run, `runs.${i}`)) ??
    firstProblem(input.weightsNow ?? [], (weight, i) =>
      checkWeight(input, weight, { on: 'the rotor now', field: `weightsNow.${i}` }),
    ) ??
    ok(null)
  );
}

function checkShape({ planes, points, runs }: JobInput): Problem {
  if (planes.length === 0)
    return fail('no-planes', 'The job has no correction plane. Choose one or two planes.');
  if (points.length < planes.length)
    return fail(
      'too-few-points',
      `${planes.length} planes need readings at ${planes.length} points or more, and there are ${points.length}. Read more points or use fewer planes.`,
    );
  if (runs.length === 0)
    return fail('no-runs', 'There is no run to compute from. Record a base run first.');
  return null;
}

function checkRun(input: JobInput, run: JobRun, field: string): Problem {
  if (!(run.speedRpm > 0 && Number.isFinite(run.speedRpm)))
    return fail(
      'speed-zero',
      `The speed of ${runName(run)} is ${run.speedRpm} r/min, and a turning rotor has more than zero. Enter the speed that the tacho showed.`,
      `${field}.speedRpm`,
    );
  return (
    firstProblem(input.points, (point) => {
      const vectors = run.vectors.filter(({ pointId }) => pointId === point.id);
      const [vector] = vectors;
      if (vectors.length !== 1 || !vector)
        return fail(
          'reading-missing',
          `${runName(run)} has ${vectors.length} readings at ${point.label}, and one is needed. Complete the run or leave it out.`,
          `${field}.vectors`,
        );
      if (vector.amplitude >= 0 && Number.isFinite(vector.amplitude + vector.lagDeg)) return null;
      return fail(
        'reading-range',
        `The reading at ${point.label} in ${runName(run)} is not a size from zero up with a lag in degrees. Enter it again.`,
        `${field}.vectors`,
      );
    }) ??
    firstProblem(run.weights, (weight, i) =>
      checkWeight(input, weight, { on: runName(run), field: `${field}.weights.${i}` }),
    )
  );
}

function checkWeight(
  { planes }: JobInput,
  weight: FittedWeight,
  where: { readonly on: string; readonly field: string },
): Problem {
  const plane = planes.find(({ id }) => id === weight.planeId);
  if (!plane)
    return fail(
      'plane-unknown',
      `A weight of ${where.on} hangs in a plane that is not part of this job. Add the plane or correct the weight.`,
      `${where.field}.planeId`,
    );
  if (!(weight.massG > 0 && Number.isFinite(weight.massG)))
    return fail(
      'weight-zero',
      `The weight in plane ${plane.name} of ${where.on} has a mass of ${weight.massG} g, and nothing can be learnt from it. Weigh it and enter its mass.`,
      `${where.field}.massG`,
    );
  if (!(weight.radiusMm > 0 && Number.isFinite(weight.radiusMm + weight.angleDeg)))
    return fail(
      'weight-place',
      `The weight in plane ${plane.name} of ${where.on} needs a radius above zero and an angle. Enter where it hangs.`,
      `${where.field}.radiusMm`,
    );
  return null;
}

function firstProblem<Item>(
  items: readonly Item[],
  check: (item: Item, index: number) => Problem,
): Problem {
  for (const [index, item] of items.entries()) {
    const problem = check(item, index);
    if (problem) return problem;
  }
  return null;
}
