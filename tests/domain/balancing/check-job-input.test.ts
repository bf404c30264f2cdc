import { describe, expect, it } from 'vitest';
import { checkJobInput } from '@/lib/domain/balancing/check-job-input';
import { runName, type JobInput } from '@/lib/domain/balancing/job-input';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { codeOf, job, run, weight } from './job-builder';

const base = run(1, 'base', [{ amp: 4, deg: 20 }]);
const trial = run(2, 'trial', [{ amp: 3, deg: 80 }], [weight(1, 12, 300, 0)]);
const complete = job([300], 1, [base, trial], { weightsNow: [] });

/** The complete job with its trial run changed. */
const withTrial = (over: Partial<JobInput['runs'][number]>): JobInput => ({
  ...complete,
  runs: [base, { ...trial, ...over }],
});
const withWeight = (over: Partial<ReturnType<typeof weight>>) =>
  withTrial({ weights: [{ ...weight(1, 12, 300, 0), ...over }] });
const withVector = (amplitude: number, lagDeg: number) =>
  withTrial({ vectors: [{ pointId: 1, amplitude, lagDeg }] });

describe('checkJobInput', () => {
  it('lets complete runs through', () => {
    expect(checkJobInput(complete)).toEqual({ ok: true, value: null });
  });

  it.each<[string, JobInput, string, string | undefined]>([
    ['no plane', { ...complete, planes: [] }, 'no-planes', undefined],
    ['fewer points than planes', job([300, 300], 1, [base]), 'too-few-points', undefined],
    ['no run', { ...complete, runs: [] }, 'no-runs', undefined],
    ['a speed of zero', withTrial({ speedRpm: 0 }), 'speed-zero', 'runs.1.speedRpm'],
    ['no speed', withTrial({ speedRpm: NaN }), 'speed-zero', 'runs.1.speedRpm'],
    ['a missing reading', withTrial({ vectors: [] }), 'reading-missing', 'runs.1.vectors'],
    [
      'a reading twice',
      withTrial({ vectors: [...trial.vectors, ...trial.vectors] }),
      'reading-missing',
      'runs.1.vectors',
    ],
    ['a size below zero', withVector(-1, 10), 'reading-range', 'runs.1.vectors'],
    ['a lag that is no number', withVector(1, NaN), 'reading-range', 'runs.1.vectors'],
    [
      'a plane of another job',
      withWeight({ planeId: 7 }),
      'plane-unknown',
      'runs.1.weights.0.planeId',
    ],
    ['a mass of zero', withWeight({ massG: 0 }), 'weight-zero', 'runs.1.weights.0.massG'],
    ['a mass below zero', withWeight({ massG: -3 }), 'weight-zero', 'runs.1.weights.0.massG'],
    ['no radius', withWeight({ radiusMm: 0 }), 'weight-place', 'runs.1.weights.0.radiusMm'],
    ['no angle', withWeight({ angleDeg: NaN }), 'weight-place', 'runs.1.weights.0.radiusMm'],
    [
      'a weight of nothing now',
      { ...complete, weightsNow: [weight(1, 0, 300, 0)] },
      'weight-zero',
      'weightsNow.0.massG',
    ],
  ])('refuses %s', (_, input, code, field) => {
    const refused = checkJobInput(input);
    expect(codeOf(refused)).toBe(code);
    expect(refused.ok ? undefined : refused.failure.field).toBe(field);
    expect(solveJob(input)).toEqual(refused);
  });

  it('says which run and plane are meant', () => {
    const refused = checkJobInput(
      withTrial({ label: 'trial run 1', weights: [weight(1, 0, 300, 0)] }),
    );
    expect(refused.ok ? '' : refused.failure.message).toBe(
      'The weight in plane P1 of trial run 1 has a mass of 0 g, and nothing can be learnt from it. Weigh it and enter its mass.',
    );
  });
});

describe('runName', () => {
  it('is the label, or the number of the run', () => {
    expect([runName({ id: 3 }), runName({ id: 3, label: 'base 1' })]).toEqual(['run 3', 'base 1']);
  });
});
