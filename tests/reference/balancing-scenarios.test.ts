import { describe, expect, it } from 'vitest';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import { centrifugalForceN, weightN } from '@/lib/domain/balancing/centrifugal-force';
import { angleDeg } from '@/lib/domain/complex';
import { job, run, valueOf, weight } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

/** Invented scenarios of a plant that does not exist, computed by a rotor model independent of this code. */
const { S01, S02, S03 } = data.scenarios;

function solve(input: JobInput) {
  return valueOf(solveJob(input));
}

describe('S01: one plane, trial taken off, one trim', () => {
  const { inputs, expected, tol } = S01;
  const base = inputs.repeat_base_runs.map((r, i) => run(i + 1, 'base', [r], [], r.speed));
  const trialOn = weight(1, inputs.trial.g, 400, inputs.trial.deg);
  const first = weight(1, 26, 400, 35);
  const second = weight(1, 3, 400, 295);
  const trial = run(4, 'trial', [inputs.trial_run], [trialOn], inputs.trial_run.speed);
  const check1 = run(5, 'check', [inputs.check_run_1], [first], inputs.check_run_1.speed);
  const check2 = run(6, 'check', [inputs.check_run_2], [first, second], inputs.check_run_2.speed);
  const rotor = { massKg: 210, balanceGrade: 6.3, serviceSpeedRpm: 1480 };
  const solution = solve(job([400], 1, [...base, trial], { weightsNow: [], rotor }));

  it('takes the mean of the repeated base runs and finds the scatter good', () => {
    near(solution.now[0]!.amplitude, expected.base_mean.amp, tol.amp_mm_s);
    const test = solution.noise[0]!.base!;
    near(test.scatter, expected.repeat_scatter_mm_s, 0.0005);
    expect(test.good).toBe(expected.repeat_ok);
  });

  it('finds the trial large enough, its force and the coefficient', () => {
    const response = solution.trials[0]!.points[0]!;
    near(response.changeAmplitude, expected.trial_change.amp, tol.amp_mm_s);
    near(response.changePct, expected.trial_change_pct_of_base, tol.pct);
    near(
      response.changeAmplitude / solution.noise[0]!.base!.scatter,
      expected.trial_change_over_scatter,
      tol.pct,
    );
    expect(response.verdict).toBe('good');
    const force = centrifugalForceN(15 * 400, 1480);
    near(force, expected.trial_force_N, 0.05);
    near((100 * force) / weightN(210), expected.trial_force_pct_of_rotor_weight, 0.05);
    const h = solution.model.coefficients[0]!;
    near(
      1000 * Math.hypot(h.rePerGmm, h.imPerGmm),
      expected.coefficient.mm_s_rms_per_kg_mm,
      0.0005,
    );
    nearDeg(angleDeg({ re: h.rePerGmm, im: h.imPerGmm }), expected.coefficient.deg, tol.deg);
  });

  it('answers 26.27 g at 36.1° with an uncertainty', () => {
    const plane = solution.answer!.add[0]!;
    near(plane.massG, expected.correction.g, tol.g);
    nearDeg(plane.angleDeg, expected.correction.deg, tol.deg);
    near(plane.unbalanceGmm, expected.correction.g_mm, 10);
    expect(plane.uncertaintyG!).toBeGreaterThan(0.1);
    expect(plane.uncertaintyG!).toBeLessThan(1);
    expect(solution.answer!.total[0]!.massG).toBeCloseTo(plane.massG, 9);
  });

  it('predicts the check run of what was really fitted', () => {
    const [predicted] = predictRun(solution, job([400], 1, []), [first]);
    near(predicted!.amplitude, expected.predicted_after_installed_1.amp, tol.amp_mm_s);
    nearDeg(predicted!.lagDeg, expected.predicted_after_installed_1.deg, tol.deg);
  });

  it('trims with the coefficients of the first answer and flags the 13 % difference', () => {
    const trim = solve(job([400], 1, [...base, trial, check1], { weightsNow: [first], rotor }));
    near(trim.answer!.add[0]!.massG, expected.trim.g, tol.g);
    nearDeg(trim.answer!.add[0]!.angleDeg, expected.trim.deg, tol.deg);
    const estimate = trim.estimates.find(({ runId }) => runId === 5)!;
    near(estimate.differencePct, expected.coefficient_difference_pct, tol.pct);
    const h = estimate.coefficient!;
    near(
      1000 * Math.hypot(h.rePerGmm, h.imPerGmm),
      expected.coefficient_from_installed_1.mm_s_rms_per_kg_mm,
      0.0005,
    );
    nearDeg(
      angleDeg({ re: h.rePerGmm, im: h.imPerGmm }),
      expected.coefficient_from_installed_1.deg,
      tol.deg,
    );
    expect(trim.notices.map(({ code }) => code)).toContain('estimate-differs');
  });

  it('ends with the ledger, the fit over all runs and a residual inside the grade', () => {
    const end = solve(
      job([400], 1, [...base, trial, check1, check2], { weightsNow: [first, second], rotor }),
    );
    const fit = end.allRuns!;
    near(fit.asFound[0]!.amplitude, expected.all_runs_fit.as_found.amp, tol.amp_mm_s);
    near(fit.misfitRms, expected.all_runs_fit.rms_misfit_mm_s, 0.0005);
    expect(fit.runIds).toHaveLength(expected.all_runs_fit.runs);
    const h = fit.coefficients[0]!;
    near(1000 * Math.hypot(h.rePerGmm, h.imPerGmm), 0.386, 0.0005);
    expect(end.notices.map(({ code }) => code)).toContain('misfit');
    const { correctionPlanes, lines, totalGmm, verdict } = end.tolerance!;
    near(correctionPlanes[0]!.unbalanceGmm, expected.residual_after_trim_g_mm, 0.5);
    near(totalGmm, expected.U_permissible_g_mm, 0.1);
    expect(lines).toHaveLength(1);
    expect(verdict).toBe('met');
    const sum = ledgerSum([first, second], 400);
    near(sum.unbalanceGmm, expected.ledger_sum_plane_W.g_mm, 0.1);
    nearDeg(sum.angleDeg, expected.ledger_sum_plane_W.deg, 0.05);
    near(sum.equivalentMassG, expected.ledger_sum_plane_W.equiv_g_at_400, 0.005);
    expect(sum.pieces).toBe(2);
  });
});

describe('S02: two planes, trials taken off, sensors facing opposite ways', () => {
  const { inputs, expected, expected_moved: moved, tol } = S02;
  const planes = [
    { id: 1, name: 'L', radiusMm: 700, fromAM: 0.4 },
    { id: 2, name: 'R', radiusMm: 700, fromAM: 1.5 },
  ];
  const rotor = {
    massKg: 640,
    balanceGrade: 6.3,
    serviceSpeedRpm: 990,
    tolerancePlanesApartM: 1.9,
    massCentreFromAM: 0.95,
  };
  const learning = [
    run(1, 'base', inputs.base, [], 990),
    ...inputs.trial.map((t, i) =>
      run(i + 2, 'trial', t.run, [weight(i + 1, t.g, 700, t.deg)], inputs.speeds[i + 1]),
    ),
  ];
  const fitted = inputs.installed.map((w, i) => weight(i + 1, w.g, 700, w.deg));
  const check = run(4, 'check', inputs.check_run, fitted, 990);
  const solution = solve(job([], 2, learning, { planes, rotor, weightsNow: [] }));

  it('finds coefficients, condition and correction', () => {
    const names = ['A_L', 'B_L', 'A_R', 'B_R'] as const;
    names.forEach((name, i) => {
      const h = solution.model.coefficients[i]!;
      const want = expected.coefficients[name];
      near(1000 * Math.hypot(h.rePerGmm, h.imPerGmm), want.mm_s_rms_per_kg_mm, 0.0005);
      nearDeg(angleDeg({ re: h.rePerGmm, im: h.imPerGmm }), want.deg, tol.deg);
    });
    near(solution.condition.number, expected.condition_number_scaled, 0.005);
    expected.correction.forEach((want, i) => {
      near(solution.answer!.add[i]!.massG, want.g, tol.g);
      nearDeg(solution.answer!.add[i]!.angleDeg, want.deg, tol.deg);
    });
  });

  it('shows static and couple parts', () => {
    const { staticPart, couplePart } = solution.answer!;
    near(staticPart!.unbalanceGmm / 700, expected.correction_static_part_g.each_plane_g, tol.g);
    nearDeg(staticPart!.angleDeg, expected.correction_static_part_g.deg, tol.deg);
    near(couplePart!.unbalanceGmm / 700, expected.correction_couple_part_g.plane_L_g, tol.g);
    nearDeg(couplePart!.angleDeg, expected.correction_couple_part_g.plane_L_deg, tol.deg);
  });

  it('predicts what was fitted, and the check run lies where it lay', () => {
    const predicted = predictRun(solution, job([], 2, [], { planes }), fitted);
    predicted.forEach((p, i) => {
      near(p.amplitude, expected.predicted_after[i]!.amp, tol.amp_mm_s);
      nearDeg(p.lagDeg, expected.predicted_after[i]!.deg, tol.deg);
    });
    missOf(predicted, check.vectors).forEach(({ miss }, i) =>
      near(miss, expected.check_vs_prediction_mm_s[i]!, tol.amp_mm_s),
    );
  });

  it('estimates the residual in place and moves it to the bearings', () => {
    const after = solve(job([], 2, [...learning, check], { planes, rotor, weightsNow: fitted }));
    const { correctionPlanes, lines, statedAt, verdict } = after.tolerance!;
    correctionPlanes.forEach(({ unbalanceGmm }, i) =>
      near(unbalanceGmm, expected.residual_estimate_g_mm[i]!, 0.5),
    );
    expect(statedAt).toBe('tolerance planes');
    near(lines[0]!.unbalanceGmm, moved.A_g_mm, 0.5);
    near(lines[1]!.unbalanceGmm, moved.B_g_mm, 0.5);
    lines.forEach(({ allowedGmm }) =>
      near(allowedGmm, expected.U_permissible_g_mm_each_tolerance_plane, 0.5),
    );
    expect(verdict).toBe('met');
  });
});

describe('S03: both trials stay on', () => {
  const { inputs, expected, tol } = S03;
  const [one, two] = inputs.trial.map((t, i) => weight(i + 1, t.g, 280, t.deg));
  const learning = [
    run(1, 'base', inputs.base),
    run(2, 'trial', inputs.trial[0]!.run, [one!]),
    run(3, 'trial', inputs.trial[1]!.run, [one!, two!]),
  ];
  const rotor = { massKg: 420, balanceGrade: 6.3, serviceSpeedRpm: 1490 };
  const solution = solve(job([280, 280], 2, learning, { weightsNow: [one!, two!], rotor }));

  it('states the answer as what to add and as total from as-found', () => {
    expected.to_add_with_trials_staying.forEach((want, i) => {
      near(solution.answer!.add[i]!.massG, want.g, tol.g);
      nearDeg(solution.answer!.add[i]!.angleDeg, want.deg, tol.deg);
    });
    expected.total_from_as_found.forEach((want, i) => {
      near(solution.answer!.total[i]!.massG, want.g, tol.g);
      nearDeg(solution.answer!.total[i]!.angleDeg, want.deg, tol.deg);
    });
    const names = ['A_1', 'B_1', 'A_2', 'B_2'] as const;
    names.forEach((name, i) => {
      const h = solution.model.coefficients[i]!;
      near(
        1000 * Math.hypot(h.rePerGmm, h.imPerGmm),
        expected.coefficients[name].mm_s_rms_per_kg_mm,
        0.0005,
      );
    });
  });

  it('gives the residual of the check run and the ledger', () => {
    const added = inputs.installed_in_addition.map((w, i) => weight(i + 1, w.g, 280, w.deg));
    const on = [one!, two!, ...added];
    const after = solve(
      job([280, 280], 2, [...learning, run(4, 'check', inputs.check_run, on)], {
        weightsNow: on,
        rotor,
      }),
    );
    after.tolerance!.correctionPlanes.forEach(({ unbalanceGmm }, i) =>
      near(unbalanceGmm, expected.residual_g_mm[i]!, 1),
    );
    near(after.tolerance!.totalGmm, expected.U_permissible_total_g_mm, 0.5);
    expected.ledger_after.forEach((want, i) => {
      const sum = ledgerSum(
        on.filter(({ planeId }) => planeId === i + 1),
        280,
      );
      near(sum.unbalanceGmm, want.g_mm, 0.5);
      nearDeg(sum.angleDeg, want.deg, 0.05);
    });
  });

  it('is not the answer of somebody who takes trial 1 for removed', () => {
    const wrong = solve(
      job([280, 280], 2, [learning[0]!, learning[1]!, { ...learning[2]!, weights: [two!] }], {
        weightsNow: [],
      }),
    );
    near(wrong.answer!.add[0]!.massG, S03.wrong_ways[0]!.fitted![0]!.g, tol.g);
  });
});
