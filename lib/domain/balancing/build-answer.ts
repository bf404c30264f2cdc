import { add, angleDeg, fromPolar, size, ZERO, type Complex } from '../complex';
import { ok, type Result } from '../result';
import { centrifugalForceN, weightN } from './centrifugal-force';
import type { JobInput, JobPlane } from './job-input';
import { predictAdded, type Prediction, type PredictionBasis } from './predict-run';
import { staticAndCouple, sumOverTotal } from './residual-unbalance';
import { coefficientMatrix, effectDeviations } from './response-model';
import {
  solveCorrection,
  solveCouplePair,
  solveMinMax,
  solveStaticPair,
  type CorrectionTask,
} from './solve-correction';
import { solveWithinLimits } from './solve-limited';
import { polarUnbalance, unbalanceByPlane, type PolarUnbalance } from './weights-ledger';

/** A weight that an answer asks for in one plane. */
export type PlaneAnswer = PolarUnbalance & {
  readonly planeId: number;
  readonly planeName: string;
  /** Mass at the plane's radius, g. */
  readonly massG: number;
  readonly radiusMm: number;
  /** At the mean speed of the runs. */
  readonly forceN: number;
  readonly forcePctOfRotorWeight: number | null;
  /** One standard deviation; null where neither scatter nor spread is known. */
  readonly uncertaintyG: number | null;
  readonly uncertaintyGmm: number | null;
  readonly uncertaintyDeg: number | null;
};

/** One way to correct, complete. */
export type Answer = {
  readonly kind:
    'exact' | 'least squares' | 'min-max' | 'static pair' | 'couple pair' | 'within limits';
  /** Add to what is on the rotor now. */
  readonly add: readonly PlaneAnswer[];
  /** What hangs there then of all fitted since the job began: the total from as-found. */
  readonly total: readonly PlaneAnswer[];
  readonly predicted: readonly Prediction[];
  readonly largestPredicted: number;
  /** |vector sum| over sum of sizes of the added unbalance; below 0.3 weights fight each other. */
  readonly sumOverTotal: number;
  /** With two planes: static part in each, couple part added in the first and taken from the second. */
  readonly staticPart: PolarUnbalance | null;
  readonly couplePart: PolarUnbalance | null;
};

/** What answers are built from. */
export type AnswerTask = {
  readonly input: JobInput;
  readonly basis: PredictionBasis;
  readonly meanRpm: number;
};

const SOLVERS: Readonly<Record<Answer['kind'], (task: CorrectionTask) => Result<Complex[]>>> = {
  exact: solveCorrection,
  'least squares': solveCorrection,
  'min-max': solveMinMax,
  'static pair': solveStaticPair,
  'couple pair': solveCouplePair,
  'within limits': solveWithinLimits,
};

type LinearKind = Exclude<Answer['kind'], 'min-max' | 'within limits'>;

/** How readings carry into an answer: the nearest solution that is linear in them. */
const LINEAR: Readonly<Record<Answer['kind'], LinearKind>> = {
  exact: 'exact',
  'least squares': 'least squares',
  'min-max': 'least squares',
  'within limits': 'least squares',
  'static pair': 'static pair',
  'couple pair': 'couple pair',
};

/**
 * One answer of a kind with everything that comes with it: weights to add and in total in g, mm and
 * degrees against rotation, force in N, uncertainty, predicted reading per point with band.
 * Uncertainty: readings and coefficients carried through the solution, `√Σ|M|²(s² + n²)`; with one
 * plane `|dW|/|W| = √((s/|V₀|)² + (n/|V₁−V₀|)²)`, and the angle its arctangent.
 * Source: propagation of scatter. Example: S01 → 26.27 g at 36.1° on 400 mm.
 */
export function buildAnswer(task: AnswerTask, kind: Answer['kind']): Result<Answer> {
  const { input, basis } = task;
  const correction = correctionTask(task);
  const solved = SOLVERS[kind](correction);
  if (!solved.ok) return solved;
  const added = solved.value;
  const spread = uncertainties(task, LINEAR[kind], added);
  const onNow = unbalanceByPlane(
    basis.weightsNow,
    input.planes.map(({ id }) => id),
  );
  const predicted = predictAdded(basis, input, added);
  const [first, second] = added;
  const parts = added.length === 2 && first && second ? staticAndCouple(first, second) : null;
  const answers = (vectors: readonly Complex[]) =>
    input.planes.map((plane, i) =>
      planeAnswer(task, plane, { vector: vectors[i] ?? ZERO, spread: spread[i] ?? null }),
    );
  return ok({
    kind,
    add: answers(added),
    total: answers(added.map((u, i) => add(u, onNow[i] ?? ZERO))),
    predicted,
    largestPredicted: Math.max(0, ...predicted.map(({ amplitude }) => amplitude)),
    sumOverTotal: sumOverTotal(added),
    staticPart: parts && polarUnbalance(parts.staticPart),
    couplePart: parts && polarUnbalance(parts.couplePart),
  });
}

/** Standard deviation of unbalance per plane, g·mm, that follows from readings alone; null if unknown. */
export function uncertainties(
  task: AnswerTask,
  kind: LinearKind,
  added: readonly Complex[],
): (number | null)[] {
  const { input, basis } = task;
  const correction = correctionTask(task);
  const deviations = input.points.map(
    ({ id }) => basis.noise.find(({ pointId }) => pointId === id)?.deviation ?? null,
  );
  const effects = effectDeviations(basis.model, input, { unbalance: added, deviations });
  const columns = input.points.map((_, p) => {
    const unit = correction.now.map((__, q) => (q === p ? { re: 1, im: 0 } : ZERO));
    const solved = SOLVERS[kind]({ ...correction, now: unit });
    return solved.ok ? solved.value : [];
  });
  return input.planes.map((_, i) => {
    const parts = columns.map((column, p) => {
      const effect = effects[p] ?? null;
      const whole = effect === null ? NaN : Math.hypot(deviations[p] ?? 0, effect);
      return size(column[i] ?? ZERO) * whole;
    });
    const total = Math.hypot(...parts);
    return Number.isFinite(total) ? total : null;
  });
}

function correctionTask({ input, basis }: AnswerTask): CorrectionTask {
  return {
    now: input.points.map(({ id }) => {
      const vector = basis.now.find(({ pointId }) => pointId === id);
      return vector ? fromPolar(vector.amplitude, vector.lagDeg) : ZERO;
    }),
    coefficients: coefficientMatrix(basis.model, input),
    pointWeights: input.points.map(({ weight }) => weight ?? 1),
    limitsGmm: input.planes.map(({ roomG, radiusMm }) =>
      roomG === null || roomG === undefined ? null : roomG * radiusMm,
    ),
  };
}

function planeAnswer(
  { input, meanRpm }: AnswerTask,
  plane: JobPlane,
  { vector, spread }: { readonly vector: Complex; readonly spread: number | null },
): PlaneAnswer {
  const unbalanceGmm = size(vector);
  const forceN = centrifugalForceN(unbalanceGmm, meanRpm);
  const massKg = input.rotor?.massKg ?? 0;
  return {
    planeId: plane.id,
    planeName: plane.name,
    unbalanceGmm,
    angleDeg: angleDeg(vector),
    massG: unbalanceGmm / plane.radiusMm,
    radiusMm: plane.radiusMm,
    forceN,
    forcePctOfRotorWeight: massKg > 0 ? (100 * forceN) / weightN(massKg) : null,
    uncertaintyGmm: spread,
    uncertaintyG: spread === null ? null : spread / plane.radiusMm,
    uncertaintyDeg: spread === null ? null : (Math.atan2(spread, unbalanceGmm) * 180) / Math.PI,
  };
}
