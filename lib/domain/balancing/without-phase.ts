import { Matrix, solve } from 'ml-matrix';
import { fail, ok, type Result } from '../result';
import { normaliseDeg } from '../units';
import { rootMeanSquare } from './influence-fit';

/** Sizes only: a base run and runs with one mass at three positions or more. */
export type PhaselessRuns = {
  readonly baseAmplitude: number;
  readonly trialMassG: number;
  readonly runs: readonly { readonly angleDeg: number; readonly amplitude: number }[];
};

/** The answer from sizes, and how well they fit together. */
export type PhaselessAnswer = {
  readonly massG: number;
  readonly angleDeg: number;
  /** What the trial mass does by itself, in the unit of the readings. */
  readonly effect: number;
  /** 1 is perfect; outside 0.85 to 1.15 the runs are to be repeated. */
  readonly consistency: number;
  readonly trusted: boolean;
  readonly fitted: readonly number[];
  readonly misfitRms: number;
};

const CONSISTENT = { least: 0.85, most: 1.15 };
/** Directions that differ by less than this are one position. */
const SAME_PLACE = 1e-6;

/**
 * One-plane correction without phase, by least squares on squared sizes:
 * `A² = V₀² + d² + 2·V₀·d·cos(φ − θ)` for the mass at positions θ; mass = trial·V₀/d at φ + 180.
 *
 * @param runs angles in degrees against rotation from any chosen mark; sizes in one unit; mass in g
 * @returns mass in g at the trial's radius and angle, consistency, or a failure where fewer than three
 *   positions were tried or no circle goes through the sizes
 * Source: four-run method, trade literature (D. Shreve, Balancing Without Phase).
 * @example S13: 15 g at 0°, 120°, 240° → 35.1 g at 297.9°, consistency 1.019
 */
export function solveWithoutPhase({
  baseAmplitude: base,
  trialMassG,
  runs,
}: PhaselessRuns): Result<PhaselessAnswer> {
  if (!(base > 0) || !(trialMassG > 0))
    return fail(
      'weight-zero',
      'The base reading and the trial mass must be above zero. Enter what was measured and weighed.',
    );
  const places = new Set(
    runs.map(({ angleDeg }) => Math.round(normaliseDeg(angleDeg) / SAME_PLACE)),
  );
  if (places.size < 3)
    return fail(
      'too-few-positions',
      'With fewer than three positions there are two mirror answers. Run the trial mass at a third position.',
    );
  const design = runs.map(({ angleDeg }) => [
    1,
    Math.cos(radians(angleDeg)),
    Math.sin(radians(angleDeg)),
  ]);
  const squares = Matrix.columnVector(runs.map(({ amplitude }) => amplitude ** 2 - base ** 2));
  const [d2 = 0, x = 0, y = 0] = solve(new Matrix(design), squares, true).to1DArray();
  if (!(d2 > 0))
    return fail(
      'impossible-sizes',
      'The runs are not larger on average than the base run, which one mass moved round cannot do. Repeat the runs at one speed.',
    );
  const effect = Math.sqrt(d2);
  const phi = Math.atan2(y, x);
  const fitted = runs.map(({ angleDeg }) =>
    Math.sqrt(Math.max(0, base ** 2 + d2 + 2 * base * effect * Math.cos(phi - radians(angleDeg)))),
  );
  const consistency = Math.hypot(x, y) / (2 * base * effect);
  return ok({
    massG: (trialMassG * base) / effect,
    angleDeg: normaliseDeg((phi * 180) / Math.PI + 180),
    effect,
    consistency,
    trusted: consistency >= CONSISTENT.least && consistency <= CONSISTENT.most,
    fitted,
    misfitRms: rootMeanSquare(runs.map(({ amplitude }, i) => amplitude - (fitted[i] ?? 0))),
  });
}

function radians(deg: number): number {
  return (deg * Math.PI) / 180;
}
