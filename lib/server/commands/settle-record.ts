import 'server-only';
import type { Loaded } from '@mikro-orm/postgresql';
import { Point } from '@/entities/bearing';
import type { HoldReason, MeasuredRecord } from '@/entities/measured-record';
import type { Upload } from '@/entities/upload';
import { fail, ok, type Result } from '@/lib/domain/result';
import { rehomeInput, settleRecordInput } from '@/lib/schemas/upload-input';
import { command, type CommandContext } from '../command';
import { rejudgeRecord } from '../measure/keep-waveform';
import { loadPointContext } from '../measure/point-context';
import { markFindings } from '../measure/write-findings';
import { notFound, visiblePoint, visibleRecord } from '../scope';

const TECHNICIAN_HOURS = 24;

type VisibleRecord = Loaded<MeasuredRecord, 'point' | 'point.machine' | 'upload'>;

/** Keeps a held record after a person has looked at it; from then on it feeds trends and limits. */
export const keepHeld = command(
  { name: 'keepHeld', permission: 'measurement:decide', input: settleRecordInput },
  async (context, { recordId, reason }) => {
    const record = await visibleRecord(context, recordId);
    if (!record) return notFound('record');
    if (record.state !== 'held')
      return fail('not-held', `This record is ${record.state}: only a held one can be kept.`);
    await settle(context, record, 'kept', reason);
    return ok({ recordId });
  },
);

/** Lines a record through: it stays visible with its reason and feeds nothing. */
export const lineThrough = command(
  { name: 'lineThrough', permission: 'measurement:decide', input: settleRecordInput },
  async (context, { recordId, reason }) => {
    const record = await visibleRecord(context, recordId);
    if (!record) return notFound('record');
    if (record.state === 'lined through')
      return fail('already', 'This record is lined through already.');
    if (isTooLate(context, record))
      return fail(
        'too-late',
        `This record is more than ${TECHNICIAN_HOURS} h old: ask a reliability engineer to line it through.`,
      );
    await settle(context, record, 'lined through', reason);
    return ok({ recordId });
  },
);

/**
 * Moves a record to the point it was taken at. The point declared stays for ever; everything derived
 * is made and judged anew where it now belongs, which keeps it or holds it there.
 */
export const rehome = command(
  { name: 'rehome', permission: 'measurement:decide', input: rehomeInput },
  async (context, { recordId, pointId, reason }): Promise<Result<Rehomed>> => {
    const { em, now } = context;
    const record = await visibleRecord(context, recordId);
    if (!record) return notFound('record');
    const point = await visiblePoint(context, pointId);
    const siteId = record.point.$.machine.$.site.id;
    if (point?.machine.$.site.id !== siteId)
      return { ok: false, failure: { ...notFound('point').failure, field: 'pointId' } };
    const refused = notMovable(record, pointId);
    if (refused) return refused;
    const before = { pointId: record.point.id, state: record.state };
    record.point = em.getReference(Point, pointId, { wrapped: true }) as typeof record.point;
    record.decisionReason = reason;
    const place = await loadPointContext(em, pointId, record.takenAt);
    const judged = await rejudgeRecord(em, record, place, now);
    if (!judged.ok) return judged;
    const state = record.state === 'kept' ? 'kept' : 'held';
    if (record.upload) record.upload.$.state = state;
    await em.flush();
    context.audit({
      siteId,
      entity: 'MeasuredRecord',
      entityId: recordId,
      before,
      after: { pointId, state, holdReasons: record.holdReasons },
      reason,
    });
    return ok({ recordId, state, reasons: [...record.holdReasons] });
  },
);

type Rehomed = { recordId: number; state: 'kept' | 'held'; reasons: HoldReason[] };

const UPLOAD_STATES: Record<MeasuredRecord['state'], Upload['state']> = {
  kept: 'kept',
  held: 'held',
  'lined through': 'withdrawn',
};

async function settle(
  { em, audit }: CommandContext,
  record: VisibleRecord,
  state: MeasuredRecord['state'],
  reason: string,
): Promise<void> {
  const before = { state: record.state };
  record.state = state;
  record.decisionReason = reason;
  if (record.upload) record.upload.$.state = UPLOAD_STATES[state];
  await em.flush();
  await markFindings(em, record.id, state);
  audit({
    siteId: record.point.$.machine.$.site.id,
    entity: 'MeasuredRecord',
    entityId: record.id,
    before,
    after: { state },
    reason,
  });
}

function isTooLate({ actor, now }: CommandContext, record: VisibleRecord): boolean {
  const hours = (now.getTime() - record.createdAt.getTime()) / 3_600_000;
  return actor.role === 'technician' && record.state === 'kept' && hours > TECHNICIAN_HOURS;
}

function notMovable(record: VisibleRecord, pointId: number) {
  if (record.state === 'lined through')
    return fail('lined-through', 'This record is lined through: take its file up again instead.');
  if (record.source !== 'waveform')
    return fail(
      'typed',
      'A typed reading is not moved: line it through and type it where it belongs.',
    );
  if (record.point.id !== pointId) return null;
  return fail('same-point', 'The record is at this point already: choose another.', 'pointId');
}
