import type { EntityManager } from '@mikro-orm/postgresql';
import { Seeder } from '@mikro-orm/seeder';
import { clockNow } from '@/lib/server/clock';
import { DemoCalendar } from './demo-calendar';
import { seedEvents } from './demo-events';
import { seedJobs } from './demo-jobs';
import { ledgerOf } from './demo-ledger';
import { seedPlant, type DemoPlant } from './demo-plant';
import { insertReadings, readingsOf, type TypedReading } from './demo-readings';
import { roundsOf, sampledFrom } from './demo-rounds';
import { seedUploads } from './demo-uploads';
import { seedWaveforms } from './demo-waveforms';

/** What a seeding made. */
export type SeededCounts = { machines: number; readings: number; jobs: number };

/**
 * The demo plant: invented machines, shaken by the plant model for 14 months and written down. Jobs
 * and uploads go through the commands, so `em` must be the transaction those join.
 */
export default class DemoSeeder extends Seeder<SeededCounts> {
  async run(em: EntityManager, counts?: SeededCounts): Promise<void> {
    const plant = await seedPlant(em, new DemoCalendar(clockNow()));
    em.clear();
    const jobs = await seedJobs(em, plant);
    await seedEvents(em, plant);
    em.clear();
    const readings = await seedMeasurements(em, plant);
    await seedUploads(em, plant);
    if (counts) Object.assign(counts, { machines: plant.machines.size, readings, jobs });
  }
}

async function seedMeasurements(em: EntityManager, plant: DemoPlant): Promise<number> {
  const typed: TypedReading[] = [];
  let sampled = 0;
  for (const machine of plant.machines.values()) {
    const rounds = roundsOf(machine, plant.calendar);
    const from = sampledFrom(machine, rounds);
    const ledger = await ledgerOf(em, machine);
    sampled += await seedWaveforms(em, machine, rounds.slice(from), ledger);
    typed.push(...readingsOf(machine, rounds.slice(0, from), ledger));
    em.clear();
  }
  await insertReadings(em, typed);
  return typed.length + sampled;
}
