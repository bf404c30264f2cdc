import { describe, expect, it } from 'vitest';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { codeOf, job, run, valueOf, weight } from '../domain/balancing/job-builder';
import { near, nearDeg } from '../domain/balancing/near';
import data from './data/balancing-scenarios.json';

/** Invented scenarios of doubtful jobs, computed by a rotor model independent of this code. */
const { S06, S08, S09 } = data.scenarios;

function solve(input: JobInput) {
  return valueOf(solveJob(input));
}

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
