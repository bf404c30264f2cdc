import { median } from '../trends/order-statistics';

/** A job on a rotor, as far as the time between balances goes; instants in ms. */
export type BalancedJob = {
  readonly id: number;
  readonly rotorId: number;
  readonly openedAt: number;
  readonly closedAt: number | null;
  /** Signed: the rotor was balanced. A job that was stopped balanced nothing. */
  readonly state: 'signed' | 'open' | 'given up';
};

/** Days a balance lasted; where it still lasts, the days so far. */
export type BalanceLife = {
  readonly jobId: number;
  readonly days: number;
  readonly running: boolean;
};

const DAY_MS = 86_400_000;

/**
 * How long each signed balance of a rotor lasted: from its closing to the opening of the next job on
 * the same rotor that balanced it or is at it now; jobs that were given up end nothing. The last one
 * runs still, until `now` or until the rotor left (`leftAt`, ms, by rotor).
 *
 * @returns days, in the order of the jobs; running ones are “at least”
 * Source: definition. Example: closed on day 0, the next opened on day 90: 90 days; that one closed on
 * day 91, now day 121: at least 30 days.
 */
export function balanceLives(
  jobs: readonly BalancedJob[],
  now: number,
  leftAt: ReadonlyMap<number, number> = new Map(),
): BalanceLife[] {
  return jobs.flatMap((job) => {
    const { closedAt, rotorId } = job;
    if (job.state !== 'signed' || closedAt === null) return [];
    const next = jobs
      .filter((other) => other.rotorId === rotorId && other.state !== 'given up')
      .filter((other) => other.id !== job.id && other.openedAt >= closedAt)
      .reduce((first, { openedAt }) => Math.min(first, openedAt), Infinity);
    const end = Math.min(next, leftAt.get(rotorId) ?? now);
    return { jobId: job.id, days: Math.max(0, (end - closedAt) / DAY_MS), running: end < next };
  });
}

/**
 * Median of the balance lives that have ended, days; null while none has. Source: definition; running
 * lives are left out, so that a young balance does not make the median shorter.
 */
export function medianBalanceLife(lives: readonly BalanceLife[]): number | null {
  const ended = lives.filter(({ running }) => !running).map(({ days }) => days);
  return ended.length === 0 ? null : median(ended);
}
