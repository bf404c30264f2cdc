import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Reading } from '@/entities/measured-record';
import { getEntityManager } from '@/lib/server/db';
import { readingPage } from '@/lib/server/queries/reading-page';
import type { SmallPlant } from '@/tests/support/plant';
import { openPlant } from '@/tests/support/open-plant';
import { machineWith, ONE_COLUMN_G, uploadAndConfirm } from './records-of-test';

// Measured records of the Case Western Reserve University Bearing Data Center. They state no
// licence, so they are read from the folder EVENRUN_RECORDS names and never copied here.
const folder = process.env.EVENRUN_RECORDS ?? '';
const present = folder !== '' && existsSync(join(folder, 'normal_de_48k.csv'));
if (!present) {
  console.info('Skipped: EVENRUN_RECORDS does not name a folder with the measured records.');
}

describe.skipIf(!present)('measured records, from file to kept reading', () => {
  let em: EntityManager;
  let plant: SmallPlant;
  let close: () => Promise<void>;

  beforeAll(async () => {
    ({ plant, close } = await openPlant());
    em = await getEntityManager();
  });

  afterAll(() => close());

  it.each([
    ['normal_de_48k.csv', 48_000, 1796, 2.764],
    ['inner_race_de_12k.csv', 12_000, 1797, 5.396],
    ['outer_race_de_12k.csv', 12_000, 1796, 7.649],
  ])('%s', async (name, sampleRateHz, speedRpm, kurtosis) => {
    const place = { siteId: plant.home.siteId, limitSetId: plant.limitSetId };
    const rig = await machineWith(em, place, { tag: name, speeds: [1730, 1796, 1800] });
    const kept = await uploadAndConfirm(plant.at('technician'), {
      name,
      bytes: new Uint8Array(readFileSync(join(folder, name))),
      pointId: rig.pointIds[0],
      takenAt: new Date(Date.now() - 86_400_000).toISOString(),
      // Rate and speed stand in the file; the speed is taken from there.
      layout: { ...ONE_COLUMN_G, sampleRateHz },
    });
    expect(kept).toMatchObject({ state: 'kept', reasons: [] });
    const page = await readingPage(plant.at('reader'), kept.recordId);
    expect(page?.waveform).toMatchObject({ sampleCount: 120_000, sampleRateHz });
    expect(Math.abs((page?.vector?.speedRpm ?? 0) / speedRpm - 1)).toBeLessThan(0.02);
    const found = await em.findOneOrFail(Reading, { record: kept.recordId, kind: 'kurtosis' });
    expect(Math.abs(found.value / kurtosis - 1)).toBeLessThan(0.05);
  });
});
