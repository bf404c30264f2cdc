import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { MeasuredRecord, Waveform, type HoldReason } from '@/entities/measured-record';
import { Person } from '@/entities/person';
import type { Upload } from '@/entities/upload';
import { clockDoubts, placeDoubts } from '@/lib/domain/intake/record-doubts';
import { ok, type Result } from '@/lib/domain/result';
import { decodeSamples, encodeSamples } from '../samples';
import { deriveRecord, type DerivedFacts, type RawWaveform } from './derive';
import { createOverview } from './overview';
import type { PointContext } from './point-context';
import { pointHistory } from './point-history';
import { clearFindings, writeFindings } from './write-findings';

/** Everything a new record of a waveform is made of. */
export type RecordFacts = {
  readonly context: PointContext;
  readonly raw: RawWaveform;
  readonly takenAt: Date;
  readonly statedSpeedRpm: number | null;
  readonly personId: number;
  readonly upload: Upload | null;
  readonly supersedes: MeasuredRecord | null;
  readonly note: string | null;
  /** The clock of the register: ages and times ahead are judged against it. */
  readonly now: Date;
  /** Doubts already raised while the file was read. */
  readonly doubts: readonly HoldReason[];
  /** `skip` leaves out the look at what the point has kept, for records known to be right. */
  readonly history: 'compare' | 'skip';
};

/** Doubts that came with the file: they stay wherever the record is moved to. */
const FROM_THE_FILE = ['RATE_DISAGREES', 'DOUBLED_HOUR'];

export type BuiltRecord = { readonly record: MeasuredRecord; readonly facts: DerivedFacts };

/**
 * Makes the record of a waveform with everything derived from it: kept where nothing is doubtful,
 * held with its reasons otherwise. The caller flushes and writes the audit row. Seeders use it too,
 * which run outside React's server bundle: nothing here marks itself as server-only.
 */
export async function buildRecord(
  em: EntityManager,
  facts: RecordFacts,
): Promise<Result<BuiltRecord>> {
  const { context, raw, takenAt } = facts;
  const derived = deriveRecord(raw, context, facts.statedSpeedRpm);
  if (!derived.ok) return derived;
  const holdReasons = [
    ...facts.doubts,
    ...derived.value.doubts,
    ...clockDoubts(takenAt.getTime(), facts.now.getTime()),
    ...(facts.history === 'skip' ? [] : await doubtsOfPlace(em, facts, derived.value, null)),
  ];
  const record = em.create(MeasuredRecord, {
    point: context.point,
    declaredPoint: context.point,
    upload: facts.upload,
    source: 'waveform',
    takenAt,
    statedSpeedRpm: facts.statedSpeedRpm,
    state: holdReasons.length === 0 ? 'kept' : 'held',
    holdReasons,
    supersedes: facts.supersedes,
    person: em.getReference(Person, facts.personId, { wrapped: true }),
    createdAt: facts.now,
    note: facts.note,
  });
  createWaveform(em, record, raw);
  createOverview(em, record, raw.samples, facts.now);
  writeFindings(em, { record, context, facts: derived.value, now: facts.now });
  return ok({ record, facts: derived.value });
}

/**
 * Derives and judges a stored record again at its point as it stands, for a record that was moved:
 * everything derived is made anew, state and reasons follow.
 */
export async function rejudgeRecord(
  em: EntityManager,
  record: MeasuredRecord,
  context: PointContext,
  now: Date,
): Promise<Result<BuiltRecord>> {
  const raw = await loadRaw(em, record.id);
  const derived = deriveRecord(raw, context, record.statedSpeedRpm ?? null);
  if (!derived.ok) return derived;
  const place = { context, takenAt: record.takenAt };
  record.holdReasons = [
    ...record.holdReasons.filter(({ code }) => FROM_THE_FILE.includes(code)),
    ...derived.value.doubts,
    ...clockDoubts(record.takenAt.getTime(), now.getTime()),
    ...(await doubtsOfPlace(em, place, derived.value, record.id)),
  ];
  record.state = record.holdReasons.length === 0 ? 'kept' : 'held';
  await clearFindings(em, record.id);
  writeFindings(em, { record, context, facts: derived.value, now });
  return ok({ record, facts: derived.value });
}

/** The samples of a record as received. */
export async function loadRaw(em: EntityManager, recordId: number): Promise<RawWaveform> {
  const stored = await em.findOneOrFail(Waveform, { record: recordId });
  const { sampleRateHz, quantity, unit, scale, tacho, tachoFormat } = stored;
  return {
    samples: decodeSamples(stored.sampleFormat, stored.samples),
    tacho: tacho && tachoFormat ? decodeSamples(tachoFormat, tacho) : null,
    sampleRateHz,
    quantity,
    unit,
    scale,
  };
}

async function doubtsOfPlace(
  em: EntityManager,
  { context, takenAt }: Pick<RecordFacts, 'context' | 'takenAt'>,
  { analysis, thirdOctaves }: DerivedFacts,
  recordId: number | null,
): Promise<HoldReason[]> {
  const pointId = context.point.id;
  const siteId = context.point.machine.$.site.id;
  const history = await pointHistory(em, { pointId, siteId, takenAt, recordId, thirdOctaves });
  return placeDoubts(analysis.overallVelocityRmsMmS, history);
}

function createWaveform(em: EntityManager, record: MeasuredRecord, raw: RawWaveform): void {
  const samples = encodeSamples(raw.samples);
  const tacho = raw.tacho === null ? null : encodeSamples(raw.tacho);
  em.create(Waveform, {
    record,
    sampleRateHz: raw.sampleRateHz,
    sampleCount: raw.samples.length,
    quantity: raw.quantity,
    unit: raw.unit,
    scale: raw.scale,
    sampleFormat: samples.format,
    samples: samples.bytes,
    tachoFormat: tacho?.format ?? null,
    tacho: tacho?.bytes ?? null,
  });
}
