import type { JobKind } from './job-kinds';

/**
 * Starts of the machine that a job needs at least: one for the base (repeats can be read in one start), one
 * for every trial, one check and one trim. A check only needs one.
 * Source: common practice (no published source). Example: two planes need 5, with the coefficient book 3.
 */
export function startsPlanned(
  kind: JobKind,
  { planes, reusesBook }: { readonly planes: number; readonly reusesBook: boolean },
): number {
  if (kind === 'check only') return 1;
  return 1 + (reusesBook ? 0 : planes) + 2;
}
