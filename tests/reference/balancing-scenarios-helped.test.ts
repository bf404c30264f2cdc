import { describe, expect, it } from 'vitest';
import { compareWithStored, summariseCoefficient } from '@/lib/domain/balancing/coefficient-book';
import type { CoefficientSource } from '@/lib/domain/balancing/job-input';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { slipTests, type SlipTest } from '@/lib/domain/balancing/slip-tests';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { solveWithoutPhase } from '@/lib/domain/balancing/without-phase';
import { angleDeg, fromPolar, size, type Complex } from '@/lib/domain/complex';
import { codeOf, job, run, valueOf, weight, type Polar } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

/** Invented scenarios: a stored coefficient, a slip, no phase; computed independently of this code. */
const { S05, S07, S13 } = data.scenarios;

/** A one-plane coefficient per g·mm from a scenario's mm/s rms per kg·mm. */
const perGmm = (h: { mm_s_rms_per_kg_mm: number; deg: number }): Complex =>
  fromPolar(h.mm_s_rms_per_kg_mm / 1000, h.deg);

/** The coefficient of a job with a base run and one trial run. */
function coefficientOf(base: Polar, trial: Polar, on: ReturnType<typeof weight>): Complex {
  const runs = [run(1, 'base', [base]), run(2, 'trial', [trial], [on])];
  const { coefficients } = valueOf(solveJob(job([on.radiusMm], 1, runs, { weightsNow: [] }))).model;
  return { re: coefficients[0]!.rePerGmm, im: coefficients[0]!.imPerGmm };
}

describe('S05: one stop with a stored coefficient', () => {
  const { inputs, expected, tol } = S05;
  const past = inputs.past_jobs.map(({ base, trial, trial_run: trialRun }) =>
    coefficientOf(base, trialRun, weight(1, trial.g, trial.radius_mm, trial.deg)),
  );
  const book = summariseCoefficient(past)!;
  const stored: CoefficientSource = {
    kind: 'stored',
    speedRpm: 1485,
    coefficients: [{ planeId: 1, pointId: 1, ...book }],
  };
  const base = run(1, 'base', [inputs.base], [], inputs.base.speed);
  const fitted = weight(1, inputs.installed.g, inputs.installed.radius_mm, inputs.installed.deg);
  // Without repeats in the run, the band comes from the spread of the estimates alone.
  const rotor = { massKg: 300, balanceGrade: 6.3, serviceSpeedRpm: 1485 };
  const input = job([450], 1, [base], { weightsNow: [], coefficientsFrom: stored, rotor });
  const solution = valueOf(solveJob(input));

  it('grades the three estimates before offering them', () => {
    past.forEach((h, i) => {
      const want = inputs.past_jobs[i]!.coefficient;
      near(1000 * size(h), want.mm_s_rms_per_kg_mm, 0.0005);
      nearDeg(angleDeg(h), want.deg, 0.06);
    });
    const mean = { re: book.rePerGmm, im: book.imPerGmm };
    near(1000 * size(mean), expected.mean_coefficient.mm_s_rms_per_kg_mm, 0.0005);
    nearDeg(angleDeg(mean), expected.mean_coefficient.deg, 0.06);
    near(book.spreadPct!, expected.spread_pct, 0.05);
    expect(book.grade).toBe(expected.grade);
    expected.each_vs_mean.forEach(({ ratio, deg }, i) => {
      near(book.estimates[i]!.ratio, ratio, 0.0006);
      near(book.estimates[i]!.turnDeg, deg, 0.06);
    });
  });

  it('answers from one run and bands the prediction by the spread', () => {
    const [plane] = solution.answer!.add;
    near(plane!.massG, expected.correction.g, tol.g);
    nearDeg(plane!.angleDeg, expected.correction.deg, tol.deg);
    expect(plane!.uncertaintyG!).toBeGreaterThan(0);
    const [predicted] = predictRun(solution, input, [fitted]);
    near(predicted!.amplitude, expected.predicted_after_installed.amp, 0.002);
    nearDeg(predicted!.lagDeg, expected.predicted_after_installed.deg, tol.deg);
    near(predicted!.band!, expected.expected_band_mm_s_95, 0.005);
    const check = run(2, 'check', [inputs.check_run], [fitted], inputs.check_run.speed);
    expect(missOf([predicted!], check.vectors)[0]!.inside).toBe(expected.check_run_within_band);
  });

  it('adds one more estimate and states the residual after the check run', () => {
    const check = run(2, 'check', [inputs.check_run], [fitted], inputs.check_run.speed);
    const after = valueOf(solveJob({ ...input, runs: [base, check], weightsNow: [fitted] }));
    const [estimate] = after.estimates;
    near(estimate!.ratio, expected.new_vs_mean.ratio, 0.001);
    near(estimate!.turnDeg, expected.new_vs_mean.deg, 0.06);
    near(after.tolerance!.correctionPlanes[0]!.unbalanceGmm, expected.residual_g_mm, 30);
    near(after.tolerance!.totalGmm, expected.U_permissible_g_mm, 0.5);
    expect(after.tolerance!.verdict).toBe('met');
  });
});

describe('S07: angles counted with rotation', () => {
  const { inputs, expected, tol } = S07;
  const typed = inputs.trial.deg_typed;
  const trialOn = weight(1, inputs.trial.g, 300, typed);
  const fitted = weight(1, inputs.installed_as_typed.g, 300, inputs.installed_as_typed.deg);
  const learning = [
    run(1, 'base', [inputs.base], [], 1475),
    run(2, 'trial', [inputs.trial_run], [trialOn], 1475),
  ];
  const input = job([300], 1, [...learning, run(3, 'check', [inputs.check_run], [fitted], 1475)]);
  const before = { ...input, runs: learning, weightsNow: [] };
  const tests = valueOf(slipTests({ job: input, checkRunId: 3, fitted: [fitted] }));
  const testOf = (slip: SlipTest['slip']) => tests.find((test) => test.slip === slip)!;

  it('gives the answer that was typed for, and the check run misses it', () => {
    const solution = valueOf(solveJob(before));
    near(solution.answer!.add[0]!.massG, expected.answer_given.g, tol.g);
    nearDeg(solution.answer!.add[0]!.angleDeg, expected.answer_given.deg, tol.deg);
    const predicted = predictRun(solution, before, [fitted]);
    near(predicted[0]!.amplitude, expected.predicted.amp, tol.mm_s);
    const [miss] = missOf(predicted, input.runs[2]!.vectors);
    near(miss!.miss, expected.miss_mm_s, tol.mm_s);
  });

  it('suspects the sense as soon as the trial run is in, where a coefficient is stored', () => {
    const known = perGmm({ mm_s_rms_per_kg_mm: 0.25, deg: 346.3 });
    const fresh = coefficientOf(inputs.base, inputs.trial_run, trialOn);
    const compared = compareWithStored(fresh, known, typed);
    near(compared.ratio, expected.test_1_stored.new_vs_stored_ratio, 0.002);
    near(compared.turnDeg, expected.test_1_stored.new_vs_stored_deg, 0.1);
    expect(compared).toMatchObject({ agrees: false, sensesSuspect: true });
    const turned = weight(1, inputs.trial.g, 300, 360 - typed);
    const mirrored = compareWithStored(
      coefficientOf(inputs.base, inputs.trial_run, turned),
      known,
      360 - typed,
    );
    near(mirrored.turnDeg, expected.test_1_stored.mirrored_vs_stored_deg, 0.1);
    expect(mirrored).toMatchObject({ agrees: true, sensesSuspect: false });
  });

  it('ranks the slips by how well they explain the check run', () => {
    const misses = expected.hypothesis_misses_mm_s;
    const wanted: readonly [SlipTest['slip'], number][] = [
      ['as entered', misses['as entered']],
      ['angles counted with rotation', misses['all angles counted with rotation']],
      ['fitted 180° off', misses['fitted weight 180 deg off']],
      ['not fitted', misses['fitted weight never put on']],
      ['trial left on', misses['trial weight left on as well']],
      ['mass ten times too small', misses['fitted mass ten times too small']],
      ['lead read as lag', misses['lead phase read as lag']],
    ];
    for (const [slip, miss] of wanted) near(testOf(slip).miss, miss, tol.mm_s);
    const twins = [tests[0]!.slip, tests[1]!.slip].sort();
    expect(twins).toEqual(['angles counted with rotation', 'lead read as lag']);
    near(tests[0]!.miss, tests[1]!.miss, 1e-9);
  });

  it('names the repair: the correct total, or what to add with the weight left on', () => {
    const { total, add } = testOf('angles counted with rotation');
    const { correct_total_from_as_found: right, to_add_with_installed_left_on: more } =
      expected.repair;
    near(total[0]!.unbalanceGmm / 300, right.g, tol.g);
    nearDeg(total[0]!.angleDeg, right.deg, tol.deg);
    near(add[0]!.unbalanceGmm / 300, more.g, tol.g);
    nearDeg(add[0]!.angleDeg, more.deg, tol.deg);
  });
});

describe('S13: no tacho, sizes at three positions', () => {
  const { inputs, expected, tol } = S13;
  const runs = inputs.runs.map(({ deg, mm_s: amplitude }) => ({ angleDeg: deg, amplitude }));
  const sizes = { baseAmplitude: inputs.base_mm_s, trialMassG: inputs.trial_g, runs };

  it('answers with a consistency figure', () => {
    const answer = valueOf(solveWithoutPhase(sizes));
    near(answer.massG, expected.correction.g, tol.g);
    nearDeg(answer.angleDeg, expected.correction.deg, tol.deg);
    near(answer.effect, expected.effect_of_trial_mm_s, 0.001);
    near(answer.consistency, expected.consistency, 0.001);
    expect(answer.trusted).toBe(true);
    answer.fitted.forEach((fit, i) => near(fit, expected.fit_mm_s[i]!, 0.001));
  });

  it('refuses two positions, which have two mirror answers', () => {
    expect(codeOf(solveWithoutPhase({ ...sizes, runs: runs.slice(0, 2) }))).toBe(
      'too-few-positions',
    );
  });
});
