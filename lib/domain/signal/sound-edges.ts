import { fail, ok, type Failure, type Result } from '../result';

/** Tacho edges fit for use, and the one repair that was made to them, if any. */
export type SoundEdges = {
  readonly edgesS: Float64Array;
  readonly repair: 'none' | 'one put in' | 'one left out';
};

/** Two intervals between edges whose ratio is above this are not both one turn. */
export const INTERVAL_RATIO_MAX = 1.5;
// A repair must leave an even train: two missing turns with one edge put in would just pass 1.5.
const REPAIRED_RATIO_MAX = 1.25;

/**
 * Checks that every interval between edges is one turn: none further than a ratio of 1.5 from their
 * median. One missing edge is put in half-way, one doubled edge is left out (the one whose removal
 * leaves the evener train); anything more is a failure, because the turns can then no longer be
 * counted. Needs at least 3 edges.
 *
 * Example: edges at 0, 1, 2, 4, 5 s are repaired with one at 3 s.
 */
export function soundEdges(
  edgesS: Float64Array,
): Result<SoundEdges, Failure<'TOO_FEW_EDGES' | 'EDGES_IRREGULAR'>> {
  if (edgesS.length < 3) {
    return fail(
      'TOO_FEW_EDGES',
      `The tacho shows ${edgesS.length} edges and at least 3 are needed: record for longer.`,
      'tacho',
    );
  }
  if (unevenness(edgesS) <= INTERVAL_RATIO_MAX) return ok({ edgesS, repair: 'none' });
  const repaired = bestRepair(edgesS);
  if (repaired !== null && unevenness(repaired.edgesS) <= REPAIRED_RATIO_MAX) return ok(repaired);
  return fail(
    'EDGES_IRREGULAR',
    'The tacho misses or doubles more than one edge: clean the mark or move the tacho and record again.',
    'tacho',
  );
}

function bestRepair(edgesS: Float64Array): SoundEdges | null {
  const typical = medianInterval(edgesS);
  const candidates = Array.from(edgesS).flatMap((edge, i): SoundEdges[] => {
    const next = edgesS[i + 1];
    if (next === undefined) return [];
    const turns = (next - edge) / typical;
    if (turns > INTERVAL_RATIO_MAX) {
      return [{ edgesS: withEdge(edgesS, (edge + next) / 2), repair: 'one put in' }];
    }
    if (turns >= 1 / INTERVAL_RATIO_MAX) return [];
    return [i, i + 1].map((k) => ({ edgesS: withoutEdge(edgesS, k), repair: 'one left out' }));
  });
  return candidates.reduce<SoundEdges | null>(
    (best, candidate) =>
      best === null || unevenness(candidate.edgesS) < unevenness(best.edgesS) ? candidate : best,
    null,
  );
}

function withEdge(edgesS: Float64Array, edge: number): Float64Array {
  return Float64Array.from([...edgesS, edge]).sort();
}

function withoutEdge(edgesS: Float64Array, index: number): Float64Array {
  return edgesS.filter((_, i) => i !== index);
}

function unevenness(edgesS: Float64Array): number {
  const typical = medianInterval(edgesS);
  return intervals(edgesS).reduce(
    (worst, interval) => Math.max(worst, interval / typical, typical / interval),
    1,
  );
}

function medianInterval(edgesS: Float64Array): number {
  const sorted = intervals(edgesS).sort();
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

function intervals(edgesS: Float64Array): Float64Array {
  return edgesS.subarray(1).map((edge, i) => edge - (edgesS[i] ?? 0));
}
