import { angleDeg, scale, size, subtract, sum, ZERO, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import { apply, type ComplexMatrix } from './complex-matrix';
import { checkReuse } from './coefficient-book';
import { fitInfluence, misfits, type FitRun, type InfluenceFit } from './influence-fit';
import type {
  CoefficientSource,
  JobInput,
  JobRun,
  PointVector,
  StoredCoefficient,
} from './job-input';
import { vectorsOf } from './weight-steps';
import { unbalanceByPlane } from './weights-ledger';

/** How the rotor answers to weights, as plain numbers: what a fit gave or the coefficient book held. */
export type ResponseModel = {
  readonly source: CoefficientSource['kind'];
  readonly runIds: readonly number[];
  readonly coefficients: readonly StoredCoefficient[];
  /** What each point shows with none of the job's weights on the rotor. */
  readonly asFound: readonly PointVector[];
  /** `(AᴴA)⁻¹` of the fit between planes, per (g·mm)²; null for stored coefficients. */
  readonly covariance: ComplexMatrix | null;
  readonly misfitRms: number;
  readonly runMisfits: InfluenceFit['runMisfits'];
  readonly worstRunId: number | null;
  /** Runs beyond those needed; 0 means that the misfit is zero by construction. */
  readonly spareRuns: number;
};

/**
 * The coefficients that an answer uses: fitted over the base and trial runs, over all or chosen runs,
 * or taken from the coefficient book (then as-found is the mean of `V_k − H·u_k`).
 *
 * @param source defaults to the base and trial runs, so that trims use the coefficients of the first answer
 * @returns the model, or in words what is missing
 * Source: see `fitInfluence`. Example: see the S01 and S05 reference tests.
 */
export function responseModel(
  input: JobInput,
  source: CoefficientSource = { kind: 'learning runs' },
): Result<ResponseModel> {
  const runs = runsFor(input, source);
  const fitRuns = runs.map((run) => fitRunOf(input, run));
  if (source.kind === 'stored') return storedModel(input, source, fitRuns);
  const fit = fitInfluence(
    fitRuns,
    input.planes.map(({ name }) => name),
  );
  if (!fit.ok) return fit;
  const { coefficients, covariance } = fit.value;
  return ok({
    ...summary(input, source.kind, fitRuns, fit.value),
    coefficients: listed(input, coefficients),
    covariance: covariance.slice(1).map((row) => row.slice(1)),
    spareRuns: fit.value.spareRuns,
  });
}

/** The coefficients of a model as matrix: one row per point, one column per plane, per g·mm. */
export function coefficientMatrix(
  model: Pick<ResponseModel, 'coefficients'>,
  of: Pick<JobInput, 'planes' | 'points'>,
): Complex[][] {
  return of.points.map((point) =>
    of.planes.map((plane) => {
      const entry = entryOf(model.coefficients, plane.id, point.id);
      return entry ? { re: entry.rePerGmm, im: entry.imPerGmm } : ZERO;
    }),
  );
}

/**
 * Standard deviation of the effect `H·u` at each point, from the scatter of readings through the fit, or
 * from the spread of stored estimates; null where neither is known.
 *
 * @param deviations scatter of one reading per point, same unit as the readings; null where unknown
 * Source: covariance of least squares, `σ²·uᴴ(AᴴA)⁻¹u`.
 */
export function effectDeviations(
  model: ResponseModel,
  of: Pick<JobInput, 'planes' | 'points'>,
  spread: {
    readonly unbalance: readonly Complex[];
    readonly deviations: readonly (number | null)[];
  },
): (number | null)[] {
  const { covariance } = model;
  if (!covariance)
    return of.points.map((point) => {
      const parts = of.planes.map((plane, i) => {
        const entry = entryOf(model.coefficients, plane.id, point.id);
        return (entry?.spreadPerGmm ?? NaN) * size(spread.unbalance[i] ?? ZERO);
      });
      const total = Math.hypot(...parts);
      return Number.isFinite(total) ? total : null;
    });
  const turned = apply(covariance, spread.unbalance);
  const form = spread.unbalance.reduce(
    (total, u, i) => total + u.re * (turned[i]?.re ?? 0) + u.im * (turned[i]?.im ?? 0),
    0,
  );
  return spread.deviations.map((d) => (d === null ? null : d * Math.sqrt(Math.max(0, form))));
}

/** Vectors per point as sizes and lags. */
export function pointVectors(
  vectors: readonly Complex[],
  points: JobInput['points'],
): PointVector[] {
  return points.map(({ id }, p) => {
    const vector = vectors[p] ?? ZERO;
    return { pointId: id, amplitude: size(vector), lagDeg: angleDeg(vector) };
  });
}

function storedModel(
  input: JobInput,
  source: Extract<CoefficientSource, { kind: 'stored' }>,
  fitRuns: readonly FitRun[],
): Result<ResponseModel> {
  const speedRpm = input.runs.at(-1)?.speedRpm ?? source.speedRpm;
  const reuse = checkReuse({ speedRpm: source.speedRpm, setUpId: 0 }, { speedRpm, setUpId: 0 });
  if (!reuse.ok) return reuse;
  const gap = input.planes
    .flatMap((plane) => input.points.map((point) => ({ plane, point })))
    .find(({ plane, point }) => !entryOf(source.coefficients, plane.id, point.id));
  if (gap)
    return fail(
      'coefficient-missing',
      `The coefficient book has nothing for plane ${gap.plane.name} at ${gap.point.label}. Make a trial run there.`,
    );
  const coefficients = coefficientMatrix(source, input);
  const bare = fitRuns.map((run) => {
    const effect = apply(coefficients, run.unbalance);
    return run.vectors.map((v, p) => subtract(v, effect[p] ?? ZERO));
  });
  const asFound = input.points.map((_, p) =>
    scale(sum(bare.map((vectors) => vectors[p] ?? ZERO)), 1 / Math.max(1, bare.length)),
  );
  const model = { asFound, coefficients };
  return ok({
    ...summary(input, 'stored', fitRuns, { ...model, ...misfits(fitRuns, model) }),
    coefficients: source.coefficients,
    covariance: null,
    spareRuns: fitRuns.length - 1,
  });
}

function summary(
  input: JobInput,
  source: CoefficientSource['kind'],
  runs: readonly FitRun[],
  fit: Pick<InfluenceFit, 'asFound' | 'misfitRms' | 'runMisfits'>,
) {
  const worst = fit.runMisfits.reduce<InfluenceFit['runMisfits'][number] | null>(
    (most, next) => (most === null || next.misfit > most.misfit ? next : most),
    null,
  );
  return {
    source,
    runIds: runs.map(({ runId }) => runId),
    asFound: pointVectors(fit.asFound, input.points),
    misfitRms: fit.misfitRms,
    runMisfits: fit.runMisfits,
    worstRunId: worst?.runId ?? null,
  };
}

function runsFor(input: JobInput, source: CoefficientSource): readonly JobRun[] {
  if (source.kind === 'chosen runs')
    return input.runs.filter(({ id }) => source.runIds.includes(id));
  if (source.kind === 'learning runs')
    return input.runs.filter(({ purpose }) => purpose === 'base' || purpose === 'trial');
  return input.runs;
}

function fitRunOf(input: JobInput, run: JobRun): FitRun {
  return {
    runId: run.id,
    vectors: vectorsOf(run, input.points),
    unbalance: unbalanceByPlane(
      run.weights,
      input.planes.map(({ id }) => id),
    ),
  };
}

function listed(input: JobInput, matrix: ComplexMatrix): StoredCoefficient[] {
  return input.planes.flatMap((plane, i) =>
    input.points.map((point, p) => {
      const { re, im } = matrix[p]?.[i] ?? ZERO;
      return { planeId: plane.id, pointId: point.id, rePerGmm: re, imPerGmm: im };
    }),
  );
}

function entryOf(
  coefficients: readonly StoredCoefficient[],
  planeId: number,
  pointId: number,
): StoredCoefficient | undefined {
  return coefficients.find((c) => c.planeId === planeId && c.pointId === pointId);
}
