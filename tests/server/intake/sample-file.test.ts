import { readFileSync } from 'node:fs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { OneXVector } from '@/entities/measured-record';
import { routes } from '@/lib/routes';
import { getEntityManager } from '@/lib/server/db';
import { nearDeg, near } from '@/tests/domain/balancing/near';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { machineWith, uploadAndConfirm } from './records-of-test';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ plant, close } = await openPlant());
  em = await getEntityManager();
});

afterAll(() => close());

// The file's first line says what was put in: v = √2·2.9·cos(Ωt − 120°) mm/s, differentiated.
it('the sample file that the upload page offers reads as its first line says', async () => {
  const place = { siteId: plant.home.siteId, limitSetId: plant.limitSetId };
  const fan = await machineWith(em, place, { tag: 'SAMPLE', speeds: [1480, 1485, 1490] });
  const file = new URL(`../../../public${routes.sampleFile()}`, import.meta.url);
  const { received, recordId, state } = await uploadAndConfirm(plant.at('technician'), {
    name: 'waveform-with-tacho.csv',
    bytes: new Uint8Array(readFileSync(file)),
    pointId: fan.pointIds[0],
    takenAt: new Date(Date.now() - 86_400_000).toISOString(),
    layout: {
      delimiter: 'comma',
      decimalMark: 'point',
      sampleRateHz: '',
      columns: [
        { role: 'time', unit: 's' },
        { role: 'signal', unit: 'm/s2' },
        { role: 'tacho', unit: '' },
      ],
    },
  });
  expect(received).toMatchObject({ problem: null, questions: [] });
  expect(state).toBe('kept');
  const vector = await em.fork().findOneOrFail(OneXVector, { record: recordId });
  near(vector.amplitude, 2.9, 0.03);
  nearDeg(vector.lagDeg ?? NaN, 120, 1);
  near(vector.speedRpm, 1485, 1);
});
