import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MeasuredRecord, OneXVector, Reading } from '@/entities/measured-record';
import type { Actor } from '@/lib/schemas/actor';
import type { LayoutChoicesInput } from '@/lib/schemas/upload-input';
import { keepHeld, rehome } from '@/lib/server/commands/settle-record';
import { getEntityManager } from '@/lib/server/db';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { machineWith, scenarioFile, uploadAndConfirm, valueOf } from './records-of-test';

// Scenarios S12, S15 and S17: invented records; expected values computed independently of this
// project (tests/reference/data). The plant here is the same as theirs in speed and limits.
let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let technician: Actor;

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  em = await getEntityManager();
  technician = plant.at('technician');
});

afterAll(() => close());

function expectNear(value: number | null | undefined, wanted: number, tolerance: number) {
  expect(Math.abs((value ?? NaN) - wanted), `${value} for ${wanted}`).toBeLessThanOrEqual(
    tolerance,
  );
}

const dayAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString();
const place = () => ({ siteId: plant.home.siteId, limitSetId: plant.limitSetId });

async function readingsOf(recordId: number) {
  const readings = await (await getEntityManager()).find(Reading, { record: recordId });
  return new Map(readings.map((reading) => [reading.kind, reading]));
}

async function vectorOf(recordId: number) {
  return (await getEntityManager()).findOne(OneXVector, { record: recordId });
}

const TIMED: LayoutChoicesInput = {
  delimiter: 'comma',
  decimalMark: 'point',
  sampleRateHz: '',
  columns: [
    { role: 'time', unit: 's' },
    { role: 'signal', unit: 'm/s2' },
  ],
};

describe('S12 a bearing defect, not unbalance', () => {
  it('is kept in zone C with a small share of 1x', async () => {
    const pump = await machineWith(em, place(), { tag: 'P-B3', speeds: [1482, 1482, 1482] });
    const { received, state, reasons, recordId } = await uploadAndConfirm(technician, {
      name: 'S12_PB3_DE_H.csv',
      bytes: scenarioFile('S12_PB3_DE_H.csv'),
      pointId: pump.pointIds[0],
      takenAt: dayAgo(1),
      layout: TIMED,
      speedRpm: '1482',
    });
    expect(received).toMatchObject({ questions: [], problem: null });
    expect({ state, reasons }).toEqual({ state: 'kept', reasons: [] });
    const readings = await readingsOf(recordId);
    const overall = readings.get('overall velocity');
    expect(overall).toMatchObject({ zone: 'C', bandLowHz: 10, bandHighHz: 1000, status: 'kept' });
    expect(overall!.limits).toMatchObject({ bAb: 1.4, bBc: 2.8, bCd: 4.5 });
    expectNear(overall!.value, 3.06, 0.03);
    expectNear(readings.get('rms acceleration')!.value, 4.6, 0.03 * 4.6);
    expectNear(readings.get('kurtosis')!.value, 9.3, 0.03 * 9.3);
    expectNear(readings.get('crest factor')!.value, 6.5, 0.03 * 6.5);
    const vector = await vectorOf(recordId);
    expectNear(vector?.amplitude, 0.92, 0.03);
    expect(vector?.lagDeg).toBeNull();
    const share = ((await vectorOf(recordId))!.amplitude / overall!.value) ** 2;
    expectNear(share, 0.091, 0.006);
  });
});

describe('S15 an export uploaded to the wrong point', () => {
  let declared: number;
  let neighbour: number;

  beforeAll(async () => {
    const motor = await machineWith(em, place(), {
      tag: 'M-204',
      speeds: [1465, 1480, 1495],
      labels: ['DE-H', 'NDE-H'],
    });
    const pump = await machineWith(em, place(), {
      tag: 'P-205',
      speeds: [2950, 2970, 2990],
      labels: ['NDE-H', 'DE-H'],
    });
    [declared, neighbour] = [motor.pointIds[0], pump.pointIds[0]];
    for (const [name, pointId, wanted] of [
      ['S15_declared_last.csv', declared, 1.42],
      ['S15_neighbour_last.csv', neighbour, 2.29],
    ] as const) {
      const kept = await uploadAndConfirm(technician, {
        name,
        bytes: scenarioFile(name),
        pointId,
        takenAt: dayAgo(30),
        layout: TIMED,
      });
      expect(kept).toMatchObject({ state: 'kept', reasons: [] });
      const overall = (await readingsOf(kept.recordId)).get('overall velocity');
      expectNear(overall?.value, wanted, 0.03);
    }
  });

  it('is held, feeds nothing, and names the neighbour', async () => {
    const held = await uploadAndConfirm(technician, {
      name: 'S15_upload.csv',
      bytes: scenarioFile('S15_upload.csv'),
      pointId: declared,
      takenAt: dayAgo(1),
      layout: TIMED,
    });
    expect(held.state).toBe('held');
    expect(held.reasons.map(({ code }) => code)).toEqual(['SPEED_OUTSIDE_RANGE', 'UNLIKE_POINT']);
    const unlike = held.reasons[1]?.message ?? '';
    expect(unlike).toContain('P-205 NDE-H');
    const [toDeclared, toNeighbour] = [...unlike.matchAll(/([\d.]+) dB/g)].map(([, db]) =>
      Number(db),
    );
    expectNear(toDeclared, 9.9, 0.5);
    expectNear(toNeighbour, 1.7, 0.5);
    const statuses = [...(await readingsOf(held.recordId)).values()].map(({ status }) => status);
    expect(new Set(statuses)).toEqual(new Set(['held']));

    const moved = valueOf(
      await rehome(technician, {
        recordId: held.recordId,
        pointId: neighbour,
        reason: 'I stood at the pump',
      }),
    );
    expect(moved).toMatchObject({ state: 'kept', reasons: [] });
    const record = await (await getEntityManager()).findOneOrFail(MeasuredRecord, held.recordId);
    expect([record.declaredPoint.id, record.point.id]).toEqual([declared, neighbour]);
    expect(record.decisionReason).toBe('I stood at the pump');
    const overall = (await readingsOf(held.recordId)).get('overall velocity');
    expectNear(overall?.value, 2.45, 0.03);
    expect(overall).toMatchObject({ status: 'kept', zone: 'B' });
    expect(overall?.point.id).toBe(neighbour);
    const again = await keepHeld(technician, { recordId: held.recordId, reason: 'twice' });
    expect(again).toMatchObject({ ok: false, failure: { code: 'not-held' } });
  });
});

describe('S17 1x size and lag from a waveform with a tacho column', () => {
  it('gives speed, size and lag at the set-up of the machine', async () => {
    const fan = await machineWith(em, place(), { tag: 'EF-101', speeds: [1480, 1480, 1480] });
    const { recordId, state, reasons } = await uploadAndConfirm(technician, {
      name: 'S17_EF101_B_H_tacho.csv',
      bytes: scenarioFile('S17_EF101_B_H_tacho.csv'),
      pointId: fan.pointIds[1],
      takenAt: dayAgo(1),
      layout: {
        ...TIMED,
        columns: [...(TIMED.columns ?? []), { role: 'tacho', unit: '' }],
      },
    });
    expect({ state, reasons }).toEqual({ state: 'kept', reasons: [] });
    const vector = await vectorOf(recordId);
    expect(vector).toMatchObject({ speedSource: 'tacho', unit: 'mm/s rms', status: 'kept' });
    expect(vector?.setup?.id).toBe(fan.setupId);
    expectNear(vector?.amplitude, 3.221, 0.05);
    expectNear(vector?.lagDeg, 217.8, 2);
    expectNear(vector?.speedRpm, 1480, 1);
    const overall = (await readingsOf(recordId)).get('overall velocity');
    expectNear(overall?.value, 3.4, 0.05);
  });
});
