import { add, fromPolar, scale, sum, type Complex } from '../complex';
import type { ModelledPlane, UnbalanceStep } from './modelled-machine';

/** A weight on a rotor: plane by its place in the machine's list, angle against rotation. */
export type ModelledWeight = {
  readonly plane: number;
  readonly massG: number;
  readonly radiusMm: number;
  readonly angleDeg: number;
};

/**
 * Unbalance of a bare plane on a day, g·mm, angle against rotation: start and drift, with the steps
 * up to that day in their order; a step that resets begins drift anew.
 *
 * Example: start 100 at 0°, drift 1 a day at 90°, day 50: (100, 50).
 */
export function unbalanceAt(plane: ModelledPlane, day: number): Complex {
  const passed = plane.steps.filter((step) => step.day <= day);
  const from: UnbalanceStep = passed.findLast(({ resets }) => resets) ?? {
    day: 0,
    gmm: plane.startGmm,
  };
  const since = passed.slice(passed.indexOf(from) + 1).map(({ gmm }) => gmm);
  return add(sum([from.gmm, ...since]), scale(plane.driftGmmPerDay, day - from.day));
}

/** Unbalance the weights of one plane make, g·mm. Example: 10 g at 200 mm and 0° are 2000 g·mm. */
export function unbalanceOfWeights(weights: readonly ModelledWeight[], plane: number): Complex {
  return sum(
    weights
      .filter((weight) => weight.plane === plane)
      .map(({ massG, radiusMm, angleDeg }) => fromPolar(massG * radiusMm, angleDeg)),
  );
}
