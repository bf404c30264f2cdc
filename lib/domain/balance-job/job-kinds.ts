/** What a balance job sets out to do, as stored and as shown. */
export const JOB_KINDS = [
  'one-plane',
  'two-plane',
  'three or more planes',
  'static only',
  'couple only',
  'check only',
] as const;

export type JobKind = (typeof JOB_KINDS)[number];

/** How many correction planes a kind needs; `most` null: no upper limit. */
export type PlaneCount = { readonly least: number; readonly most: number | null };

/**
 * The correction planes that a kind of job needs. A check only hangs nothing and needs none.
 * Example: a 'static only' job has two, because an equal weight goes in each.
 */
export function planesOf(kind: JobKind): PlaneCount {
  const counts: Record<JobKind, PlaneCount> = {
    'one-plane': { least: 1, most: 1 },
    'two-plane': { least: 2, most: 2 },
    'three or more planes': { least: 3, most: null },
    'static only': { least: 2, most: 2 },
    'couple only': { least: 2, most: 2 },
    'check only': { least: 0, most: 0 },
  };
  return counts[kind];
}
