import type { LedgerWeightDto } from '@/lib/schemas/balance-job';

/** Whether a weight hangs there only to learn from, in a job that is not through. */
export function isTrial({ purpose, stays }: LedgerWeightDto): boolean {
  return purpose === 'trial' && stays !== true;
}
