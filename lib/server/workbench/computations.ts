import 'server-only';
import type { z } from 'zod';
import type { Actor } from '@/lib/schemas/actor';
import { computeResponse } from '../compute-response';
import type { Computation } from '../computation';
import { combine } from './combine';
import { pieces } from './pieces';
import { sixPlaces } from './six-places';
import { solveRows } from './solve-rows';
import { solveRuns } from './solve-runs';
import { split } from './split';
import { tolerance } from './tolerance';
import { trialWeight } from './trial-weight';
import { withoutPhase } from './without-phase';

/** A computation with what it says of itself and how it answers a request. */
function offered<Schema extends z.ZodType, Value>(
  compute: Computation<Schema, Value>,
  says: string,
) {
  const answer = (actor: Actor, request: Request) => computeResponse(compute, actor, request);
  return { schema: compute.schema, says, answer };
}

/** The computations that the public API offers, by the last part of their address. */
export const COMPUTATIONS = {
  'solve-runs': offered(
    solveRuns,
    'One or two correction planes from a base run and one trial run a plane: what to fit where, predicted residual, coefficients. Angles of the answer count against rotation from the mark, phase is lag.',
  ),
  tolerance: offered(
    tolerance,
    'Permissible residual unbalance of a grade (ISO 21940-11), as a whole and at the bearings.',
  ),
  split: offered(
    split,
    'A weight carried by equally spaced positions: the two on either side of it, or one.',
  ),
  'solve-rows': offered(
    solveRows,
    'Any number of planes, points and speeds from known coefficients: weighted least squares within limits, with the bound that proves it. One row for every point at every speed.',
  ),
  'trial-weight': offered(
    trialWeight,
    'A trial weight that is heard and does no harm: by the force cap of 10 % of the load, a plane’s limit, or a known coefficient.',
  ),
  'without-phase': offered(
    withoutPhase,
    'One plane without phase, from the sizes with one weight at three places or more. Needs no tacho.',
  ),
  pieces: offered(
    pieces,
    'A weight put together from pieces at equally spaced positions: the best choice for one to four of them, fewest proposed.',
  ),
  combine: offered(combine, 'Several weights of one plane as one at a radius.'),
  'six-places': offered(
    sixPlaces,
    'Residual unbalance from the sizes with a known weight at six places or more, evenly spaced in the order typed.',
  ),
};
export type ComputationName = keyof typeof COMPUTATIONS;

/** Whether an address names a computation. */
export function isComputation(name: string): name is ComputationName {
  return Object.hasOwn(COMPUTATIONS, name);
}
