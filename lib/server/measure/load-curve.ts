import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Waveform } from '@/entities/measured-record';
import { downsampleMinMax, type ReducedCurve } from '@/lib/domain/signal/downsample-min-max';
import { decodeSamples, type SampleFormat } from '../samples';
import { loadOverview, OVERVIEW_BUCKETS } from './overview';

/** What is known of a stored waveform without reading its samples. */
export async function waveformFacts(em: EntityManager, recordId: number) {
  return em.findOne(
    Waveform,
    { record: recordId },
    {
      fields: [
        'sampleRateHz',
        'sampleCount',
        'quantity',
        'unit',
        'scale',
        'sampleFormat',
        'tachoFormat',
      ],
    },
  );
}

type Stored = { sampleCount: number; sampleFormat: SampleFormat };
type Part = { readonly first: number; readonly count: number; readonly columns: number };

/**
 * A part of a record as received, reduced to its extremes; `indices` count from the record's first
 * sample. The whole of a long record comes from its overview, a part is cut out by the database.
 */
export async function loadCurve(
  em: EntityManager,
  recordId: number,
  stored: Stored,
  { first, count, columns }: Part,
): Promise<ReducedCurve> {
  const whole = first === 0 && count === stored.sampleCount && 2 * columns <= OVERVIEW_BUCKETS;
  const overview = whole ? await loadOverview(em, recordId) : null;
  if (overview) {
    const { indices, values } = downsampleMinMax(overview.values, columns);
    return { indices: indices.map((i) => overview.indices[i] ?? 0), values };
  }
  const part = await loadPart(em, recordId, stored.sampleFormat, { first, count });
  const { indices, values } = downsampleMinMax(part, columns);
  return { indices: indices.map((i) => i + first), values };
}

/** The tacho column of a record; null without one. */
export async function loadTacho(em: EntityManager, recordId: number): Promise<Float64Array | null> {
  const stored = await em.findOne(
    Waveform,
    { record: recordId },
    { fields: ['tacho', 'tachoFormat'] },
  );
  const { tacho, tachoFormat } = stored ?? {};
  return tacho && tachoFormat ? decodeSamples(tachoFormat, tacho) : null;
}

async function loadPart(
  em: EntityManager,
  recordId: number,
  format: SampleFormat,
  { first, count }: Pick<Part, 'first' | 'count'>,
): Promise<Float64Array> {
  const size = format === 'f32le' ? 4 : 8;
  const rows = await em
    .getConnection()
    .execute<{ part: Buffer }[]>(
      'select substring(samples from ? for ?) as part from waveform where record_id = ?',
      [first * size + 1, count * size, recordId],
    );
  return decodeSamples(format, rows[0]?.part ?? new Uint8Array(0));
}
