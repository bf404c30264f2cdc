import { describe, expect, it } from 'vitest';
import type { Answer } from '@/lib/domain/balancing/build-answer';
import type { JobInput, JobRotor } from '@/lib/domain/balancing/job-input';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { coefficientMatrix } from '@/lib/domain/balancing/response-model';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { angleDeg, fromPolar, size } from '@/lib/domain/complex';
import { job, run, valueOf, weight } from './job-builder';
import { runOfRotor, type ModelRotor } from './model-rotor';
import { near, nearDeg } from './near';

const on = weight(1, 15, 400, 0);
const onePlane = (over: Partial<JobInput> = {}) =>
  job(
    [400],
    1,
    [run(1, 'base', [{ amp: 3.873, deg: 219 }]), run(2, 'trial', [{ amp: 2.46, deg: 251 }], [on])],
    { weightsNow: [], ...over },
  );
const solve = (input: JobInput) => valueOf(solveJob(input));

/** Two planes and three points, so that no answer silences all of them. */
const rotor: ModelRotor = {
  asFound: [fromPolar(4, 30), fromPolar(3, 200), fromPolar(2.5, 100)],
  coefficients: [
    [fromPolar(3e-4, 10), fromPolar(1e-4, 200)],
    [fromPolar(1e-4, 60), fromPolar(4e-4, 300)],
    [fromPolar(2e-4, 90), fromPolar(2e-4, 120)],
  ],
  radiiMm: [300, 450],
};
const three = job(
  rotor.radiiMm,
  3,
  [
    runOfRotor(rotor, 1, 'base', []),
    runOfRotor(rotor, 2, 'trial', [weight(1, 30, 300, 0)]),
    runOfRotor(rotor, 3, 'trial', [weight(2, 30, 450, 0)]),
  ],
  { weightsNow: [] },
);

describe('an answer', () => {
  it('has force, its share of the rotor weight, and mass at the plane’s radius', () => {
    const [plane] = solve(onePlane({ rotor: { massKg: 210 } })).answer!.add;
    near(plane!.massG, 26.27, 0.01);
    nearDeg(plane!.angleDeg, 36.1, 0.05);
    near(plane!.unbalanceGmm, 400 * plane!.massG, 1e-9);
    // 26.27 g at 400 mm and 1480 r/min: 252.4 N of 2059.4 N.
    near(plane!.forceN, 252.4, 0.1);
    near(plane!.forcePctOfRotorWeight!, 12.26, 0.01);
    expect(plane).toMatchObject({ planeId: 1, planeName: 'P1', radiusMm: 400 });
    expect(solve(onePlane()).answer!.add[0]!.forcePctOfRotorWeight).toBeNull();
  });

  it('with one plane is as uncertain as √((s/|V₀|)² + (n/|V₁ − V₀|)²)', () => {
    const [plane] = solve(onePlane({ scatter: 0.05 })).answer!.add;
    const change = size({
      re: fromPolar(2.46, 251).re - fromPolar(3.873, 219).re,
      im: fromPolar(2.46, 251).im - fromPolar(3.873, 219).im,
    });
    const relative = Math.hypot(0.05 / 3.873, (0.05 * Math.SQRT2) / change);
    near(plane!.uncertaintyG! / plane!.massG, relative, 1e-9);
    near(plane!.uncertaintyDeg!, (Math.atan(relative) * 180) / Math.PI, 1e-9);
    near(plane!.uncertaintyGmm!, 400 * plane!.uncertaintyG!, 1e-9);
  });

  it('has no stated uncertainty where no scatter is known', () => {
    const solution = solve(onePlane());
    expect(solution.answer!.add[0]).toMatchObject({ uncertaintyG: null, uncertaintyDeg: null });
    expect(solution.notices.map(({ code }) => code)).toContain('no-repeats');
  });

  it('with more points than planes is least squares, with min-max and static pair beside it', () => {
    const { answer, alternatives } = solve(three);
    expect(answer!.kind).toBe('least squares');
    expect(alternatives.map(({ kind }) => kind)).toEqual(['min-max', 'static pair']);
    const [minMax, pair] = alternatives;
    expect(minMax!.largestPredicted).toBeLessThan(answer!.largestPredicted);
    const rms = ({ predicted }: Answer) => Math.hypot(...predicted.map((p) => p.amplitude));
    expect(rms(answer!)).toBeLessThan(rms(minMax!));
    expect(rms(answer!)).toBeLessThan(rms(pair!));
  });

  it('leaves less where a point counts more', () => {
    const weighty = {
      ...three,
      points: three.points.map((point) => (point.id === 3 ? { ...point, weight: 20 } : point)),
    };
    const leftAt3 = (input: JobInput) => solve(input).answer!.predicted[2]!.amplitude;
    expect(leftAt3(weighty)).toBeLessThan(0.05 * leftAt3(three));
  });

  it('has static and couple parts with two planes only', () => {
    expect(solve(onePlane()).answer).toMatchObject({ staticPart: null, couplePart: null });
    const { staticPart, add } = solve(three).answer!;
    const [first, second] = add.map((p) => fromPolar(p.unbalanceGmm, p.angleDeg));
    near(
      staticPart!.unbalanceGmm,
      size({ re: (first!.re + second!.re) / 2, im: (first!.im + second!.im) / 2 }),
      1e-6,
    );
  });
});

describe('predictRun', () => {
  it('of nothing new is what is there, with the band of two readings', () => {
    const solution = solve(onePlane({ scatter: 0.05 }));
    const [predicted] = predictRun(solution, onePlane(), []);
    near(predicted!.amplitude, 3.873, 1e-12);
    nearDeg(predicted!.lagDeg, 219, 1e-9);
    near(predicted!.band!, (1.96 / Math.SQRT2) * 0.05 * Math.SQRT2, 1e-12);
  });

  it('widens with the weight that is added', () => {
    const solution = solve(onePlane({ scatter: 0.05 }));
    const bands = [0, 10, 40].map(
      (massG) => predictRun(solution, onePlane(), [{ ...on, massG }])[0]!.band!,
    );
    expect(bands[0]).toBeLessThan(bands[1]!);
    expect(bands[1]).toBeLessThan(bands[2]!);
  });

  it('misses are vectors: the same size half a turn away is twice as far', () => {
    const predicted = [{ pointId: 1, amplitude: 2, lagDeg: 10, band: 0.5 }];
    const measured = (lagDeg: number) => [{ pointId: 1, amplitude: 2, lagDeg }];
    near(missOf(predicted, measured(190))[0]!.miss, 4, 1e-12);
    expect(missOf(predicted, measured(190))[0]!.inside).toBe(false);
    expect(missOf(predicted, measured(12))[0]!.inside).toBe(true);
    const unknown = predicted.map((p) => ({ ...p, band: null }));
    expect(missOf(unknown, measured(12))[0]!.inside).toBeNull();
  });

  it('a reading that is missing counts as standing still', () => {
    near(missOf([{ pointId: 1, amplitude: 2, lagDeg: 10, band: null }], [])[0]!.miss, 2, 1e-12);
  });
});

describe('the state now', () => {
  it('follows from the model where no run was made with what is on', () => {
    const solution = solve(onePlane({ weightsNow: [weight(1, 26.27, 400, 36.1)] }));
    expect(solution).toMatchObject({ nowFrom: 'model', nowRunIds: [] });
    expect(solution.now[0]!.amplitude).toBeLessThan(0.02);
    expect(solution.notices.map(({ code }) => code)).toContain('now-from-model');
  });

  it('is what the newest runs with these weights showed', () => {
    const again = run(3, 'check', [{ amp: 3.5, deg: 210 }]);
    const input = onePlane();
    const solution = solve({ ...input, runs: [...input.runs, again] });
    expect(solution).toMatchObject({ nowFrom: 'measured', nowRunIds: [3], nowRuns: 1 });
    near(solution.now[0]!.amplitude, 3.5, 1e-12);
  });

  it('is that of the last run where nothing is said of weights', () => {
    const { weightsNow: _, ...silent } = onePlane();
    const solution = solve(silent);
    expect(solution).toMatchObject({ nowFrom: 'measured', nowRunIds: [2], weightsNow: [on] });
    near(solution.answer!.total[0]!.massG, 26.27, 0.01);
  });
});

describe('coefficientMatrix', () => {
  it('has a row per point and a column per plane', () => {
    const matrix = coefficientMatrix(solve(three).model, three);
    matrix.forEach((row, p) =>
      row.forEach((h, i) => {
        near(size(h), size(rotor.coefficients[p]![i]!), 1e-12);
        nearDeg(angleDeg(h), angleDeg(rotor.coefficients[p]![i]!), 1e-6);
      }),
    );
  });
});

describe('tolerance', () => {
  const fan: JobRotor = { massKg: 210, balanceGrade: 6.3, serviceSpeedRpm: 1480 };
  const tolerance = (over: Partial<JobInput>) => solve(onePlane(over)).tolerance;

  it('is not stated where no grade is asked for', () => {
    expect(tolerance({})).toBeNull();
    expect(tolerance({ rotor: { ...fan, balanceGrade: null } })).toBeNull();
  });

  it('is an estimate in place: the correction is its negative', () => {
    const [residual] = tolerance({ rotor: fan })!.correctionPlanes;
    const [plane] = solve(onePlane()).answer!.add;
    near(residual!.unbalanceGmm, plane!.unbalanceGmm, 1e-6);
    nearDeg(residual!.angleDeg, plane!.angleDeg + 180, 1e-6);
  });

  it('is met, not met or not certain beside its own uncertainty', () => {
    // 10 506 g·mm are there with 427 of uncertainty at a scatter of 0.05 mm/s; G sets the allowance.
    const verdicts = [6.3, 7.7, 7.8, 8.2].map(
      (balanceGrade) => tolerance({ scatter: 0.05, rotor: { ...fan, balanceGrade } })!.verdict,
    );
    expect(verdicts).toEqual(['not met', 'not certain', 'not certain', 'met']);
  });

  it('uses the mean speed of the runs where no service speed is known', () => {
    const { serviceSpeedRpm: _, ...slow } = fan;
    near(tolerance({ rotor: slow })!.totalGmm, 8536.3, 0.1);
  });

  it('refuses a mass of nothing as a whole, naming it', () => {
    const refused = solveJob(onePlane({ rotor: { ...fan, massKg: 0 } }));
    expect(refused).toMatchObject({
      ok: false,
      failure: { code: 'not-positive', field: 'massKg' },
    });
  });

  it('moves residuals to the bearings where the geometry is known', () => {
    const bearings = { ...fan, tolerancePlanesApartM: 2, massCentreFromAM: 1 };
    const input = onePlane({ rotor: bearings, scatter: 0.05 });
    const [plane] = input.planes;
    const placed = { ...input, planes: [{ ...plane!, fromAM: 0.5 }] };
    const { lines, statedAt, correctionPlanes } = solve(placed).tolerance!;
    expect(statedAt).toBe('tolerance planes');
    near(lines[0]!.unbalanceGmm, 0.75 * correctionPlanes[0]!.unbalanceGmm, 1e-6);
    near(lines[1]!.unbalanceGmm, 0.25 * correctionPlanes[0]!.unbalanceGmm, 1e-6);
    const spread = correctionPlanes[0]!.uncertaintyGmm!;
    near(lines[0]!.uncertaintyGmm!, 0.75 * spread, 1e-9);
    near(lines[1]!.uncertaintyGmm!, 0.25 * spread, 1e-9);
    expect(lines.map(({ name }) => name)).toEqual(['A', 'B']);
    expect(solve(input).tolerance!.statedAt).toBe('correction planes');
  });
});
