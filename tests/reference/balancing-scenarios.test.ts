import { describe, expect, it } from 'vitest';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { missOf, predictRun } from '@/lib/domain/balancing/predict-run';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import { centrifugalForceN, weightN } from '@/lib/domain/balancing/centrifugal-force';
import { shortTurnDeg } from '@/lib/domain/units';
import { angleDeg } from '@/lib/domain/complex';
import { codeOf, job, run, valueOf, weight } from '../domain/balancing/job-builder';
import data from './data/balancing-scenarios.json';

/** Invented scenarios of a plant that does not exist, computed by a rotor model independent of this code. */
const { S01, S02, S03, S06, S08, S09 } = data.scenarios;

const nearDeg = (got: number, want: number, within: number) =>
  expect(Math.abs(shortTurnDeg(want, got))).toBeLessThanOrEqual(within);
const near = (got: number, want: number, within: number) =>
  expect(Math.abs(got - want)).toBeLessThanOrEqual(within);

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

describe('S06: speed drifted between base and trial', () => {
  const { inputs, expected, tol } = S06;
  const base = run(1, 'base', [inputs.base], [], inputs.base.speed);
  const on = [weight(1, inputs.trial.g, 350, inputs.trial.deg)];
  const drifted = run(2, 'trial', [inputs.trial_run_first], on, inputs.trial_run_first.speed);

  it('holds and gives no correction, naming the run and the difference', () => {
    const result = solveJob(job([350], 1, [base, drifted], { weightsNow: [] }));
    expect(codeOf(result)).toBe('speed-differs');
    expect(result.ok ? '' : result.failure.message).toContain('2.77 %');
  });

  it('computes the naive answer only where an engineer kept the run', () => {
    const kept = { ...drifted, speedAccepted: true };
    const { answer, notices } = solve(job([350], 1, [base, kept], { weightsNow: [] }));
    near(answer!.add[0]!.massG, expected.naive_correction.g, tol.g);
    expect(notices.map(({ code }) => code)).toContain('speed');
  });

  it('answers from the repeated run', () => {
    const repeated = run(3, 'trial', [inputs.trial_run_repeat], on, inputs.trial_run_repeat.speed);
    const { answer, speed } = solve(job([350], 1, [base, repeated], { weightsNow: [] }));
    near(answer!.add[0]!.massG, expected.proper_correction.g, tol.g);
    nearDeg(answer!.add[0]!.angleDeg, expected.proper_correction.deg, tol.deg);
    expect(speed.verdict).toBe('good');
  });
});

describe('S08: trial too small to be heard', () => {
  const { inputs, expected, tol } = S08;
  const runs = [
    ...inputs.base_runs.map((r, i) => run(i + 1, 'base', [r], [], 1488)),
    run(5, 'trial', [inputs.trial_run], [weight(1, 4, 500, 45)], 1488),
  ];

  it('refuses an answer and says what change is needed', () => {
    const { answer, withheld, trials, noise, now } = solve(job([500], 1, runs, { weightsNow: [] }));
    expect(answer).toBeNull();
    expect(withheld!.failure.code).toBe('trial-too-small');
    near(noise[0]!.deviation!, expected.scatter_complex_sd_mm_s, 0.0005);
    near(now[0]!.amplitude, expected.base_mean.amp, tol.mm_s);
    const response = trials[0]!.points[0]!;
    near(response.changeAmplitude, expected.trial_change_mm_s, 0.005);
    near(response.changeOverNoise!, expected.change_over_noise, 0.005);
    near(response.neededChange!, expected.needed_change_mm_s_for_ratio_10, tol.mm_s);
    expect(response.thirtyRule).toBe(false);
  });
});

describe('S09: planes too close together', () => {
  const { inputs, expected, tol } = S09;
  const runs = [
    run(1, 'base', inputs.base),
    ...inputs.trial.map((t, i) =>
      run(i + 2, 'trial', t.run, [weight(i + 1, t.g, 420, t.deg)], 1480),
    ),
  ];
  const solution = solve(job([420, 420], 2, runs, { weightsNow: [], scatter: 0.05 }));

  it('withholds the exact answer and offers an equal pair', () => {
    near(solution.condition.number, expected.condition_number_scaled, 0.05);
    const pair = solution.answer!;
    expect(pair.kind).toBe('static pair');
    pair.add.forEach(({ massG, angleDeg: deg }) => {
      near(massG, expected.equal_pair.each_plane_g, tol.g);
      nearDeg(deg, expected.equal_pair.deg, tol.deg);
    });
    pair.predicted.forEach(({ amplitude }, i) =>
      near(amplitude, expected.equal_pair.predicted_mm_s[i]!, tol.mm_s),
    );
    expect(solution.withheld!.failure.code).toBe('ill-conditioned');
  });

  it('keeps the exact answer aside with its total and uncertainty', () => {
    const exact = solution.withheld!.answer!;
    expected.exact_two_plane.weights.forEach((want, i) => {
      near(exact.add[i]!.massG, want.g, tol.g);
      nearDeg(exact.add[i]!.angleDeg, want.deg, tol.deg);
    });
    near(exact.sumOverTotal, expected.exact_two_plane.sum_over_total, 0.01);
    // The scenario counts the readings only; the trial runs carry the same scatter once more.
    exact.add.forEach(({ uncertaintyG }, i) =>
      expect(uncertaintyG!).toBeGreaterThan(
        expected.weight_uncertainty_g_per_plane_from_0p05_mm_s[i]!,
      ),
    );
  });
});

describe('what a solution is made of', () => {
  it('is plain data that survives JSON bit for bit', () => {
    const runs = [
      run(1, 'base', [{ amp: 3, deg: 10 }]),
      run(2, 'trial', [{ amp: 2, deg: 50 }], [weight(1, 10, 300, 0)]),
    ];
    const solution = solve(job([300], 1, runs, { weightsNow: [] }));
    expect(JSON.parse(JSON.stringify(solution))).toEqual(solution);
    expect(solution.method).toBe('influence-fit/1');
  });
});
