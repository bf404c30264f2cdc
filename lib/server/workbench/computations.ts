import 'server-only';
import { solveRuns } from './solve-runs';
import { split } from './split';
import { tolerance } from './tolerance';

/** The computations that the public API offers, by the last part of their address. */
export const COMPUTATIONS = {
  'solve-runs': {
    compute: solveRuns,
    says: 'One or two correction planes from a base run and one trial run a plane: what to fit where, predicted residual, coefficients. Angles of the answer count against rotation from the mark, phase is lag.',
  },
  tolerance: {
    compute: tolerance,
    says: 'Permissible residual unbalance of a grade (ISO 21940-11), as a whole and at the bearings.',
  },
  split: {
    compute: split,
    says: 'A weight carried by equally spaced positions: the two on either side of it, or one.',
  },
} as const;
export type ComputationName = keyof typeof COMPUTATIONS;

/** Whether an address names a computation. */
export function isComputation(name: string): name is ComputationName {
  return Object.hasOwn(COMPUTATIONS, name);
}
