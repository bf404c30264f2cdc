import { divide, fromPolar, scale, size, subtract, sum, ZERO, type Complex } from '../complex';
import { compareVectors } from './coefficient-book';
import { apply, type ComplexMatrix } from './complex-matrix';
import type { FittedWeight, JobPoint, JobRun } from './job-input';
import { unbalanceByPlane } from './weights-ledger';

/** Runs one after the other with the same weights on the rotor, and their mean vectors. */
export type RunBlock = {
  readonly key: string;
  readonly runs: readonly JobRun[];
  readonly vectors: readonly Complex[];
};

/** One run with more on the rotor than an earlier block, and what that changed. */
export type WeightStep = {
  readonly run: JobRun;
  readonly before: RunBlock;
  readonly after: readonly Complex[];
  readonly added: readonly FittedWeight[];
  /** Planes that were changed. */
  readonly planeIds: readonly number[];
};

/** What a fitted weight says about the coefficients, at one point. */
export type StepEstimate = {
  readonly runId: number;
  readonly beforeRunIds: readonly number[];
  readonly planeIds: readonly number[];
  readonly pointId: number;
  readonly purpose: JobRun['purpose'];
  /** The coefficient per g·mm; null where several planes were changed at once. */
  readonly coefficient: { readonly rePerGmm: number; readonly imPerGmm: number } | null;
  /** Against what the coefficients in use say of the same weights. */
  readonly ratio: number;
  readonly turnDeg: number;
  readonly differencePct: number;
};

/** The vectors of a run in the order of the points. */
export function vectorsOf(run: Pick<JobRun, 'vectors'>, points: readonly JobPoint[]): Complex[] {
  return points.map(({ id }) => {
    const vector = run.vectors.find(({ pointId }) => pointId === id);
    return vector ? fromPolar(vector.amplitude, vector.lagDeg) : ZERO;
  });
}

/** What tells one set of weights from another, whatever their order. */
export function weightsKey(weights: readonly FittedWeight[]): string {
  return weights.map(keyOf).sort().join(' + ');
}

/**
 * Runs gathered into blocks: neighbours in time with the same weights, with their mean vectors.
 * Example: three base runs and a trial run are two blocks.
 */
export function runBlocks(runs: readonly JobRun[], points: readonly JobPoint[]): RunBlock[] {
  const groups: JobRun[][] = [];
  for (const run of runs) {
    const last = groups.at(-1);
    const before = last?.at(-1);
    if (last && before && weightsKey(before.weights) === weightsKey(run.weights)) last.push(run);
    else groups.push([run]);
  }
  return groups.map((group) => ({
    key: weightsKey(group[0]?.weights ?? []),
    runs: group,
    vectors: meanOf(group.map((run) => vectorsOf(run, points))),
  }));
}

/**
 * For every block the latest earlier block whose weights are all still on, with the weights that came
 * since. Blocks without such a forerunner (a weight was moved or taken off) have no step.
 * Example: base, trial, and a correction fitted after the trial came off give two steps, both from base.
 */
export function weightSteps(blocks: readonly RunBlock[]): WeightStep[] {
  return blocks.flatMap((block, i) => {
    const run = block.runs[0];
    if (!run) return [];
    for (const before of blocks.slice(0, i).reverse()) {
      const added = addedSince(before.runs[0]?.weights ?? [], run.weights);
      if (!added || added.length === 0) continue;
      const planeIds = [...new Set(added.map((w) => w.planeId))];
      return [{ run, before, after: block.vectors, added, planeIds }];
    }
    return [];
  });
}

/**
 * Every step as estimate of the coefficients, point by point: where one plane was changed
 * `(V_after − V_before)/w`, and always the measured change against the change that the coefficients in
 * use predict for the same weights.
 * Source: definition of the influence coefficient.
 * Example: S01, 26 g at 35° fitted → 0.381 mm/s per kg·mm at 10.0°, 13.0 % from the trial's.
 */
export function stepEstimates(
  steps: readonly WeightStep[],
  coefficients: ComplexMatrix,
  of: { readonly planeIds: readonly number[]; readonly points: readonly JobPoint[] },
): StepEstimate[] {
  return steps.flatMap((step) => {
    const added = unbalanceByPlane(step.added, of.planeIds);
    const predicted = apply(coefficients, added);
    const single = step.planeIds.length === 1 ? sum(added) : null;
    return of.points.map((point, p) => {
      const change = subtract(step.after[p] ?? ZERO, step.before.vectors[p] ?? ZERO);
      return {
        runId: step.run.id,
        beforeRunIds: step.before.runs.map(({ id }) => id),
        planeIds: step.planeIds,
        pointId: point.id,
        purpose: step.run.purpose,
        coefficient: single && size(single) > 0 ? perGmm(change, single) : null,
        ...compareVectors(change, predicted[p] ?? ZERO),
      };
    });
  });
}

function perGmm(change: Complex, unbalance: Complex): { rePerGmm: number; imPerGmm: number } {
  const { re, im } = divide(change, unbalance);
  return { rePerGmm: re, imPerGmm: im };
}

/** The weights of `after` beyond those of `before`; null where one of `before` is gone. */
function addedSince(
  before: readonly FittedWeight[],
  after: readonly FittedWeight[],
): FittedWeight[] | null {
  const rest = [...after];
  for (const weight of before) {
    const at = rest.findIndex((other) => keyOf(other) === keyOf(weight));
    if (at < 0) return null;
    rest.splice(at, 1);
  }
  return rest;
}

function keyOf({ planeId, massG, radiusMm, angleDeg }: FittedWeight): string {
  return `${planeId}:${massG}g@${radiusMm}mm/${angleDeg}`;
}

function meanOf(vectors: readonly (readonly Complex[])[]): Complex[] {
  const first = vectors[0] ?? [];
  return first.map((_, p) => scale(sum(vectors.map((v) => v[p] ?? ZERO)), 1 / vectors.length));
}
