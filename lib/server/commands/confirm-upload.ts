import 'server-only';
import { LockMode } from '@mikro-orm/core';
import type { z } from 'zod';
import { MeasuredRecord, type HoldReason } from '@/entities/measured-record';
import { ColumnLayout, type Upload } from '@/entities/upload';
import { readWaveformCsv, type WaveformRead } from '@/lib/domain/intake/read-waveform-csv';
import { fail, ok, type Result } from '@/lib/domain/result';
import { instantOfTyped, type TypedInstant } from '@/lib/domain/site-time';
import { confirmUploadInput } from '@/lib/schemas/upload-input';
import { command, type CommandContext } from '../command';
import { chosenLayout, type ChosenLayout } from '../intake/chosen-layout';
import { saveColumnLayout } from '../intake/save-column-layout';
import { buildRecord } from '../measure/keep-waveform';
import { loadPointContext, type PointContext } from '../measure/point-context';
import { notFound, visiblePoint, visibleUpload } from '../scope';
import { readStoredFile } from '../store/files';

export type ConfirmedUpload = {
  recordId: number;
  state: 'kept' | 'held';
  reasons: HoldReason[];
};

type Input = z.output<typeof confirmUploadInput>;
type Ready = {
  upload: Upload;
  context: PointContext;
  taken: TypedInstant;
  chosen: ChosenLayout;
  read: WaveformRead;
};

/**
 * Reads a waiting file as a person confirmed it and makes its record: kept where nothing is doubtful,
 * held with the reasons otherwise. A layout given a name is saved for the next file of this shape.
 */
export const confirmUpload = command(
  { name: 'confirmUpload', permission: 'measurement:upload', input: confirmUploadInput },
  async (context, input): Promise<Result<ConfirmedUpload>> => {
    const ready = await prepare(context, input);
    if (!ready.ok) return ready;
    const { upload } = ready.value;
    const built = await makeRecord(context, ready.value, input);
    if (!built.ok) return { ok: false, failure: { ...built.failure, field: 'file' } };
    const { record } = built.value;
    const saved = await saveColumnLayout(context, upload, ready.value.chosen, input.layoutName);
    if (saved)
      upload.columnLayout = context.em.getReference(ColumnLayout, saved, { wrapped: true });
    upload.state = record.state === 'kept' ? 'kept' : 'held';
    upload.point = record.declaredPoint;
    upload.layout = { ...ready.value.chosen, questions: [], problem: null };
    await context.em.flush();
    context.audit({
      siteId: upload.site.id,
      entity: 'MeasuredRecord',
      entityId: record.id,
      after: {
        uploadId: upload.id,
        pointId: input.pointId,
        takenAtTyped: input.takenAt,
        zoneStated: ready.value.taken.zoneStated,
        state: record.state,
        holdReasons: record.holdReasons,
        layout: ready.value.chosen.layout,
        columnLayoutId: saved,
      },
    });
    return ok({ recordId: record.id, state: upload.state, reasons: [...record.holdReasons] });
  },
);

async function prepare(context: CommandContext, input: Input): Promise<Result<Ready>> {
  const upload = await visibleUpload(context, input.uploadId);
  if (!upload) return notFound('upload');
  // Two people confirming one file at once would make two records of it.
  await context.em.refresh(upload, { lockMode: LockMode.PESSIMISTIC_WRITE });
  if (upload.state !== 'waiting')
    return fail('decided', `This file is ${upload.state} already: open its record.`);
  const placed = await placeOf(context, upload, input);
  if (!placed.ok) return placed;
  const bytes = await readStoredFile(upload.sha256);
  const chosen = chosenLayout(bytes, upload, input.layout);
  if (!chosen.ok) return chosen;
  const read = readWaveformCsv(bytes, chosen.value.layout, upload.fileName);
  if (!read.ok) return { ok: false, failure: { ...read.failure, field: 'file' } };
  return ok({ upload, ...placed.value, chosen: chosen.value, read: read.value });
}

async function placeOf(
  context: CommandContext,
  upload: Upload,
  input: Input,
): Promise<Result<Pick<Ready, 'context' | 'taken'>>> {
  const { em, actor } = context;
  const point = await visiblePoint(context, input.pointId);
  if (point?.machine.$.site.id !== upload.site.id)
    return { ok: false, failure: { ...notFound('point').failure, field: 'pointId' } };
  if (point.machine.$.state === 'retired')
    return fail('retired', `${point.machine.$.tag} is retired: choose another point.`, 'pointId');
  const zone = actor.sites.find(({ id }) => id === upload.site.id)?.timeZone ?? 'UTC';
  const taken = instantOfTyped(input.takenAt, zone);
  if (!taken.ok) return { ok: false, failure: { ...taken.failure, field: 'takenAt' } };
  const placed = await loadPointContext(em, point.id, new Date(taken.value.atMs));
  return ok({ context: placed, taken: taken.value });
}

async function makeRecord(
  { em, actor, now }: CommandContext,
  { upload, context, taken, read }: Ready,
  input: Input,
) {
  const { samples, tacho, sampleRateHz, quantity, unit, scale } = read;
  return buildRecord(em, {
    context,
    raw: { samples, tacho, sampleRateHz, quantity, unit, scale },
    takenAt: new Date(taken.atMs),
    statedSpeedRpm: input.speedRpm ?? read.speedRpm,
    personId: actor.personId,
    upload,
    supersedes: await lastLinedThrough({ em, upload }),
    note: input.note === '' ? null : input.note,
    now,
    doubts: [...read.doubts, ...(taken.doubled ? [DOUBLED_HOUR] : [])],
    history: 'compare',
  });
}

const DOUBLED_HOUR: HoldReason = {
  code: 'DOUBLED_HOUR',
  message:
    'The clock showed this hour twice that day (summer time ended) and the first was taken: say which it was.',
};

/** A file taken up again makes a record that corrects the one that was lined through. */
async function lastLinedThrough({ em, upload }: Pick<CommandContext, 'em'> & { upload: Upload }) {
  const [last] = await em.find(
    MeasuredRecord,
    { upload: upload.id, state: 'lined through' },
    { orderBy: { id: 'desc' }, limit: 1 },
  );
  return last ?? null;
}
