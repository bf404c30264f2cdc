import { describe, expect, it } from 'vitest';
import { aimedCorrection } from '@/lib/domain/balancing/aimed-correction';
import { conditionOf } from '@/lib/domain/balancing/condition';
import { residualAfter, solveCorrection } from '@/lib/domain/balancing/solve-correction';
import { solveLimited, weightedRms } from '@/lib/domain/balancing/solve-limited';
import { sixPlaceCheck } from '@/lib/domain/balancing/six-place-check';
import { angleDeg, divide, fromPolar, scale, size } from '@/lib/domain/complex';
import { driftLine } from '@/lib/domain/trends/drift-line';
import { valueOf } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

/** Invented scenarios; expected values computed independently of this code. */
const { S16, S18 } = data.scenarios;

describe('S16: three planes, four points, two speeds, weighted, with limits', () => {
  const { inputs, expected, tol, machine } = S16;
  const task = {
    now: inputs.rows.map(({ base }) => fromPolar(base.amp, base.deg)),
    coefficients: inputs.coefficients_mm_s_per_g_mm,
    // The scenario counts a row's square half; the task multiplies the row itself.
    pointWeights: inputs.rows.map(({ weight }) => Math.sqrt(weight)),
    limitsGmm: machine.limits_g_mm,
  };
  const rmsOf = (sizes: readonly number[]) =>
    Math.sqrt(sizes.reduce((total, value) => total + value ** 2, 0) / sizes.length);

  it('without limits', () => {
    const free = valueOf(solveCorrection(task));
    expected.unlimited.forEach(({ g_mm: gmm, deg }, i) => {
      near(size(free[i]!), gmm, tol.g_mm);
      nearDeg(angleDeg(free[i]!), deg, tol.deg);
    });
    const left = residualAfter(task, free).map(size);
    left.forEach((value, p) => near(value, expected.residual_mm_s[p]!, tol.mm_s));
    const weighted = task.coefficients.map((row, p) =>
      row.map((h) => scale(h, task.pointWeights[p]!)),
    );
    near(conditionOf(weighted).number, expected.condition_number, 0.05);
  });

  it('within the limits of the planes, proven to a billionth', () => {
    const limited = valueOf(solveLimited(task));
    expected.limited.forEach(({ g_mm: gmm, deg }, i) => {
      near(size(limited.unbalance[i]!), gmm, tol.g_mm);
      nearDeg(angleDeg(limited.unbalance[i]!), deg, tol.deg);
    });
    const left = residualAfter(task, limited.unbalance).map(size);
    left.forEach((value, p) => near(value, expected.limited_residual_mm_s[p]!, tol.mm_s));
    expect(limited.atLimit).toEqual([true, false, false]);
    expect(limited.rms - limited.rmsAtLeast).toBeLessThan(1e-6);
  });

  it('has the rms values of the scenario: squares of half weight', () => {
    const before = weightedRms(
      task,
      [0, 0, 0].map(() => ({ re: 0, im: 0 })),
    );
    near(before, expected.rms_before, tol.mm_s);
    near(weightedRms(task, valueOf(solveCorrection(task))), expected.rms_after, tol.mm_s);
    near(valueOf(solveLimited(task)).rms, expected.limited_rms_after, tol.mm_s);
    expect(rmsOf(expected.residual_mm_s)).toBeGreaterThan(0);
  });
});

describe('S18: aimed ahead of a straight drift', () => {
  const { inputs, expected, tol, machine } = S18;
  const { coefficient, radius_mm: radius } = machine;
  const h = fromPolar(coefficient.mm_s_rms_per_kg_mm / 1000, coefficient.deg);
  const track = inputs.one_x.map(({ amp, deg }, i) => ({
    day: inputs.days_since_balance[i]!,
    unbalanceGmm: divide(fromPolar(amp, deg), h),
  }));
  const line = valueOf(driftLine(track));

  it('leaves half the allowance opposite to the drift', () => {
    const now = track.at(-1)!.unbalanceGmm;
    near(size(now), expected.unbalance_now_g_mm.amp, tol.g_mm);
    const { plain, aimed, leaves } = valueOf(
      aimedCorrection(line, { now, allowedGmm: expected.U_permissible_g_mm }),
    );
    near(plain.unbalanceGmm / radius, expected.plain_correction_g.g, 0.1);
    nearDeg(plain.angleDeg, expected.plain_correction_g.deg, tol.deg);
    near(aimed.unbalanceGmm / radius, expected.aimed_correction_g.g, 0.1);
    nearDeg(aimed.angleDeg, expected.aimed_correction_g.deg, tol.deg);
    near(leaves.unbalanceGmm, expected.aimed_correction_g.leaves_g_mm.amp, tol.g_mm);
    nearDeg(leaves.angleDeg, expected.aimed_correction_g.leaves_g_mm.deg, tol.deg);
  });

  it('is refused on a track that wanders or is short', () => {
    const short = valueOf(driftLine(track.slice(0, 5)));
    expect(
      aimedCorrection(short, { now: short.nowGmm, allowedGmm: expected.U_permissible_g_mm }),
    ).toMatchObject({ failure: { code: 'not-straight' } });
  });
});

describe('a known weight at six places', () => {
  // Unit check of the scenarios, computed independently: sizes and T as given, 2443.7 g·mm.
  const amplitudes = [7.1, 8.9, 9.6, 8.4, 6.3, 5.5];

  it('gives the residual from the largest and the smallest size', () => {
    const {
      residualGmm,
      fittedGmm,
      angleDeg: deg,
    } = valueOf(sixPlaceCheck({ amplitudes, knownGmm: 9000 }));
    near(residualGmm, 2443.7, 1);
    // The sine through all six: computed with numpy.fft.rfft, 2nd line over 1st.
    near(fittedGmm, 2418.55, 0.01);
    nearDeg(deg, 109.46, 0.01);
  });

  it('refuses what cannot tell', () => {
    expect(sixPlaceCheck({ amplitudes: amplitudes.slice(1), knownGmm: 9000 })).toMatchObject({
      failure: { code: 'too-few-places' },
    });
    expect(sixPlaceCheck({ amplitudes: [0, 1, 1, 1, 1, 1], knownGmm: 9000 })).toMatchObject({
      failure: { code: 'reading-range', field: 'amplitudes.0' },
    });
    expect(sixPlaceCheck({ amplitudes, knownGmm: 0 })).toMatchObject({
      failure: { code: 'weight-zero' },
    });
    expect(sixPlaceCheck({ amplitudes: [9, 5, 0.2, 0.1, 0.2, 5], knownGmm: 100 })).toMatchObject({
      failure: { code: 'weight-too-small' },
    });
  });
});
