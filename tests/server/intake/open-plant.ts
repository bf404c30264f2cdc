import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { closeDatabase, getEntityManager } from '@/lib/server/db';
import { freshDatabase } from '@/tests/support/fresh-database';
import { seedSmallPlant, type SmallPlant } from '@/tests/support/plant';

/** The small plant in a database and a folder of files of its own; `close` takes both away. */
export async function openPlant(): Promise<{ plant: SmallPlant; close: () => Promise<void> }> {
  const database = await freshDatabase();
  const folder = await mkdtemp(join(tmpdir(), 'evenrun-files-'));
  process.env.DATABASE_URL = database.url;
  process.env.EVENRUN_DATA_DIR = folder;
  const plant = await seedSmallPlant(await getEntityManager());
  return {
    plant,
    close: async () => {
      await closeDatabase();
      await database.close();
      await rm(folder, { recursive: true });
    },
  };
}
