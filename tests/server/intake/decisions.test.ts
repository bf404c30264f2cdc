import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { LimitSet, LimitUse } from '@/entities/limit-set';
import { MeasuredRecord, OneXVector, Reading } from '@/entities/measured-record';
import { Setup } from '@/entities/setup';
import { Upload } from '@/entities/upload';
import type { Actor } from '@/lib/schemas/actor';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { keepHeld, lineThrough, rehome } from '@/lib/server/commands/settle-record';
import { reopenUpload } from '@/lib/server/commands/settle-upload';
import { getEntityManager } from '@/lib/server/db';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import {
  bytesOf,
  failureOf,
  machineWith,
  ONE_COLUMN_G,
  sineCsv,
  uploadAndConfirm,
  valueOf,
} from './records-of-test';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let technician: Actor;
let point: number;
let other: number;
let serial = 0;

beforeAll(async () => {
  ({ plant, close } = await openPlant());

  technician = plant.at('technician');
  [point, other] = plant.home.pointIds;
});

afterAll(() => close());

beforeEach(async () => {
  em = await getEntityManager();
});

type Record = Partial<Parameters<typeof sineCsv>[0]> & { ageHours: number; pointId?: number };

/** 16.5 Hz is 990 r/min, the speed of the plant's fan. */
function upload({ ageHours, pointId = point, ...tone }: Record, speedRpm = '990') {
  serial += 1;
  return uploadAndConfirm(technician, {
    name: `record-${serial}.csv`,
    bytes: bytesOf(sineCsv({ hz: 16.5, rms: 0.03, seed: serial, ...tone })),
    pointId,
    takenAt: new Date(Date.now() - ageHours * 3_600_000).toISOString(),
    layout: ONE_COLUMN_G,
    speedRpm,
  });
}

const codesOf = ({ reasons }: { reasons: { code: string }[] }) => reasons.map(({ code }) => code);

describe('what is held, and why', () => {
  it('nothing is doubtful about a usual record', async () => {
    const kept = await upload({ ageHours: 200 });
    expect(kept).toMatchObject({ state: 'kept', reasons: [] });
    expect(await em.findOneOrFail(Upload, { id: kept.received.uploadId })).toMatchObject({
      state: 'kept',
    });
  });

  it.each([
    [
      'a level four times the usual',
      { ageHours: 190, rms: 0.15 },
      ['LEVEL_UNLIKE', 'UNLIKE_POINT'],
    ],
    ['a level a quarter of it', { ageHours: 180, rms: 0.007 }, ['LEVEL_UNLIKE', 'UNLIKE_POINT']],
    ['the same point at the same minute', { ageHours: 200 }, ['SAME_TIME']],
    ['too few turns', { ageHours: 160, seconds: 0.4 }, ['FEW_TURNS', 'UNLIKE_POINT']],
    ['a clock ahead', { ageHours: -2 }, ['CLOCK_AHEAD']],
    ['a clock behind', { ageHours: 24 * 500 }, ['CLOCK_OLD']],
  ])('%s', async (_name, record, wanted) => {
    const held = await upload(record);
    expect(codesOf(held)).toEqual(wanted);
    expect(held.state).toBe('held');
    const statuses = await em.find(Reading, { record: held.recordId });
    expect(new Set(statuses.map(({ status }) => status))).toEqual(new Set(['held']));
    expect(await em.findOne(OneXVector, { record: held.recordId })).toMatchObject({
      status: 'held',
    });
  });

  it('a speed outside the range of the machine', async () => {
    const held = await upload({ ageHours: 150, hz: 30 }, '1800');
    expect(codesOf(held)).toContain('SPEED_OUTSIDE_RANGE');
  });

  it('a stated rate that the time column contradicts', async () => {
    const lines = Array.from({ length: 6000 }, (_, i) => {
      return `${(i / 2500).toFixed(4)},${(0.04 * Math.sin(2 * Math.PI * 16.5 * (i / 2500))).toFixed(6)}`;
    });
    const text = `# sample_rate_hz=3000\ntime_s,acceleration_g\n${lines.join('\n')}\n`;
    const held = await uploadAndConfirm(technician, {
      name: 'rate.csv',
      bytes: bytesOf(text),
      pointId: other,
      takenAt: new Date(Date.now() - 3_600_000).toISOString(),
      speedRpm: '990',
      layout: {
        delimiter: 'comma',
        decimalMark: 'point',
        sampleRateHz: '3000',
        columns: [
          { role: 'time', unit: 's' },
          { role: 'signal', unit: 'g' },
        ],
      },
    });
    expect(codesOf(held)).toEqual(['RATE_DISAGREES']);
  });

  it('an hour the clock showed twice', async () => {
    const text = sineCsv({ hz: 16.5, rms: 0.03, tag: '\n# twice' });
    const held = await uploadAndConfirm(technician, {
      name: 'twice.csv',
      bytes: bytesOf(text),
      pointId: other,
      takenAt: '2025-10-26T02:30',
      layout: ONE_COLUMN_G,
      speedRpm: '990',
    });
    expect(codesOf(held)).toContain('DOUBLED_HOUR');
  });
});

describe('a held record', () => {
  it('is kept with a reason, and feeds from then on', async () => {
    const { recordId, received } = await upload({ ageHours: -1 });
    const failed = await keepHeld(technician, { recordId, reason: ' ' });
    expect(failureOf(failed)).toMatchObject({ field: 'reason', message: 'Write the reason.' });
    valueOf(
      await keepHeld(technician, { recordId, reason: 'The clock of the analyser was wrong' }),
    );
    const readings = await em.find(Reading, { record: recordId });
    expect(new Set(readings.map(({ status }) => status))).toEqual(new Set(['kept']));
    expect(await em.findOneOrFail(MeasuredRecord, recordId)).toMatchObject({
      state: 'kept',
      decisionReason: 'The clock of the analyser was wrong',
    });
    expect(await em.findOneOrFail(Upload, received.uploadId)).toMatchObject({ state: 'kept' });
    const audit = await em.findOneOrFail(AuditEvent, { action: 'keepHeld', entityId: recordId });
    expect(audit).toMatchObject({
      reason: 'The clock of the analyser was wrong',
      before: { state: 'held' },
    });
  });

  it('is not kept twice at one instant of one point', async () => {
    const at = new Date(Date.now() - 130 * 3_600_000).toISOString();
    const place = { pointId: point, takenAt: at, layout: ONE_COLUMN_G, speedRpm: '990' };
    const file = (seed: number) => ({
      name: `instant-${seed}.csv`,
      bytes: bytesOf(sineCsv({ hz: 16.5, rms: 0.03, seed })),
    });
    const first = await uploadAndConfirm(technician, { ...place, ...file(901) });
    expect(first.state).toBe('kept');
    const second = await uploadAndConfirm(technician, { ...place, ...file(902) });
    expect(codesOf(second)).toEqual(['SAME_TIME']);
    const failure = failureOf(
      await keepHeld(technician, { recordId: second.recordId, reason: 'both count' }),
    );
    expect(failure).toMatchObject({ code: 'same-time' });
    expect(await em.findOneOrFail(MeasuredRecord, second.recordId)).toMatchObject({
      state: 'held',
    });
    valueOf(
      await lineThrough(technician, { recordId: first.recordId, reason: 'the other counts' }),
    );
    valueOf(await keepHeld(technician, { recordId: second.recordId, reason: 'now it counts' }));
  });
});

describe('a record lined through', () => {
  it('stays with its reason, feeds nothing, and is corrected by a newer one of the same file', async () => {
    const { recordId, received } = await upload({ ageHours: 120 });
    const { uploadId } = received;
    valueOf(await lineThrough(technician, { recordId, reason: 'unit was mm/s' }));
    const readings = await em.find(Reading, { record: recordId });
    expect(new Set(readings.map(({ status }) => status))).toEqual(new Set(['lined through']));
    expect(failureOf(await lineThrough(technician, { recordId, reason: 'again' })).code).toBe(
      'already',
    );
    valueOf(await reopenUpload(technician, { uploadId, reason: 'read it anew' }));
    const again = valueOf(
      await confirmUpload(technician, {
        uploadId,
        pointId: point,
        takenAt: new Date(Date.now() - 120 * 3_600_000).toISOString(),
        speedRpm: '990',
        layout: { ...ONE_COLUMN_G, columns: [{ role: 'signal', unit: 'mm/s' }] },
      }),
    );
    const corrected = await em.findOneOrFail(MeasuredRecord, again.recordId);
    expect(corrected.supersedes?.id).toBe(recordId);
  });

  it('is lined through by a technician within a day only', async () => {
    const { recordId } = await upload({ ageHours: 110 });
    // The trigger guards the facts of a record; the test moves its clock behind the trigger's back.
    const tables = em.getConnection();
    await tables.execute('alter table measured_record disable trigger measured_record_keeps_facts');
    await tables.execute(
      `update measured_record set created_at = now() - interval '25 hours' where id = ${recordId}`,
    );
    await tables.execute('alter table measured_record enable trigger measured_record_keeps_facts');
    const late = failureOf(await lineThrough(technician, { recordId, reason: 'too late' }));
    expect(late.message).toBe(
      'This record is more than 24 h old: ask a reliability engineer to line it through.',
    );
    valueOf(await lineThrough(plant.at('engineer'), { recordId, reason: 'sensor was loose' }));
  });
});

describe('a record moved', () => {
  it('is judged anew at its new point, and the point declared stays', async () => {
    const sites = { site: plant.home.siteId };
    const wide = em.create(LimitSet, {
      ...{ title: 'Wide', edition: 'test', bAb: 0.1, bBc: 0.2, bCd: 0.3 },
      ...{ bandLowHz: 2, bandHighHz: 400, citation: 'Test data', enteredAt: new Date() },
    });
    await em.flush();
    const next = await machineWith(
      em,
      { siteId: sites.site, limitSetId: wide.id },
      { tag: 'KX-3', speeds: [950, 990, 1010] },
    );
    expect(await em.count(LimitUse, { limitSet: wide.id })).toBe(1);
    const { recordId } = await upload({ ageHours: 100 });
    const before = await em.findOneOrFail(Reading, { record: recordId, kind: 'overall velocity' });
    const move = { recordId, pointId: next.pointIds[0], reason: 'stood at the other fan' };
    expect(valueOf(await rehome(technician, move)).state).toBe('kept');
    const fresh = await getEntityManager();
    const after = await fresh.findOneOrFail(Reading, {
      record: recordId,
      kind: 'overall velocity',
    });
    expect(after).toMatchObject({ bandLowHz: 2, bandHighHz: 400, zone: 'D' });
    expect(after.limits).toMatchObject({ title: 'Wide', bCd: 0.3 });
    expect(before.zone).not.toBe('D');
    const record = await fresh.findOneOrFail(MeasuredRecord, recordId);
    expect([record.point.id, record.declaredPoint.id]).toEqual([next.pointIds[0], point]);
    const vector = await fresh.findOneOrFail(OneXVector, { record: recordId });
    expect(vector.setup?.id).toBe(
      (await fresh.findOneOrFail(Setup, { machine: next.machineId })).id,
    );
    expect(failureOf(await rehome(technician, move))).toMatchObject({
      code: 'same-point',
      field: 'pointId',
    });
  });

  it('goes to no point of another site', async () => {
    const { recordId } = await upload({ ageHours: 90 });
    const away = { recordId, pointId: plant.away.pointIds[0], reason: 'elsewhere' };
    expect(failureOf(await rehome(technician, away))).toMatchObject({ code: 'not-found' });
  });
});
