import { add, fromPolar, size, subtract, ZERO, type Complex } from '../complex';
import { apply } from './complex-matrix';
import type { PointNoise } from './reading-noise';
import type { FittedWeight, JobInput, PointVector } from './job-input';
import {
  coefficientMatrix,
  effectDeviations,
  pointVectors,
  type ResponseModel,
} from './response-model';
import { unbalanceByPlane } from './weights-ledger';

/** What a point is expected to show, with the band that most such runs fall into. */
export type Prediction = PointVector & { readonly band: number | null };

/** What a prediction starts from: the state of the rotor now and how it answers. */
export type PredictionBasis = {
  readonly model: ResponseModel;
  /** What is on the rotor now, and the vectors that belong to it. */
  readonly weightsNow: readonly FittedWeight[];
  readonly now: readonly PointVector[];
  /** How many runs stand behind `now`. */
  readonly nowRuns: number;
  /** Scatter of one reading per point. */
  readonly noise: readonly PointNoise[];
};

/**
 * Half-width of a 95 % interval of one axis of a vector whose size has a given rms. As a circle round the
 * prediction it holds about 85 of 100 runs where the scatter is known well, fewer after three repeats.
 */
const BAND_FACTOR = 1.96 / Math.SQRT2;

/**
 * Reading expected with certain weights on the rotor, `V = V_now + H·(u − u_now)`, and its band: 1.96/√2
 * times the root of the summed variances of the reading itself, of the readings now, and of the
 * effect (through the fit, or from the spread of stored estimates).
 *
 * @param weights everything on the rotor in that run since the job began
 * Source: linear model; propagation of scatter. Example: S05, 60 g at 260° → 0.164 mm/s, band 0.326.
 */
export function predictRun(
  basis: PredictionBasis,
  of: Pick<JobInput, 'planes' | 'points'>,
  weights: readonly FittedWeight[],
): Prediction[] {
  const ids = of.planes.map(({ id }) => id);
  const before = unbalanceByPlane(basis.weightsNow, ids);
  const added = unbalanceByPlane(weights, ids).map((u, i) => subtract(u, before[i] ?? ZERO));
  return predictAdded(basis, of, added);
}

/** The same for unbalance added to what is on the rotor now, g·mm per plane. */
export function predictAdded(
  basis: PredictionBasis,
  of: Pick<JobInput, 'planes' | 'points'>,
  added: readonly Complex[],
): Prediction[] {
  const effect = apply(coefficientMatrix(basis.model, of), added);
  const deviations = of.points.map(
    ({ id }) => basis.noise.find(({ pointId }) => pointId === id)?.deviation ?? null,
  );
  const spreads = effectDeviations(basis.model, of, { unbalance: added, deviations });
  const vectors = of.points.map(({ id }, p) => {
    const now = basis.now.find(({ pointId }) => pointId === id);
    return add(now ? fromPolar(now.amplitude, now.lagDeg) : ZERO, effect[p] ?? ZERO);
  });
  return pointVectors(vectors, of.points).map((vector, p) => ({
    ...vector,
    band: bandOf(deviations[p] ?? null, spreads[p] ?? null, basis.nowRuns),
  }));
}

/** How far a run lies from its prediction, point by point; `inside` is null where no band is known. */
export function missOf(
  predicted: readonly Prediction[],
  measured: readonly PointVector[],
): { readonly pointId: number; readonly miss: number; readonly inside: boolean | null }[] {
  return predicted.map((point) => {
    const got = measured.find(({ pointId }) => pointId === point.pointId);
    const miss = size(
      subtract(
        got ? fromPolar(got.amplitude, got.lagDeg) : ZERO,
        fromPolar(point.amplitude, point.lagDeg),
      ),
    );
    return {
      pointId: point.pointId,
      miss,
      inside: point.band === null ? null : miss <= point.band,
    };
  });
}

function bandOf(deviation: number | null, effect: number | null, nowRuns: number): number | null {
  if (effect === null) return null;
  const reading = (deviation ?? 0) * Math.sqrt(1 + 1 / Math.max(1, nowRuns));
  return BAND_FACTOR * Math.hypot(reading, effect);
}
