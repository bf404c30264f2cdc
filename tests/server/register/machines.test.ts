import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { LimitUse } from '@/entities/limit-set';
import { Position } from '@/entities/rotor';
import { createMachine } from '@/lib/server/commands/create-machine';
import {
  chooseLimitSet,
  editMachine,
  newSetup,
  recordEvent,
  restoreMachine,
  retireMachine,
} from '@/lib/server/commands/edit-machine';
import { findMachines } from '@/lib/server/queries/find-machines';
import { machinePage } from '@/lib/server/queries/machine-page';
import { plantBook } from '@/lib/server/queries/plant-book';
import { pointTrend } from '@/lib/server/queries/point-trend';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';
import { valueOf } from '../balance-job/job-driver';
import { newMachine } from './new-machine';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

const engineer = () => plant.at('engineer');
const create = (over: Parameters<typeof newMachine>[1] = {}) =>
  createMachine(engineer(), newMachine(plant, over));

describe('a machine entered', () => {
  it('stands with bearings, points, planes, positions, set-up and limits', async () => {
    const { machineId } = valueOf(await create({ tag: 'AX-1' }));
    const page = await machinePage(engineer(), machineId);
    expect(page?.points.map(({ label }) => label)).toEqual(['A-H', 'A-V', 'B-H', 'B-V']);
    expect(page?.setups).toMatchObject([{ number: 1, rotationFromDriveEnd: 'clockwise' }]);
    expect(page?.limits?.title).toBe('Test group 2, rigid');
    expect(page?.missing).toEqual(['bearing types']);
    const positions = await em
      .fork()
      .find(Position, { plane: { rotor: { serial: 'AX-1-R' } } }, { orderBy: { number: 'asc' } });
    // 7 positions against rotation from 0: 0, 51.43, 102.86 … (definition, 360/7).
    expect(positions.map(({ angleDeg }) => Math.round(angleDeg * 100) / 100)).toEqual([
      0, 51.43, 102.86, 154.29, 205.71, 257.14, 308.57,
    ]);
    const audit = await em
      .fork()
      .findOneOrFail(AuditEvent, { action: 'createMachine', entityId: machineId });
    expect(audit.after).toMatchObject({ tag: 'AX-1' });
  });

  it('keeps its tag to itself, whatever the case and the spaces', async () => {
    valueOf(await create({ tag: 'Fan 3' }));
    expect(await create({ tag: 'FAN3' })).toMatchObject({
      failure: { code: 'taken', field: 'tag', message: expect.stringContaining('Fan 3') as string },
    });
  });

  it('says what is wrong with its speeds', async () => {
    expect(await create({ tag: 'SP-1', speedMinRpm: '1500', speedMaxRpm: '900' })).toMatchObject({
      failure: {
        field: 'speedMaxRpm',
        message: expect.stringContaining('below the lowest') as string,
      },
    });
    expect(await create({ tag: 'SP-1', nominalSpeedRpm: '3000' })).toMatchObject({
      failure: { field: 'nominalSpeedRpm' },
    });
    expect(await create({ tag: 'SP-1', powerKw: 'ninety' })).toMatchObject({
      failure: { field: 'powerKw', message: expect.stringContaining('ninety') as string },
    });
  });

  it('refuses more positions than a rim can tell apart, and writes nothing then', async () => {
    const [plane] = newMachine(plant).planes ?? [];
    if (!plane) throw new Error('the usual machine has a plane');
    expect(await create({ tag: 'PO-1', planes: [{ ...plane, positions: '361' }] })).toMatchObject({
      failure: { field: 'planes.0.positions' },
    });
    expect((await findMachines(engineer(), 'PO-1')).machines).toEqual([]);
  });

  it('assumes nothing about fixed positions: neither their sense nor where the first is', async () => {
    const [plane] = newMachine(plant).planes ?? [];
    if (!plane) throw new Error('the usual machine has a plane');
    for (const [over, field] of [
      [{ numbering: '' as const }, 'planes.0.numbering'],
      [{ numbering: undefined }, 'planes.0.numbering'],
      [{ firstDeg: '' }, 'planes.0.firstDeg'],
    ] as const)
      expect(await create({ tag: 'PN-1', planes: [{ ...plane, ...over }] })).toMatchObject({
        failure: { field },
      });
    const free = { ...plane, positions: '', numbering: '' as const, firstDeg: '' };
    expect(await create({ tag: 'PN-1', planes: [free] })).toMatchObject({ ok: true });
  });

  it('says everything that is wrong at once', async () => {
    const result = await create({ tag: '', name: '', powerKw: 'ninety', criticality: 'E' as 'A' });
    const failure = result.ok ? undefined : result.failure;
    const fields = [failure, ...(failure?.more ?? [])].map((one) => one?.field);
    expect(fields).toEqual(['tag', 'name', 'powerKw', 'criticality']);
  });

  it('cannot be entered by a technician', async () => {
    expect(
      await createMachine(plant.at('technician'), newMachine(plant, { tag: 'T-1' })),
    ).toMatchObject({
      failure: { code: 'forbidden' },
    });
  });
});

describe('a machine edited', () => {
  it('is still found by its older tag', async () => {
    const { machineId } = valueOf(await create({ tag: 'Old Tag 7' }));
    const { rotorSerial: _serial, ...identity } = newMachine(plant, { tag: 'NEW-7' });
    valueOf(await editMachine(engineer(), { machineId, ...identity, reason: 'New numbering.' }));
    const found = (await findMachines(engineer(), 'oldtag')).machines;
    expect(found).toMatchObject([{ id: machineId, tag: 'NEW-7' }]);
    expect((await findMachines(engineer(), '100%')).machines).toEqual([]);
  });

  it('is retired with its history kept, and comes back', async () => {
    const { machineId } = valueOf(await create({ tag: 'RT-1' }));
    const all = { text: '', area: '' };
    valueOf(await retireMachine(engineer(), { machineId, reason: 'Scrapped.' }));
    const active = await plantBook(engineer(), { ...all, state: 'active' });
    expect(active.rows.map(({ tag }) => tag)).not.toContain('RT-1');
    const retired = await plantBook(engineer(), { ...all, state: 'retired' });
    expect(retired.rows.map(({ tag }) => tag)).toContain('RT-1');
    expect((await machinePage(engineer(), machineId))?.retiredReason).toBe('Scrapped.');
    valueOf(await restoreMachine(engineer(), { machineId, reason: 'Bought back.' }));
    expect((await machinePage(engineer(), machineId))?.state).toBe('active');
  });

  it('starts a new set-up, closes the old one and draws a break in the trend', async () => {
    const { machineId } = valueOf(await create({ tag: 'SU-1' }));
    const moved = {
      machineId,
      mark: 'Keyway',
      tachoDeg: '30',
      tachoEdge: 'rising' as const,
      rotationFromDriveEnd: 'clockwise' as const,
      reason: 'Tacho moved to the other side',
    };
    expect(valueOf(await newSetup(engineer(), moved)).number).toBe(2);
    const page = await machinePage(engineer(), machineId);
    expect(page?.setups.map(({ number, validTo }) => [number, validTo === null])).toEqual([
      [2, true],
      [1, false],
    ]);
    const trend = await pointTrend(engineer(), page?.points[0]?.id ?? 0);
    expect(trend?.events).toMatchObject([{ breaksTrend: true, jobId: null }]);
  });

  it('takes another limit set and keeps that the first was in use before', async () => {
    const { machineId } = valueOf(await create({ tag: 'LI-1' }));
    valueOf(
      await chooseLimitSet(engineer(), {
        machineId,
        limitSetId: plant.limitSetId,
        reason: 'Checked with the maker.',
      }),
    );
    const uses = await em.fork().find(LimitUse, { machine: machineId }, { orderBy: { id: 'asc' } });
    expect(uses.map(({ toAt }) => toAt === null)).toEqual([false, true]);
  });

  it('notes an event', async () => {
    const { machineId } = valueOf(await create({ tag: 'EV-1' }));
    const event = {
      machineId,
      kind: 'cleaning' as const,
      text: 'Wheel cleaned',
      breaksTrend: 'on' as const,
    };
    valueOf(await recordEvent(plant.at('technician'), event));
    expect((await machinePage(engineer(), machineId))?.events).toMatchObject([
      { kind: 'cleaning', text: 'Wheel cleaned' },
    ]);
    expect(await recordEvent(plant.at('reader'), event)).toMatchObject({
      failure: { code: 'forbidden' },
    });
  });
});
