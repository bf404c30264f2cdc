import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  apply,
  columnOf,
  dot,
  norm,
  pseudoInverse,
  scaledSingularValues,
  singularValues,
} from '@/lib/domain/balancing/complex-matrix';
import { conditionOf } from '@/lib/domain/balancing/condition';
import { misfits, rootMeanSquare } from '@/lib/domain/balancing/influence-fit';
import {
  residualAfter,
  solveCorrection,
  solveMinMax,
  solveStaticPair,
  type CorrectionTask,
} from '@/lib/domain/balancing/solve-correction';
import { angleDeg, fromPolar, scale, size, subtract, type Complex } from '@/lib/domain/complex';
import { codeOf, valueOf } from './job-builder';
import { near, nearDeg } from './near';

const real = (...values: number[]): Complex[] => values.map((re) => ({ re, im: 0 }));
const vector = (min: number, max: number) =>
  fc
    .tuple(fc.double({ min, max, noNaN: true }), fc.double({ min: 0, max: 360, noNaN: true }))
    .map(([amp, deg]) => fromPolar(amp, deg));
const rows = (points: number, planes: number) =>
  fc.array(fc.array(vector(0.1, 1), { minLength: planes, maxLength: planes }), {
    minLength: points,
    maxLength: points,
  });
const nows = (points: number) =>
  fc.array(vector(0.5, 10), { minLength: points, maxLength: points });
const largest = (vectors: readonly Complex[]) => Math.max(...vectors.map(size));

describe('complex matrices', () => {
  it('(1, 2)·(3, 4) is 11, and a length takes both parts', () => {
    expect(dot(real(1, 2), real(3, 4))).toEqual({ re: 11, im: 0 });
    expect(
      norm([
        { re: 3, im: 0 },
        { re: 0, im: 4 },
      ]),
    ).toBe(5);
    expect(apply([real(1, 1)], real(2, 5))).toEqual(real(7));
    expect(columnOf([real(1, 2), real(3, 4)], 1)).toEqual(real(2, 4));
  });

  it('singular values: 3 + 4j has 5, a diagonal its sizes, largest first', () => {
    expect(singularValues([[{ re: 3, im: 4 }]]).map((v) => v.toFixed(9))).toEqual(['5.000000000']);
    const diagonal = singularValues([
      [fromPolar(2, 40), ...real(0)],
      [...real(0), fromPolar(7, 200)],
    ]);
    near(diagonal[0]!, 7, 1e-12);
    near(diagonal[1]!, 2, 1e-12);
  });

  it('has as many singular values as its smaller side', () => {
    expect(singularValues([real(1, 2, 3)])).toHaveLength(1);
    expect(singularValues([real(1), real(2), real(3)])).toHaveLength(1);
  });

  it('scaled singular values ignore the length of columns; one of zeros stays', () => {
    const matrix = [real(1, 300), real(2, -100)];
    const scaled = [real(1000, 0.3), real(2000, -0.1)];
    scaledSingularValues(scaled).forEach((v, i) =>
      near(v, scaledSingularValues(matrix)[i]!, 1e-12),
    );
    expect(scaledSingularValues([real(1, 0), real(2, 0)])[1]).toBeLessThan(1e-12);
  });

  it('the pseudo-inverse undoes the matrix, tall or square, whatever the column lengths', () => {
    expect(pseudoInverse([real(2)])).toEqual([real(0.5)]);
    fc.assert(
      fc.property(
        fc.integer({ min: 2, max: 5 }).chain((p) => rows(p, 2)),
        (matrix) => {
          fc.pre(conditionOf(matrix).number < 1e3);
          const uneven = matrix.map(([a, b]) => [scale(a!, 1e-6), b!]);
          const inverse = pseudoInverse(uneven);
          [0, 1].forEach((i) => {
            const back = apply(inverse, columnOf(uneven, i));
            const unit = [0, 1].map((k) => ({ re: k === i ? 1 : 0, im: 0 }));
            // The first unknown is a million times larger: compare what it does, not what it is.
            const shown = apply(
              uneven,
              back.map((z, k) => subtract(z, unit[k]!)),
            );
            expect(largest(shown)).toBeLessThan(1e-9);
          });
        },
      ),
    );
  });
});

describe('conditionOf', () => {
  const like = (deg: number) =>
    conditionOf([
      [fromPolar(1, 0), fromPolar(1, 0)],
      [fromPolar(1, 0), fromPolar(1, deg)],
    ]);

  it('is 1 for planes that act apart, at most 1e9 for planes that act alike', () => {
    near(conditionOf([real(5, 0), real(0, 0.1)]).number, 1, 1e-9);
    expect(like(0)).toEqual({ number: 1e9, verdict: 'withhold' });
  });

  it('is good below 5, caution to 15, withheld above', () => {
    // Columns (1, 1) and (1, e^jd) have 1/tan(d/4).
    const conditions = [90, 40, 20, 10].map(like);
    [22.5, 10, 5, 2.5].forEach((quarter, i) =>
      near(conditions[i]!.number, 1 / Math.tan((quarter * Math.PI) / 180), 1e-9),
    );
    expect(conditions.map(({ verdict }) => verdict)).toEqual([
      'good',
      'caution',
      'caution',
      'withhold',
    ]);
  });
});

describe('solveCorrection', () => {
  it('3.873 at 219° with 0.3688 mm/s per kg·mm at 2.9° asks for 10 502 g·mm at 36.1°', () => {
    const task = { now: [fromPolar(3.873, 219)], coefficients: [[fromPolar(0.3688e-3, 2.9)]] };
    const [answer] = valueOf(solveCorrection(task));
    near(size(answer!), 10_502, 1);
    nearDeg(angleDeg(answer!), 36.1, 0.01);
  });

  it('leaves the least squares: no other correction has less', () => {
    const nudges = fc.tuple(vector(0.001, 2), vector(0.001, 2));
    fc.assert(
      fc.property(rows(4, 2), nows(4), nudges, (coefficients, now, nudge) => {
        const task = { now, coefficients };
        const best = valueOf(solveCorrection(task));
        const other = best.map((u, i) => subtract(u, nudge[i]!));
        const left = norm(residualAfter(task, best));
        expect(left).toBeLessThanOrEqual(norm(residualAfter(task, other)) + 1e-9);
      }),
    );
  });

  it('a point that counts more is left with less', () => {
    const now = real(1, -1);
    const coefficients = [real(1), real(1)];
    const leftAtFirst = [1, 3, 10].map((weight) => {
      const task = { now, coefficients, pointWeights: [weight, 1] };
      return size(residualAfter(task, valueOf(solveCorrection(task)))[0]!);
    });
    expect(leftAtFirst[0]).toBeCloseTo(1, 12);
    // Weighted mean of −1 and 1 with squares of the weights: 1 − (w² − 1)/(w² + 1).
    expect(leftAtFirst[1]).toBeCloseTo(0.2, 12);
    expect(leftAtFirst[2]).toBeCloseTo(2 / 101, 12);
  });

  it('refuses fewer points than planes, and planes that do nothing', () => {
    expect(codeOf(solveCorrection({ now: real(1), coefficients: [real(1, 1)] }))).toBe(
      'too-few-points',
    );
    expect(codeOf(solveCorrection({ now: real(1), coefficients: [real(0)] }))).toBe('no-response');
  });
});

describe('solveMinMax', () => {
  const task: CorrectionTask = { now: real(1, 1, -1), coefficients: [real(1), real(1), real(1)] };

  it('1, 1 and −1 with one plane: 1 at most, where least squares leaves 4/3', () => {
    const least = residualAfter(task, valueOf(solveCorrection(task)));
    near(largest(least), 4 / 3, 1e-12);
    const [answer] = valueOf(solveMinMax(task));
    near(size(answer!), 0, 0.01);
    near(largest(residualAfter(task, [answer!])), 1, 0.01);
  });

  it('is never above least squares, weighted or not', () => {
    const weights = fc.array(fc.double({ min: 0.2, max: 5, noNaN: true }), {
      minLength: 4,
      maxLength: 4,
    });
    fc.assert(
      fc.property(rows(4, 2), nows(4), weights, (coefficients, now, pointWeights) => {
        const given = { now, coefficients, pointWeights };
        const left = (answer: readonly Complex[]) =>
          Math.max(...residualAfter(given, answer).map((v, p) => pointWeights[p]! * size(v)));
        const minMax = left(valueOf(solveMinMax(given)));
        expect(minMax).toBeLessThanOrEqual(left(valueOf(solveCorrection(given))) + 1e-12);
      }),
      { numRuns: 20 },
    );
  });

  it('is the exact answer where points equal planes', () => {
    const square = { now: real(1, 2), coefficients: [real(2, 1), real(1, 3)] };
    const [got, want] = [solveMinMax(square), solveCorrection(square)].map(valueOf);
    got!.forEach((u, i) => expect(size(subtract(u, want![i]!))).toBeLessThan(1e-9));
  });

  it('refuses what least squares refuses', () => {
    expect(codeOf(solveMinMax({ now: real(1), coefficients: [real(0)] }))).toBe('no-response');
  });
});

describe('solveStaticPair', () => {
  it('puts the same in each plane and solves one unknown exactly where it can', () => {
    const task = { now: real(6, 6), coefficients: [real(2, 1), real(1, 2)] };
    const pair = valueOf(solveStaticPair(task));
    expect(pair.map(({ re }) => re.toFixed(9))).toEqual(['-2.000000000', '-2.000000000']);
    expect(largest(residualAfter(task, pair))).toBeLessThan(1e-12);
  });

  it('refuses planes that cancel each other', () => {
    const against = { now: real(1, 1), coefficients: [real(1, -1), real(2, -2)] };
    expect(codeOf(solveStaticPair(against))).toBe('no-response');
  });
});

describe('misfits', () => {
  it('rms of 3 and 4 is √12.5, of nothing 0', () => {
    near(rootMeanSquare([3, 4]), Math.sqrt(12.5), 1e-12);
    expect(rootMeanSquare([])).toBe(0);
  });

  it('is zero for runs that the model was made from', () => {
    const model = { asFound: real(2), coefficients: [real(0.5)] };
    const runs = [{ runId: 4, unbalance: real(6), vectors: real(5) }];
    expect(misfits(runs, model)).toEqual({ misfitRms: 0, runMisfits: [{ runId: 4, misfit: 0 }] });
  });
});
