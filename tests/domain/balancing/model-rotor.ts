import fc from 'fast-check';
import type { FittedWeight, JobInput, JobRun } from '@/lib/domain/balancing/job-input';
import { add, angleDeg, fromPolar, multiply, size, type Complex } from '@/lib/domain/complex';
import { job } from './job-builder';

/** A linear rotor: what points show as found, and a coefficient per point and plane, per g·mm. */
export type ModelRotor = {
  readonly asFound: readonly Complex[];
  readonly coefficients: readonly (readonly Complex[])[];
  readonly radiiMm: readonly number[];
};

/** A run of the rotor with these weights on, without noise: `V = V_free + H·u`. */
export function runOfRotor(
  rotor: ModelRotor,
  id: number,
  purpose: JobRun['purpose'],
  weights: readonly FittedWeight[],
): JobRun {
  const vectors = rotor.asFound.map((free, p) => {
    const shown = weights.reduce((v, { planeId, massG, radiusMm, angleDeg: deg }) => {
      const h = rotor.coefficients[p]?.[planeId - 1] ?? { re: NaN, im: NaN };
      return add(v, multiply(h, fromPolar(massG * radiusMm, deg)));
    }, free);
    return { pointId: p + 1, amplitude: size(shown), lagDeg: angleDeg(shown) };
  });
  return { id, purpose, speedRpm: 1485, vectors, weights };
}

/** Base run and one run per plane with its trial, each taken off before the next. */
export function jobOfRotor(rotor: ModelRotor, trials: readonly FittedWeight[]): JobInput {
  const runs = [
    runOfRotor(rotor, 1, 'base', []),
    ...trials.map((trial, i) => runOfRotor(rotor, i + 2, 'trial', [trial])),
  ];
  return job(rotor.radiiMm, rotor.asFound.length, runs, { weightsNow: [] });
}

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const turn = number(0, 359.9);
const vector = (min: number, max: number) =>
  fc.tuple(number(min, max), turn).map(([amp, deg]) => fromPolar(amp, deg));

/** A trial weight heard well: 10 to 60 g anywhere in its plane. */
const trialIn = (planeId: number, radiusMm: number): fc.Arbitrary<FittedWeight> =>
  fc
    .tuple(number(10, 60), turn)
    .map(([massG, deg]) => ({ planeId, massG, radiusMm, angleDeg: deg }));

/** A rotor with its trial weights. */
export type RotorWithTrials = {
  readonly rotor: ModelRotor;
  readonly trials: readonly FittedWeight[];
};

/** Rotors with one plane and `points` points; readings from 1 to 12, coefficients as real fans have. */
export function onePlaneRotors(points = 1): fc.Arbitrary<RotorWithTrials> {
  return fc
    .record({
      asFound: fc.array(vector(1, 12), { minLength: points, maxLength: points }),
      column: fc.array(vector(1e-4, 6e-4), { minLength: points, maxLength: points }),
      trial: trialIn(1, 400),
    })
    .map(({ asFound, column, trial }) => ({
      rotor: { asFound, coefficients: column.map((h) => [h]), radiiMm: [400] },
      trials: [trial],
    }));
}

/** Rotors with two planes that points 1 and 2 tell apart: the far plane counts at most half. */
export function twoPlaneRotors(points = 2): fc.Arbitrary<RotorWithTrials> {
  const near = vector(2e-4, 6e-4);
  const far = vector(2e-5, 1e-4);
  return fc
    .record({
      asFound: fc.array(vector(1, 12), { minLength: points, maxLength: points }),
      pairs: fc.array(fc.tuple(near, far), { minLength: points, maxLength: points }),
      trials: fc.tuple(trialIn(1, 300), trialIn(2, 450)),
    })
    .map(({ asFound, pairs, trials }) => ({
      rotor: {
        asFound,
        coefficients: pairs.map(([one, other], p) => (p % 2 === 0 ? [one, other] : [other, one])),
        radiiMm: [300, 450],
      },
      trials,
    }));
}

/** One- and two-plane rotors, as many points as planes. */
export const rotors: fc.Arbitrary<RotorWithTrials> = fc.oneof(onePlaneRotors(), twoPlaneRotors());
