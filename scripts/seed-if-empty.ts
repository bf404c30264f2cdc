import { Person } from '@/entities/person';
import { closeDatabase, getEntityManager } from '@/lib/server/db';
import DemoSeeder, { type SeededCounts } from '@/seeders/demo-seeder';

/** Any number, the same in every start: only one start seeds at a time. */
const LOCK = 20_260_101;

try {
  const said = await seedIfEmpty();
  if (said !== null) console.log(said);
} catch (error) {
  console.error(`error: ${oneLine(error)}`);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}

/** Everything in one transaction: a crash half-way leaves the database as empty as it was. */
async function seedIfEmpty(): Promise<string | null> {
  const started = performance.now();
  const counts: SeededCounts = { machines: 0, readings: 0, jobs: 0 };
  const forked = await getEntityManager();
  const seeded = await forked.transactional(async (em) => {
    await em.execute('select pg_advisory_xact_lock(?)', [LOCK]);
    if ((await em.count(Person, {})) > 0) return false;
    await new DemoSeeder().run(em, counts);
    return true;
  });
  if (!seeded) return null;
  const seconds = ((performance.now() - started) / 1000).toFixed(1);
  return `Seeded the demo plant: ${counts.machines} machines, ${counts.readings} readings, ${counts.jobs} balance jobs in ${seconds} s`;
}

/** A refused statement is thousands of characters of values before it says why. */
function oneLine(error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  const [withoutDetail = message] = message.split('\n - detail');
  return (withoutDetail.split(' - ').at(-1)?.split('\n')[0] ?? message).slice(0, 300);
}
