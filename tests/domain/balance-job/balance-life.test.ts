import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  balanceLives,
  medianBalanceLife,
  type BalancedJob,
} from '@/lib/domain/balance-job/balance-life';

const DAY = 86_400_000;

function job(id: number, opened: number, closed: number | null, more: Partial<BalancedJob> = {}) {
  return {
    id,
    rotorId: 1,
    openedAt: opened * DAY,
    closedAt: closed === null ? null : closed * DAY,
    state: closed === null ? ('open' as const) : ('signed' as const),
    ...more,
  };
}

// Arithmetic of days by hand; the definition itself is ours (practice, no published source).
describe('balance life', () => {
  it('runs from closing to the next opening; the last is “at least”', () => {
    expect(balanceLives([job(1, -1, 0), job(2, 90, 91)], 121 * DAY)).toEqual([
      { jobId: 1, days: 90, running: false },
      { jobId: 2, days: 30, running: true },
    ]);
  });

  it('is ended by an open job, not by one that was given up', () => {
    const given = job(2, 40, 41, { state: 'given up' });
    expect(balanceLives([job(1, -1, 0), given, job(3, 100, null)], 120 * DAY)).toEqual([
      { jobId: 1, days: 100, running: false },
    ]);
  });

  it('of a rotor is not ended by a job on another, but by its leaving it runs no further', () => {
    const jobs = [job(1, -1, 0), job(2, 50, 51, { rotorId: 2 })];
    expect(balanceLives(jobs, 100 * DAY, new Map([[1, 45 * DAY]]))).toEqual([
      { jobId: 1, days: 45, running: true },
      { jobId: 2, days: 49, running: true },
    ]);
  });

  it('has a median of ended lives only', () => {
    const lives = [
      { jobId: 1, days: 90, running: false },
      { jobId: 2, days: 30, running: false },
      { jobId: 3, days: 60, running: false },
      { jobId: 4, days: 1, running: true },
    ];
    expect(medianBalanceLife(lives)).toBe(60);
    expect(medianBalanceLife(lives.slice(3))).toBeNull();
  });

  it('adds up: lives and times in work fill the span from the first closing to now', () => {
    const spans = fc.array(fc.tuple(fc.nat(400), fc.nat(5)), { minLength: 1, maxLength: 8 });
    fc.assert(
      fc.property(spans, fc.nat(400), (steps, rest) => {
        let at = 0;
        const jobs = steps.map(([wait, work], i) => {
          const opened = at + wait + 1;
          at = opened + work;
          return job(i + 1, opened, at);
        });
        const lived = balanceLives(jobs, (at + rest) * DAY).reduce((sum, l) => sum + l.days, 0);
        const worked = jobs
          .slice(1)
          .reduce((sum, j) => sum + ((j.closedAt ?? 0) - j.openedAt) / DAY, 0);
        expect(lived + worked).toBeCloseTo(at + rest - (jobs[0]?.closedAt ?? 0) / DAY, 6);
      }),
    );
  });
});
