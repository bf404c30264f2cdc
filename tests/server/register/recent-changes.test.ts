import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MeasuredRecord, Reading } from '@/entities/measured-record';
import { atTime } from '@/lib/server/clock';
import { recentChanges } from '@/lib/server/queries/recent-changes';
import { BoardPlant, daysBefore } from '@/tests/server/due-board/board-plant';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';

const NOW = new Date('2026-11-02T06:00:00Z');
let em: EntityManager;
let plant: SmallPlant;
let book: BoardPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
  book = await BoardPlant.at(em, plant.home.siteId, plant.at('engineer').personId);
});

afterAll(() => close());

async function readings(tag: string, ...series: [days: number, value: number][]): Promise<number> {
  const machine = await book.machine(tag, 'B', [1.4, 2.8, 4.5]);
  for (const [days, value] of series)
    await book.read(machine.pointIds[0], {
      at: daysBefore(NOW, days),
      value,
      oneX: null,
      lagDeg: null,
      speedRpm: 990,
    });
  return machine.machineId;
}

const changes = () => atTime(NOW, () => recentChanges(plant.at('technician'), undefined));

describe('what has changed', () => {
  it('is the newest passing of a boundary, worse apart from better, the worst zone on top', async () => {
    await readings('UP-1', [40, 1.0], [20, 1.6], [5, 3.0]);
    await readings('UP-2', [40, 4.0], [3, 4.6]);
    await readings('DOWN-1', [40, 3.0], [3, 0.9]);
    await readings('SAME-1', [40, 2.0], [3, 2.7]);
    await readings('OLD-1', [60, 1.0], [45, 2.0], [3, 2.1]);
    const { worse, better } = await changes();
    expect(worse.map(({ tag }) => tag)).toEqual(['UP-2', 'UP-1']);
    expect(worse[1]).toMatchObject({
      pointLabel: 'A-H',
      before: { value: 1.6, zone: 'B' },
      after: { value: 3, zone: 'C' },
      at: daysBefore(NOW, 5).toISOString(),
    });
    expect(better.map(({ tag }) => tag)).toEqual(['DOWN-1']);
  });

  it('counts no reading that was lined through', async () => {
    const machineId = await readings('LT-1', [40, 1.0], [3, 3.0]);
    expect((await changes()).worse.map((one) => one.machineId)).toContain(machineId);
    const newest = await em.findOneOrFail(
      Reading,
      { point: { machine: machineId } },
      { orderBy: { takenAt: 'desc' } },
    );
    await em.nativeUpdate(MeasuredRecord, { id: newest.record.id }, { state: 'lined through' });
    await em.nativeUpdate(Reading, { id: newest.id }, { status: 'lined through' });
    expect((await changes()).worse.map((one) => one.machineId)).not.toContain(machineId);
  });

  it('has the events of the month, newest on top, and none to come', async () => {
    const { machineId } = plant.home;
    for (const days of [40, 20, 2, -3]) await book.balanced(machineId, daysBefore(NOW, days));
    const { events } = await changes();
    expect(events.map(({ at }) => at)).toEqual(
      [2, 20].map((days) => daysBefore(NOW, days).toISOString()),
    );
    expect(events[0]).toMatchObject({ tag: 'KX-2', kind: 'balance', person: 'engineer home' });
  });
});
