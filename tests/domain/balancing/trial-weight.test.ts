import { describe, expect, it } from 'vitest';
import {
  massForChangeG,
  proposeTrial,
  trialCapG,
  type TrialProposalInput,
} from '@/lib/domain/balancing/trial-proposal';
import { trialResponse } from '@/lib/domain/balancing/trial-response';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fromPolar } from '@/lib/domain/complex';
import { job, run, valueOf, weight } from './job-builder';
import { near } from './near';

const rotor: TrialProposalInput = { radiusMm: 400, speedRpm: 1480, rotorMassKg: 210 };

describe('proposeTrial', () => {
  it('proposes the force cap at the mark where nothing is known: 21.4 g, 206 N', () => {
    const proposal = proposeTrial(rotor);
    expect(proposal).toMatchObject({ basis: 'force cap', angleDeg: 0, expectedChange: null });
    near(proposal.massG, 21.4, 0.05);
    near(proposal.forceN, 206, 0.1);
    near(proposal.forcePctOfLoad, 10, 1e-9);
  });

  it('aims at 40 % of the reading where the response is known', () => {
    const response = { perGmm: 5e-4, amplitudeNow: 5 };
    const proposal = proposeTrial({ ...rotor, response });
    expect(proposal.basis).toBe('known response');
    near(proposal.massG, 10, 1e-9);
    near(proposal.expectedChange!, 2, 1e-9);
  });

  it('takes 30 % of past corrections', () => {
    const proposal = proposeTrial({ ...rotor, pastCorrectionG: 30 });
    expect(proposal).toMatchObject({ basis: 'past corrections', massG: 9 });
  });

  it('never goes above the force cap or what the plane takes', () => {
    const deaf = { perGmm: 1e-6, amplitudeNow: 5 };
    expect(proposeTrial({ ...rotor, response: deaf }).basis).toBe('force cap');
    const limited = proposeTrial({ ...rotor, planeLimitG: 6, pastCorrectionG: 30 });
    expect(limited).toMatchObject({ basis: 'plane limit', massG: 6 });
  });

  it('falls back on past corrections where a response of zero is known', () => {
    const response = { perGmm: 0, amplitudeNow: 5 };
    const proposal = proposeTrial({ ...rotor, response, pastCorrectionG: 30 });
    expect(proposal.basis).toBe('past corrections');
  });

  it('looks at the load of one bearing where it is given', () => {
    near(proposeTrial({ ...rotor, bearingLoadN: 1029.7 }).massG, 10.7, 0.05);
  });
});

describe('masses by rule', () => {
  it('500 kg at 500 mm and 1488 r/min allow 40.4 g', () => {
    near(trialCapG({ radiusMm: 500, speedRpm: 1488, loadN: 500 * 9.80665 }), 40.4, 0.05);
  });

  it('1.727 mm/s at 1.34e-4 per g·mm and 500 mm is 25.8 g', () => {
    near(massForChangeG(1.727, 1.34e-4, 500), 25.8, 0.05);
  });
});

describe('trialResponse', () => {
  const before = fromPolar(5, 90);
  const changedBy = (change: number) => ({ re: before.re + change, im: before.im });

  it('deviation 0.154 of four runs, change 0.100: ratio 0.58, refuse', () => {
    const response = trialResponse(before, changedBy(0.1), { deviation: 0.154, repeats: 4 });
    near(response.changeOverNoise!, 0.58, 0.005);
    expect(response.verdict).toBe('refuse');
    near(response.neededChange!, 1.72, 0.005);
  });

  it.each([
    [4.99, 'refuse'],
    [5.01, 'wide'],
    [9.99, 'wide'],
    [10.01, 'good'],
  ] as const)('a change of %s times the noise is %s', (ratio, verdict) => {
    // One repeat: noise is √2 of the deviation.
    const noise = { deviation: 0.1, repeats: 1 };
    const response = trialResponse(before, changedBy(ratio * 0.1 * Math.SQRT2), noise);
    near(response.changeOverNoise!, ratio, 1e-9);
    expect(response.verdict).toBe(verdict);
  });

  it('knows no ratio where nothing was repeated', () => {
    const response = trialResponse(before, changedBy(1), null);
    expect(response).toMatchObject({
      noise: null,
      changeOverNoise: null,
      neededChange: null,
      verdict: 'unknown',
    });
  });

  it('30 % and 30° count as enough when they are just reached', () => {
    const of = (amp: number, deg: number) => trialResponse(before, fromPolar(amp, deg), null);
    expect(of(6.5, 90).thirtyRule).toBe(true);
    expect(of(3.5, 90).thirtyRule).toBe(true);
    expect(of(5, 60).thirtyRule).toBe(true);
    expect(of(6.4, 119).thirtyRule).toBe(false);
  });

  it('from rest counts as no change in per cent', () => {
    const response = trialResponse({ re: 0, im: 0 }, before, null);
    expect(response).toMatchObject({ changePct: 0, amplitudeChangePct: 0 });
    near(response.changeAmplitude, 5, 1e-12);
  });
});

describe('trials inside a job', () => {
  const base = [
    { amp: 5, deg: 90 },
    { amp: 4, deg: 10 },
  ];
  const trialIs = (second: { amp: number; deg: number }, scatter: number | null = 0.05) => {
    const trial = run(2, 'trial', [{ amp: 5, deg: 91 }, second], [weight(1, 10, 300, 0)]);
    return valueOf(
      solveJob(job([300], 2, [run(1, 'base', base), trial], { weightsNow: [], scatter })),
    );
  };

  it('a trial must be heard somewhere, not everywhere', () => {
    const { trials, answer } = trialIs({ amp: 5, deg: 40 });
    expect(trials[0]!.points.map(({ verdict }) => verdict)).toEqual(['refuse', 'good']);
    expect(trials[0]).toMatchObject({
      runId: 2,
      beforeRunIds: [1],
      planeIds: [1],
      verdict: 'good',
    });
    expect(trials[0]!.changeOverNoise).toBe(trials[0]!.points[1]!.changeOverNoise);
    expect(answer).not.toBeNull();
  });

  it('one heard nowhere gives no answer and says what to do', () => {
    const { answer, alternatives, withheld } = trialIs({ amp: 4.1, deg: 10 });
    expect([answer, alternatives, withheld!.answer]).toEqual([null, [], null]);
    expect(withheld!.failure.code).toBe('trial-too-small');
    expect(withheld!.failure.message).toMatch(/plane P1.*heavier trial weight/);
  });

  it('a known scatter larger than the readings stops the job', () => {
    const readings = [
      { amp: 0.1, deg: 300 },
      { amp: 0.12, deg: 10 },
    ];
    const trial = run(
      2,
      'trial',
      [
        { amp: 5, deg: 50 },
        { amp: 4, deg: 99 },
      ],
      [weight(1, 10, 300, 0)],
    );
    const { answer, withheld } = valueOf(
      solveJob(job([300], 2, [run(1, 'base', readings), trial], { weightsNow: [], scatter: 0.05 })),
    );
    expect(answer).toBeNull();
    expect(withheld!.failure.code).toBe('below-scatter');
  });
});
