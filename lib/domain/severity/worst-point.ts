import { severityIndex } from './severity-index';
import { judgeValue, type ZoneLimits, type ZoneVerdict } from './zone';

/** A value at a point with what it is judged by. */
export type PointValue = {
  readonly point: string;
  readonly value: number;
  readonly limits: ZoneLimits | null;
  readonly speedRpm: number | null;
};

/** The point that rules the machine, with its verdict. */
export type WorstPoint<P extends PointValue> = {
  readonly ruling: P;
  readonly verdict: ZoneVerdict;
};

/**
 * The worst of several points rules the machine: the highest zone, and within it the value deepest
 * in it, so that points judged by different limit sets compare. Points without a zone rule only when
 * no point has one, then by size. Of equal points the first. Null without any point. Source:
 * ISO 20816-1, the largest value measured at the bearings.
 *
 * Example: A-H 1.2, A-V 3.0 and B-H 2.1 with 1.4/2.8/4.5 give A-V, zone C.
 */
export function worstPoint<P extends PointValue>(points: readonly P[]): WorstPoint<P> | null {
  let worst: { ruling: P; verdict: ZoneVerdict; rank: Rank } | null = null;
  for (const point of points) {
    const verdict = judgeValue(point.value, point.limits, point.speedRpm);
    const rank = rankOf(point, verdict);
    if (worst === null || isHigher(rank, worst.rank)) worst = { ruling: point, verdict, rank };
  }
  return worst === null ? null : { ruling: worst.ruling, verdict: worst.verdict };
}

/** The value itself stands last: a division can round two neighbouring values to one share. */
type Rank = readonly [judged: number, index: number, share: number, value: number];

function rankOf({ value, limits }: PointValue, verdict: ZoneVerdict): Rank {
  if (verdict.kind === 'no zone' || limits === null)
    return [0, 0, 0, Number.isFinite(value) ? value : -1];
  return [1, severityIndex(value, limits.boundaries), value / limits.boundaries.cd, value];
}

function isHigher(one: Rank, other: Rank): boolean {
  const at = one.findIndex((part, i) => part !== other[i]);
  return at >= 0 && (one[at] ?? 0) > (other[at] ?? 0);
}
