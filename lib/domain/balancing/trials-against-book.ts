import { divide, size, subtract, sum, ZERO } from '../complex';
import { compareWithStored, type StoredComparison } from './coefficient-book';
import type { JobInput, StoredCoefficient } from './job-input';
import { runBlocks, weightSteps } from './weight-steps';
import { unbalanceByPlane } from './weights-ledger';

/** What one trial run taught beside what the book knows of the same plane and point. */
export type TrialAgainstBook = StoredComparison & {
  readonly runId: number;
  readonly planeId: number;
  readonly pointId: number;
};

/**
 * Every trial run that changed one plane against the coefficient book, as soon as it is in and before
 * anything else is fitted.
 *
 * @param book stored coefficients per g·mm, same unit and set-up
 * Source: see `compareWithStored`. @example S07: 15 g typed at 75° turns the coefficient by −151.5° →
 *   `sensesSuspect`
 */
export function trialsAgainstBook(
  input: Pick<JobInput, 'runs' | 'points' | 'planes'>,
  book: readonly StoredCoefficient[],
): TrialAgainstBook[] {
  const steps = weightSteps(runBlocks(input.runs, input.points));
  return steps.flatMap((step) => {
    const [planeId] = step.planeIds;
    const [weight] = step.added;
    if (step.run.purpose !== 'trial' || step.planeIds.length !== 1 || !planeId || !weight)
      return [];
    const added = sum(unbalanceByPlane(step.added, [planeId]));
    if (size(added) === 0) return [];
    return input.points.flatMap((point, p) => {
      const stored = book.find((c) => c.planeId === planeId && c.pointId === point.id);
      if (!stored) return [];
      const change = subtract(step.after[p] ?? ZERO, step.before.vectors[p] ?? ZERO);
      const known = { re: stored.rePerGmm, im: stored.imPerGmm };
      const compared = compareWithStored(divide(change, added), known, weight.angleDeg);
      return { runId: step.run.id, planeId, pointId: point.id, ...compared };
    });
  });
}
