import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  checkReuse,
  compareVectors,
  compareWithStored,
  gradeOf,
  summariseCoefficient,
} from '@/lib/domain/balancing/coefficient-book';
import type { CoefficientSource } from '@/lib/domain/balancing/job-input';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { add, angleDeg, fromPolar, multiply, scale, size, subtract } from '@/lib/domain/complex';
import { codeOf, job, run, valueOf, weight } from './job-builder';
import { near, nearDeg } from './near';

describe('summariseCoefficient', () => {
  it('grades up to 10 % good, up to 20 % with care, above that not for reuse', () => {
    expect([5.4, 10, 12, 20, 20.1, 25].map(gradeOf)).toEqual([
      'good',
      'good',
      'with care',
      'with care',
      'not for reuse',
      'not for reuse',
    ]);
    expect(gradeOf(null)).toBe('with care');
  });

  it('counts the spread with n − 1', () => {
    const entry = summariseCoefficient([fromPolar(0.9, 0), fromPolar(1.1, 0)])!;
    near(entry.spreadPerGmm!, Math.sqrt(0.02), 1e-12);
    near(entry.spreadPct!, 100 * Math.sqrt(0.02), 1e-9);
    expect(entry).toMatchObject({ count: 2, grade: 'with care' });
    near(entry.estimates[1]!.ratio, 1.1, 1e-12);
  });

  it('a single estimate has no spread and asks for care; none is no entry', () => {
    expect(summariseCoefficient([fromPolar(1, 30)])).toMatchObject({
      count: 1,
      spreadPerGmm: null,
      spreadPct: null,
      grade: 'with care',
    });
    expect(summariseCoefficient([])).toBeNull();
  });

  it('opposite estimates are never for reuse', () => {
    const entry = summariseCoefficient([fromPolar(1, 0), fromPolar(1, 179)])!;
    expect(entry.grade).toBe('not for reuse');
  });
});

describe('checkReuse', () => {
  const now = { speedRpm: 1485, setUpId: 3 };

  it('allows the same set-up within 1 %', () => {
    const reuse = valueOf(checkReuse({ speedRpm: 1495, setUpId: 3 }, now));
    near(reuse.speedDifferencePct, 0.669, 0.001);
  });

  it('refuses 1500 r/min for a coefficient of 1485, 1.01 % apart', () => {
    const refused = checkReuse({ speedRpm: 1485, setUpId: 3 }, { ...now, speedRpm: 1500 });
    expect(codeOf(refused)).toBe('speed-differs');
    expect(refused.ok ? '' : refused.failure.message).toContain('1.01 %');
  });

  it('refuses another set-up whatever the speed', () => {
    expect(codeOf(checkReuse({ speedRpm: 1485, setUpId: 4 }, now))).toBe('set-up-differs');
  });
});

describe('compareVectors', () => {
  it('0.381 at 10.0° against 0.369 at 2.9° is 1.03 and 7.1°', () => {
    const compared = compareVectors(fromPolar(0.381, 10), fromPolar(0.369, 2.9));
    near(compared.ratio, 1.0325, 0.0001);
    near(compared.turnDeg, 7.1, 1e-9);
    near(compared.differencePct, 13, 0.5);
  });

  it('turns the short way round, and against nothing is nothing', () => {
    near(compareVectors(fromPolar(1, 350), fromPolar(1, 10)).turnDeg, -20, 1e-9);
    expect(compareVectors(fromPolar(1, 0), { re: 0, im: 0 }).ratio).toBe(0);
  });
});

describe('compareWithStored', () => {
  const stored = fromPolar(0.25, 346);

  it('suspects the sense of counting where the turn is −2 times the typed angle', () => {
    const angles = fc.double({ min: 20, max: 160, noNaN: true });
    fc.assert(
      fc.property(angles, (typed) => {
        // Typed against rotation, hung with it: the coefficient comes out turned by −2·angle.
        const fresh = multiply(stored, fromPolar(1, -2 * typed));
        const compared = compareWithStored(fresh, stored, typed);
        expect(compared.sensesSuspect).toBe(true);
        expect(compared.agrees).toBe(false);
      }),
    );
  });

  it('cannot tell with the trial at the mark, where both senses agree', () => {
    expect(compareWithStored(stored, stored, 0)).toEqual({
      ratio: 1,
      turnDeg: 0,
      agrees: true,
      sensesSuspect: false,
    });
  });

  it('agrees within 0.7 to 1.4 and 25°, and blames no sense where the size is off', () => {
    const agrees = (ratio: number, deg: number) =>
      compareWithStored(multiply(stored, fromPolar(ratio, deg)), stored, 75).agrees;
    expect([agrees(0.71, 24), agrees(1.39, -24)]).toEqual([true, true]);
    expect([agrees(0.69, 0), agrees(1.41, 0), agrees(1, 26)]).toEqual([false, false, false]);
    const heavy = compareWithStored(multiply(stored, fromPolar(2, -150)), stored, 75);
    expect(heavy.sensesSuspect).toBe(false);
  });
});

describe('a job with stored coefficients', () => {
  const { re, im } = fromPolar(1.63e-4, 24.9);
  const stored = { planeId: 1, pointId: 1, rePerGmm: re, imPerGmm: im, spreadPerGmm: 8.8e-6 };
  const from = (over: Partial<Extract<CoefficientSource, { kind: 'stored' }>> = {}) => ({
    kind: 'stored' as const,
    speedRpm: 1485,
    coefficients: [stored],
    ...over,
  });
  const base = run(1, 'base', [{ amp: 4.39, deg: 107 }], [], 1485);
  const solveFrom = (coefficientsFrom: CoefficientSource) =>
    solveJob(job([450], 1, [base], { coefficientsFrom }));

  it('needs no trial run', () => {
    const { answer, model, trials, nowRunIds } = valueOf(solveFrom(from()));
    near(answer!.add[0]!.massG, 59.85, 0.05);
    expect(model).toMatchObject({ source: 'stored', covariance: null, spareRuns: 0 });
    expect(trials).toEqual([]);
    expect(nowRunIds).toEqual([1]);
  });

  it('refuses another speed and a gap in the book, naming plane and point', () => {
    expect(codeOf(solveFrom(from({ speedRpm: 1503 })))).toBe('speed-differs');
    const gap = solveFrom(from({ coefficients: [{ ...stored, pointId: 2 }] }));
    expect(codeOf(gap)).toBe('coefficient-missing');
    expect(gap.ok ? '' : gap.failure.message).toContain('plane P1 at Q1');
  });

  it('has no band where the spread of the estimates is unknown', () => {
    const alone = { ...stored, spreadPerGmm: null };
    const { answer } = valueOf(solveFrom(from({ coefficients: [alone] })));
    expect(answer!.predicted[0]!.band).toBeNull();
    expect(answer!.add[0]!.uncertaintyG).toBeNull();
  });

  it('takes as found what all runs say of the bare rotor', () => {
    const fitted = weight(1, 60, 450, 260);
    const check = run(2, 'check', [{ amp: 0.15, deg: 262 }], [fitted], 1485);
    const input = job([450], 1, [base, check], {
      coefficientsFrom: from(),
      weightsNow: [fitted],
    });
    const { model } = valueOf(solveJob(input));
    expect(model.runIds).toEqual([1, 2]);
    const effect = multiply({ re, im }, fromPolar(60 * 450, 260));
    const bare = subtract(fromPolar(0.15, 262), effect);
    const mean = scale(add(fromPolar(4.39, 107), bare), 0.5);
    near(model.asFound[0]!.amplitude, size(mean), 1e-9);
    nearDeg(model.asFound[0]!.lagDeg, angleDeg(mean), 1e-9);
    expect(model.misfitRms).toBeGreaterThan(0);
  });
});
