import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Derived, type MeasuredRecord } from '@/entities/measured-record';
import { downsampleMinMax, type ReducedCurve } from '@/lib/domain/signal/downsample-min-max';
import { decodeSamples } from '../samples';

const METHOD = 'min-max-overview/1';

/** Pairs of lowest and highest values an overview has: more than any screen asks for at once. */
export const OVERVIEW_BUCKETS = 2048;

/** Keeps a long record's extremes beside it, so that its whole curve is drawn without reading it. */
export function createOverview(
  em: EntityManager,
  record: MeasuredRecord,
  samples: Float64Array,
  now: Date,
): void {
  if (samples.length <= 4 * OVERVIEW_BUCKETS) return;
  const { indices, values } = downsampleMinMax(samples, OVERVIEW_BUCKETS);
  const both = Float64Array.from([...indices, ...values]);
  em.create(Derived, {
    record,
    method: METHOD,
    settings: { buckets: OVERVIEW_BUCKETS },
    result: {},
    lines: Buffer.from(both.buffer),
    madeAt: now,
  });
}

/** The extremes of a long record as received; null where the record is short enough to be read. */
export async function loadOverview(
  em: EntityManager,
  recordId: number,
): Promise<ReducedCurve | null> {
  const stored = await em.findOne(Derived, { record: recordId, method: METHOD });
  if (!stored?.lines) return null;
  const both = decodeSamples('f64le', stored.lines);
  const half = both.length / 2;
  return { indices: Uint32Array.from(both.subarray(0, half)), values: both.slice(half) };
}
