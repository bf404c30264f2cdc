import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MeasuredRecord } from '@/entities/measured-record';
import { ColumnLayout } from '@/entities/upload';
import type { Actor } from '@/lib/schemas/actor';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { reopenUpload, withdrawUpload } from '@/lib/server/commands/settle-upload';
import { getEntityManager } from '@/lib/server/db';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import {
  bytesOf,
  failureOf,
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

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  em = await getEntityManager();
  technician = plant.at('technician');
  [point, other] = plant.home.pointIds;
});

afterAll(() => close());

describe('a waiting file', () => {
  it('is withdrawn and taken up again, and confirmed once only', async () => {
    const { uploadId } = valueOf(
      await receiveUpload(technician, {
        fileName: 'w.csv',
        bytes: bytesOf(sineCsv({ hz: 16.5, rms: 0.03, seed: 77 })),
        siteId: null,
        pointId: point,
      }),
    );
    valueOf(await withdrawUpload(technician, { uploadId, reason: 'not ours' }));
    const confirm = {
      uploadId,
      pointId: point,
      takenAt: new Date(Date.now() - 80 * 3_600_000).toISOString(),
      speedRpm: '990',
      layout: ONE_COLUMN_G,
    };
    expect(failureOf(await confirmUpload(technician, confirm)).code).toBe('decided');
    valueOf(await reopenUpload(technician, { uploadId, reason: 'it is ours' }));
    const twice = await Promise.all([
      confirmUpload(technician, confirm),
      confirmUpload(technician, confirm),
    ]);
    expect(twice.filter(({ ok }) => ok)).toHaveLength(1);
    expect(await em.count(MeasuredRecord, { upload: uploadId })).toBe(1);
  });

  it('is read by the layout saved for its shape, whose versions count up', async () => {
    const file = (seed: number) => bytesOf(`level\n${seed}.5\n${'0.25\n0.5\n'.repeat(200)}`);
    const layout = {
      ...ONE_COLUMN_G,
      columns: [{ role: 'signal' as const, unit: 'mm/s' as const }],
    };
    const save = (seed: number, change = {}) =>
      uploadAndConfirm(technician, {
        name: `level-${seed}.csv`,
        bytes: file(seed),
        pointId: other,
        takenAt: new Date(Date.now() - seed * 86_400_000).toISOString(),
        layout: { ...layout, ...change },
        layoutName: 'Old logger',
      });
    expect((await save(1)).received.questions).toHaveLength(2);
    const second = await save(2);
    expect(second.received).toMatchObject({ layoutName: 'Old logger', questions: [] });
    await save(3, { sampleRateHz: 2000 });
    const versions = await em.find(
      ColumnLayout,
      { name: 'Old logger' },
      { orderBy: { version: 'asc' } },
    );
    expect(versions.map(({ version }) => version)).toEqual([1, 2]);
  });

  it('is not received by a reader', async () => {
    const refused = await receiveUpload(plant.at('reader'), {
      fileName: 'r.csv',
      bytes: bytesOf('acceleration_g\n1\n'),
      siteId: null,
      pointId: null,
    });
    expect(failureOf(refused).code).toBe('forbidden');
  });
});
