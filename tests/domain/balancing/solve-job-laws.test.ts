import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '@/lib/domain/balancing/build-answer';
import type { FittedWeight, JobInput, JobRun } from '@/lib/domain/balancing/job-input';
import { predictRun } from '@/lib/domain/balancing/predict-run';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fromPolar, size, subtract, type Complex } from '@/lib/domain/complex';
import { normaliseDeg } from '@/lib/domain/units';
import { valueOf } from './job-builder';
import { jobOfRotor, rotors, runOfRotor, twoPlaneRotors } from './model-rotor';

const turns = fc.double({ min: 0, max: 360, noNaN: true });
const factors = fc.double({ min: 0.05, max: 50, noNaN: true });

function answerTo(input: JobInput): Answer {
  const { answer } = valueOf(solveJob(input));
  if (!answer) throw new Error('The rotor has no answer.');
  return answer;
}

const unbalances = ({ add }: Pick<Answer, 'add'>): Complex[] =>
  add.map(({ unbalanceGmm, angleDeg }) => fromPolar(unbalanceGmm, angleDeg));

/** The weights of an answer, as fitted exactly. */
const asFitted = ({ add }: Answer): FittedWeight[] =>
  add.map(({ planeId, massG, radiusMm, angleDeg }) => ({ planeId, massG, radiusMm, angleDeg }));

function expectSame(got: readonly Complex[], want: readonly Complex[], relative = 1e-9) {
  const scale = Math.max(...want.map(size));
  expect(got).toHaveLength(want.length);
  got.forEach((u, i) => expect(size(subtract(u, want[i]!))).toBeLessThanOrEqual(relative * scale));
}

const withRuns = (input: JobInput, change: (run: JobRun) => JobRun): JobInput => ({
  ...input,
  runs: input.runs.map(change),
});

const turnedLags = (input: JobInput, deg: number) =>
  withRuns(input, (run) => ({
    ...run,
    vectors: run.vectors.map((v) => ({ ...v, lagDeg: normaliseDeg(v.lagDeg + deg) })),
  }));

const scaledReadings = (input: JobInput, factor: number) =>
  withRuns(input, (run) => ({
    ...run,
    vectors: run.vectors.map((v) => ({ ...v, amplitude: factor * v.amplitude })),
  }));

const turnedWeights = (input: JobInput, deg: number) =>
  withRuns(input, (run) => ({
    ...run,
    weights: run.weights.map((w) => ({ ...w, angleDeg: normaliseDeg(w.angleDeg + deg) })),
  }));

describe('solveJob, whatever the rotor', () => {
  it('leaves next to nothing when its answer is fitted', () => {
    fc.assert(
      fc.property(rotors, ({ rotor, trials }) => {
        const answer = answerTo(jobOfRotor(rotor, trials));
        const check = runOfRotor(rotor, 9, 'check', asFitted(answer));
        for (const { amplitude } of check.vectors) expect(amplitude).toBeLessThan(1e-9);
        expect(answer.largestPredicted).toBeLessThan(1e-9);
      }),
    );
  });

  it('does not care where phase is counted from', () => {
    fc.assert(
      fc.property(rotors, turns, ({ rotor, trials }, deg) => {
        const input = jobOfRotor(rotor, trials);
        expectSame(unbalances(answerTo(turnedLags(input, deg))), unbalances(answerTo(input)));
      }),
    );
  });

  it('does not care for the unit of the readings', () => {
    fc.assert(
      fc.property(rotors, factors, ({ rotor, trials }, factor) => {
        const input = jobOfRotor(rotor, trials);
        expectSame(
          unbalances(answerTo(scaledReadings(input, factor))),
          unbalances(answerTo(input)),
        );
      }),
    );
  });

  it('turns with the mark that weights are counted from', () => {
    fc.assert(
      fc.property(rotors, turns, ({ rotor, trials }, deg) => {
        const input = jobOfRotor(rotor, trials);
        const turned = answerTo(input).add.map(({ unbalanceGmm, angleDeg }) =>
          fromPolar(unbalanceGmm, angleDeg + deg),
        );
        expectSame(unbalances(answerTo(turnedWeights(input, deg))), turned);
      }),
    );
  });

  it('is mirrored where lags and angles are both mirrored', () => {
    fc.assert(
      fc.property(rotors, ({ rotor, trials }) => {
        const input = jobOfRotor(rotor, trials);
        const mirrored = withRuns(input, (run) => ({
          ...run,
          vectors: run.vectors.map((v) => ({ ...v, lagDeg: normaliseDeg(-v.lagDeg) })),
          weights: run.weights.map((w) => ({ ...w, angleDeg: normaliseDeg(-w.angleDeg) })),
        }));
        const back = answerTo(mirrored).add.map(({ unbalanceGmm, angleDeg }) =>
          fromPolar(unbalanceGmm, -angleDeg),
        );
        expectSame(back, unbalances(answerTo(input)));
      }),
    );
  });

  it('learns the same from a trial twice as heavy', () => {
    fc.assert(
      fc.property(rotors, ({ rotor, trials }) => {
        const doubled = trials.map((w) => ({ ...w, massG: 2 * w.massG }));
        const once = answerTo(jobOfRotor(rotor, trials));
        expectSame(unbalances(answerTo(jobOfRotor(rotor, doubled))), unbalances(once));
      }),
    );
  });

  it('learns the same from one mass at another radius with the same unbalance', () => {
    fc.assert(
      fc.property(rotors, factors, ({ rotor, trials }, factor) => {
        const moved = trials.map((w) => ({
          ...w,
          massG: w.massG * factor,
          radiusMm: w.radiusMm / factor,
        }));
        const once = answerTo(jobOfRotor(rotor, trials));
        expectSame(unbalances(answerTo(jobOfRotor(rotor, moved))), unbalances(once));
      }),
    );
  });

  it('gives the planes in another order when they are named in another order', () => {
    fc.assert(
      fc.property(twoPlaneRotors(), ({ rotor, trials }) => {
        const input = jobOfRotor(rotor, trials);
        const reversed = {
          ...input,
          planes: [...input.planes].reverse(),
          points: [...input.points].reverse(),
        };
        const answer = answerTo(reversed);
        expect(answer.add.map(({ planeId }) => planeId)).toEqual([2, 1]);
        expectSame(unbalances(answer).reverse(), unbalances(answerTo(input)));
      }),
    );
  });

  it('does not care for the numbers that planes and points have', () => {
    const ids = fc.uniqueArray(fc.integer({ min: 1, max: 10_000 }), { minLength: 2, maxLength: 2 });
    fc.assert(
      fc.property(rotors, ids, ids, ({ rotor, trials }, planeIds, pointIds) => {
        const input = jobOfRotor(rotor, trials);
        const plane = (id: number) => planeIds[id - 1]!;
        const point = (id: number) => pointIds[id - 1]!;
        const renumbered = withRuns(
          {
            ...input,
            planes: input.planes.map((p) => ({ ...p, id: plane(p.id) })),
            points: input.points.map((p) => ({ ...p, id: point(p.id) })),
          },
          (run) => ({
            ...run,
            vectors: run.vectors.map((v) => ({ ...v, pointId: point(v.pointId) })),
            weights: run.weights.map((w) => ({ ...w, planeId: plane(w.planeId) })),
          }),
        );
        const answer = answerTo(renumbered);
        expect(answer.add.map(({ planeId }) => planeId)).toEqual(planeIds.slice(0, trials.length));
        expectSame(unbalances(answer), unbalances(answerTo(input)));
      }),
    );
  });

  it('learns the same whether the first trial is taken off or left on while the second runs', () => {
    fc.assert(
      fc.property(twoPlaneRotors(), ({ rotor, trials }) => {
        const removed = jobOfRotor(rotor, trials);
        const leftOn = {
          ...removed,
          runs: [...removed.runs.slice(0, 2), runOfRotor(rotor, 3, 'trial', trials)],
        };
        expectSame(unbalances(answerTo(leftOn)), unbalances(answerTo(removed)), 1e-8);
        const total = (answer: Answer) => unbalances({ add: answer.total });
        const staying = answerTo({ ...leftOn, weightsNow: trials });
        expectSame(total(staying), total(answerTo(removed)), 1e-8);
      }),
    );
  });

  it('states the same total whatever stays on the rotor', () => {
    fc.assert(
      fc.property(rotors, ({ rotor, trials }) => {
        const input = jobOfRotor(rotor, trials);
        // With one plane the trial run itself is the state that stays.
        const both = trials.length > 1 ? [runOfRotor(rotor, 7, 'trial', trials)] : [];
        const staying = { ...input, runs: [...input.runs, ...both], weightsNow: trials };
        const total = (answer: Answer) => unbalances({ add: answer.total });
        expectSame(total(answerTo(staying)), total(answerTo(input)), 1e-8);
      }),
    );
  });

  it('predicts every run of the rotor, whatever hangs there', () => {
    const masses = fc.double({ min: 1, max: 100, noNaN: true });
    fc.assert(
      fc.property(rotors, masses, turns, ({ rotor, trials }, massG, angleDeg) => {
        const input = jobOfRotor(rotor, trials);
        const weights = [{ planeId: 1, massG, radiusMm: 250, angleDeg }, ...trials];
        const predicted = predictRun(valueOf(solveJob(input)), input, weights);
        const real = runOfRotor(rotor, 8, 'check', weights);
        real.vectors.forEach((v, p) => {
          const [got, want] = [predicted[p]!, v].map((x) => fromPolar(x.amplitude, x.lagDeg));
          expect(size(subtract(got!, want!))).toBeLessThan(1e-8);
        });
      }),
    );
  });

  it('is the same twice, and after a round trip through JSON', () => {
    fc.assert(
      fc.property(rotors, ({ rotor, trials }) => {
        const input = jobOfRotor(rotor, trials);
        const once = solveJob(input);
        expect(solveJob(input)).toEqual(once);
        // As text, because JSON knows no negative zero.
        expect(JSON.stringify(JSON.parse(JSON.stringify(once)))).toBe(JSON.stringify(once));
        const again = JSON.parse(JSON.stringify(input)) as JobInput;
        expect(JSON.stringify(solveJob(again))).toBe(JSON.stringify(once));
      }),
      { numRuns: 30 },
    );
  });
});
