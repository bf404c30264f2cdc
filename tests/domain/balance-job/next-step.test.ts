import { describe, expect, it } from 'vitest';
import { nextStep, type StepJob } from '@/lib/domain/balance-job/next-step';

const job = (over: Partial<StepJob>): StepJob => ({
  state: 'base taken',
  planeIds: [1, 2],
  runs: [],
  weights: [],
  answerNumber: null,
  answerAfterRun: null,
  reusesBook: false,
  checkOnly: false,
  ...over,
});

const trial = {
  id: 10,
  planeId: 1,
  purpose: 'trial',
  on: true,
  stays: null,
  answerNumber: null,
} as const;
const trialRun = { number: 2, purpose: 'trial', state: 'kept', weightIds: [10] } as const;

describe('nextStep', () => {
  it('starts with the base and then the trial of the first plane', () => {
    expect(nextStep(job({ state: 'opened' }))).toEqual({ step: 'base' });
    expect(nextStep(job({}))).toEqual({ step: 'fit trial', planeId: 1 });
  });

  it('asks for the run of a trial weight, then whether it stays, with no way past', () => {
    expect(nextStep(job({ weights: [trial] }))).toEqual({
      step: 'trial run',
      weightId: 10,
      planeId: 1,
    });
    expect(nextStep(job({ weights: [trial], runs: [trialRun] }))).toEqual({
      step: 'settle trial',
      weightId: 10,
      planeId: 1,
    });
  });

  it('goes to the next plane whether the trial was taken off or stays', () => {
    const off = { ...trial, on: false, stays: false };
    const stays = { ...trial, stays: true };
    for (const settled of [off, stays]) {
      expect(nextStep(job({ weights: [settled], runs: [trialRun] }))).toEqual({
        step: 'fit trial',
        planeId: 2,
      });
    }
  });

  it('goes back to the trial run when that run is lined through', () => {
    const runs = [{ ...trialRun, state: 'lined through' as const }];
    expect(nextStep(job({ weights: [trial], runs }))).toMatchObject({ step: 'trial run' });
    expect(nextStep(job({ weights: [{ ...trial, on: false, stays: false }], runs }))).toEqual({
      step: 'fit trial',
      planeId: 1,
    });
  });

  it('reaches the answer once every plane has its trial', () => {
    const learned = job({
      planeIds: [1],
      weights: [{ ...trial, on: false, stays: false }],
      runs: [trialRun],
    });
    expect(nextStep(learned)).toEqual({ step: 'answer' });
  });

  it('after an answer lists the planes still to fit, and decides after a newer check run', () => {
    const answered = { state: 'answered', answerNumber: 1, answerAfterRun: 3 } as const;
    const fit = { ...trial, id: 20, purpose: 'correction', answerNumber: 1 } as const;
    expect(nextStep(job({ ...answered, weights: [fit] }))).toEqual({
      step: 'fit correction',
      planeIds: [2],
    });
    const check = { number: 4, purpose: 'check', state: 'kept', weightIds: [20] } as const;
    expect(nextStep(job({ ...answered, weights: [fit], runs: [check] }))).toEqual({
      step: 'decide',
    });
    const old = { ...check, number: 3 };
    expect(nextStep(job({ ...answered, weights: [fit], runs: [old] })).step).toBe('fit correction');
  });

  it('has nothing left for a closed job', () => {
    expect(nextStep(job({ state: 'signed' }))).toEqual({ step: 'closed' });
    expect(nextStep(job({ state: 'stopped safe' }))).toEqual({ step: 'closed' });
  });
});
