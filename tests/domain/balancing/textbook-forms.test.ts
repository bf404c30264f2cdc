import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitInfluence, responseTo } from '@/lib/domain/balancing/influence-fit';
import type { FittedWeight, JobRun } from '@/lib/domain/balancing/job-input';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { unbalanceOf } from '@/lib/domain/balancing/weights-ledger';
import {
  angleDeg,
  divide,
  fromPolar,
  multiply,
  scale,
  size,
  subtract,
  sum,
  type Complex,
} from '@/lib/domain/complex';
import { job, valueOf } from './job-builder';
import { jobOfRotor, onePlaneRotors, runOfRotor, twoPlaneRotors } from './model-rotor';

const vectorsOf = (run: JobRun): Complex[] =>
  run.vectors.map(({ amplitude, lagDeg }) => fromPolar(amplitude, lagDeg));

function expectAnswer(
  runs: readonly JobRun[],
  radiiMm: readonly number[],
  now: { on: readonly FittedWeight[]; want: readonly Complex[] },
) {
  const input = job(radiiMm, radiiMm.length, runs, { weightsNow: now.on });
  const { answer } = valueOf(solveJob(input));
  const largest = Math.max(...now.want.map(size));
  now.want.forEach((want, i) => {
    const { unbalanceGmm, angleDeg } = answer!.add[i]!;
    const miss = size(subtract(fromPolar(unbalanceGmm, angleDeg), want));
    expect(miss).toBeLessThanOrEqual(1e-9 * largest);
  });
}

/** Two equations in two unknowns by determinants, as the books do it: `H·C = −V`. */
function byDeterminants(h: readonly (readonly Complex[])[], v: readonly Complex[]): Complex[] {
  const [[h11, h12], [h21, h22]] = h as [[Complex, Complex], [Complex, Complex]];
  const [v1, v2] = v as [Complex, Complex];
  const det = subtract(multiply(h11, h22), multiply(h12, h21));
  return [
    scale(divide(subtract(multiply(v1, h22), multiply(h12, v2)), det), -1),
    scale(divide(subtract(multiply(h11, v2), multiply(v1, h21)), det), -1),
  ];
}

// Influence coefficient method, textbooks (e.g. S. S. Rao, Mechanical Vibrations, ch. 9).
describe('the general fit and the textbook forms agree to 1e-9', () => {
  it('one plane, trial taken off: W = −V₀·T/(V₁ − V₀)', () => {
    fc.assert(
      fc.property(onePlaneRotors(), ({ rotor, trials }) => {
        const { runs } = jobOfRotor(rotor, trials);
        const [v0, v1] = runs.map((run) => vectorsOf(run)[0]!);
        const effect = divide(subtract(v1!, v0!), unbalanceOf(trials[0]!));
        expectAnswer(runs, [400], { on: [], want: [scale(divide(v0!, effect), -1)] });
      }),
    );
  });

  it('one plane, trial left on: W = −V₁·T/(V₁ − V₀)', () => {
    fc.assert(
      fc.property(onePlaneRotors(), ({ rotor, trials }) => {
        const { runs } = jobOfRotor(rotor, trials);
        const [v0, v1] = runs.map((run) => vectorsOf(run)[0]!);
        const effect = divide(subtract(v1!, v0!), unbalanceOf(trials[0]!));
        expectAnswer(runs, [400], { on: trials, want: [scale(divide(v1!, effect), -1)] });
      }),
    );
  });

  it('two planes, each trial taken off before the next', () => {
    fc.assert(
      fc.property(twoPlaneRotors(), ({ rotor, trials }) => {
        const { runs } = jobOfRotor(rotor, trials);
        const [v0, v1, v2] = runs.map(vectorsOf);
        const columns = [v1!, v2!].map((v, i) =>
          v.map((after, p) => divide(subtract(after, v0![p]!), unbalanceOf(trials[i]!))),
        );
        const h = [0, 1].map((p) => columns.map((column) => column[p]!));
        expectAnswer(runs, rotor.radiiMm, { on: [], want: byDeterminants(h, v0!) });
      }),
    );
  });

  it('two planes, the first trial left on while the second runs, both on now', () => {
    fc.assert(
      fc.property(twoPlaneRotors(), ({ rotor, trials }) => {
        const [first, second] = trials;
        const runs = [
          runOfRotor(rotor, 1, 'base', []),
          runOfRotor(rotor, 2, 'trial', [first!]),
          runOfRotor(rotor, 3, 'trial', [first!, second!]),
        ];
        const [v0, v1, v2] = runs.map(vectorsOf);
        const h = [0, 1].map((p) => [
          divide(subtract(v1![p]!, v0![p]!), unbalanceOf(first!)),
          divide(subtract(v2![p]!, v1![p]!), unbalanceOf(second!)),
        ]);
        expectAnswer(runs, rotor.radiiMm, { on: trials, want: byDeterminants(h, v2!) });
      }),
    );
  });
});

describe('fitInfluence', () => {
  const runs = [
    { runId: 1, unbalance: [{ re: 0, im: 0 }], vectors: [fromPolar(3.873, 219)] },
    { runId: 2, unbalance: [{ re: 6000, im: 0 }], vectors: [fromPolar(2.46, 251)] },
  ];

  it('finds H = 0.369 mm/s per kg·mm at 2.9° from 15 g at 400 mm', () => {
    const fit = valueOf(fitInfluence(runs, ['1']));
    expect(1000 * size(fit.coefficients[0]![0]!)).toBeCloseTo(0.369, 3);
    expect(angleDeg(fit.coefficients[0]![0]!)).toBeCloseTo(2.9, 1);
    expect(fit.spareRuns).toBe(0);
    expect(fit.misfitRms).toBeLessThan(1e-12);
  });

  it('names the run that fits worst once there is a run to spare', () => {
    const third = {
      runId: 3,
      unbalance: [{ re: 0, im: 6000 }],
      vectors: [fromPolar(9, 0)],
    };
    const fit = valueOf(fitInfluence([...runs, third], ['1']));
    expect(fit.spareRuns).toBe(1);
    const shown = responseTo(fit, third.unbalance);
    const miss = size(subtract(third.vectors[0]!, shown[0]!));
    expect(fit.runMisfits[2]).toEqual({ runId: 3, misfit: miss });
    expect(fit.misfitRms).toBeGreaterThan(0.1);
  });

  it('averages repeated base runs: its covariance is that of a mean', () => {
    const repeats = [runs[0]!, runs[0]!, runs[0]!, runs[1]!].map((run, i) => ({
      ...run,
      runId: i + 1,
    }));
    const fit = valueOf(fitInfluence(repeats, ['1']));
    expect(fit.covariance[0]![0]!.re).toBeCloseTo(1 / 3, 12);
    const mean = sum(repeats.slice(0, 3).map(({ vectors }) => vectors[0]!));
    expect(size(subtract(fit.asFound[0]!, scale(mean, 1 / 3)))).toBeLessThan(1e-12);
    // One reading with and a mean of three without the weight: 1 + 1/3 over the weight squared.
    expect(fit.covariance[1]![1]!.re * 6000 ** 2).toBeCloseTo(4 / 3, 12);
  });
});
