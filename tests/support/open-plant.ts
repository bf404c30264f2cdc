import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { EntityManager } from '@mikro-orm/postgresql';
import { closeDatabase, getEntityManager } from '@/lib/server/db';
import { freshDatabase } from './fresh-database';
import { seedSmallPlant, type SmallPlant } from './plant';

/** The small plant in a database and a folder of files of its own; `close` takes both away. */
export async function openPlant(): Promise<{
  em: EntityManager;
  plant: SmallPlant;
  close: () => Promise<void>;
}> {
  const database = await freshDatabase();
  const folder = await mkdtemp(join(tmpdir(), 'evenrun-files-'));
  process.env.DATABASE_URL = database.url;
  process.env.EVENRUN_DATA_DIR = folder;
  const em = await getEntityManager();
  const plant = await seedSmallPlant(em);
  return {
    em,
    plant,
    close: async () => {
      await closeDatabase();
      await database.close();
      await rm(folder, { recursive: true });
    },
  };
}
