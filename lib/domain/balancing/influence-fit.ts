import { add, subtract, size, ZERO, type Complex } from '../complex';
import { ok, type Result } from '../result';
import { apply, columnOf, dot, pseudoInverse, type ComplexMatrix } from './complex-matrix';
import { explainRank } from './explain-rank';

/** A run as the fit sees it: unbalance per plane, g·mm, and reading per point, as vectors. */
export type FitRun = {
  readonly runId: number;
  readonly unbalance: readonly Complex[];
  readonly vectors: readonly Complex[];
};

/** What one fit over runs gives. */
export type InfluenceFit = {
  /** As-found vector per point: what the rotor shows with nothing of the job's weights on it. */
  readonly asFound: readonly Complex[];
  /** Influence coefficients, one row per point, one column per plane, per g·mm. */
  readonly coefficients: ComplexMatrix;
  /** `(AᴴA)⁻¹` of the design [1, u]: times the variance of a reading, the covariance of the fit. */
  readonly covariance: ComplexMatrix;
  /** rms over all runs and points of measured minus fitted. */
  readonly misfitRms: number;
  readonly runMisfits: readonly { readonly runId: number; readonly misfit: number }[];
  /** Runs beyond those needed (runs − planes − 1): 0 means that the misfit is zero by construction. */
  readonly spareRuns: number;
};

/**
 * One linear fit over all runs: `V_k = V_free + H·u_k`, least squares, every point by itself.
 * Phase is lag, angles are against rotation, so that H is one complex number per plane and point.
 * The textbook forms (one plane, two planes, trial taken off or left on) are special cases.
 *
 * @param runs unbalance per plane in g·mm, relative to the start of the job, and reading per point
 * @param planeNames names for the sentences of a failure, in the order of `unbalance`
 * @returns as-found vectors, coefficients per g·mm, misfit; or, where the rank is below planes + 1,
 *   a failure that says in words what is missing
 * Source: linear influence coefficients, textbooks (e.g. S. S. Rao, Mechanical Vibrations, ch. 9).
 * @example base 3.873 at 219°, with 15 g at 400 mm, 0°: 2.46 at 251° → H = 0.369 mm/s per kg·mm at 2.9°
 */
export function fitInfluence(
  runs: readonly FitRun[],
  planeNames: readonly string[],
): Result<InfluenceFit> {
  const missing = explainRank(
    runs.map((run) => run.unbalance),
    planeNames,
  );
  if (missing) return { ok: false, failure: missing };
  const design = runs.map((run) => [{ re: 1, im: 0 }, ...run.unbalance]);
  const inverse = pseudoInverse(design);
  const points = Array.from({ length: runs[0]?.vectors.length ?? 0 }, (_, p) =>
    apply(
      inverse,
      columnOf(
        runs.map((run) => run.vectors),
        p,
      ),
    ),
  );
  const asFound = points.map((solution) => solution[0] ?? ZERO);
  const coefficients = points.map((solution) => solution.slice(1));
  return ok({
    asFound,
    coefficients,
    covariance: inverse.map((row) => inverse.map((other) => dot(row, other.map(conjugate)))),
    ...misfits(runs, { asFound, coefficients }),
    spareRuns: runs.length - planeNames.length - 1,
  });
}

/**
 * How far runs lie from a linear model: rms over runs and points, and per run over its points.
 * Example: runs that the model was solved from exactly have a misfit of 0 within rounding.
 */
export function misfits(
  runs: readonly FitRun[],
  model: Pick<InfluenceFit, 'asFound' | 'coefficients'>,
): Pick<InfluenceFit, 'misfitRms' | 'runMisfits'> {
  const runMisfits = runs.map((run) => {
    const fitted = responseTo(model, run.unbalance);
    const misses = run.vectors.map((v, p) => size(subtract(v, fitted[p] ?? ZERO)));
    return { runId: run.runId, misfit: rootMeanSquare(misses) };
  });
  return { runMisfits, misfitRms: rootMeanSquare(runMisfits.map(({ misfit }) => misfit)) };
}

/** What the model says each point shows with unbalance `u` per plane (g·mm) on the rotor: `V_free + H·u`. */
export function responseTo(
  model: Pick<InfluenceFit, 'asFound' | 'coefficients'>,
  unbalance: readonly Complex[],
): Complex[] {
  return apply(model.coefficients, unbalance).map((effect, p) =>
    add(model.asFound[p] ?? ZERO, effect),
  );
}

/** Root of the mean square; 0 for an empty list. Example: of 3 and 4 it is √12.5. */
export function rootMeanSquare(values: readonly number[]): number {
  if (values.length === 0) return 0;
  return Math.hypot(...values) / Math.sqrt(values.length);
}

function conjugate(z: Complex): Complex {
  return { re: z.re, im: -z.im };
}
