import type { EntityManager } from '@mikro-orm/postgresql';
import { BalanceJob } from '@/entities/balance-job';
import { randomSource } from '@/lib/domain/plant-model/random-source';
import { atTime } from '@/lib/server/clock';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';
import { stopJob } from '@/lib/server/commands/stop-job';
import { DemoJob, type JobPlan } from './demo-job';
import { actorOf, machineOf, type DemoPlant } from './demo-plant';

const TECHNICIAN = 'nora.field@northbank.example';
const ENGINEER = 'aldo.marsh@both.example';
const MILL_TECHNICIAN = 'emil.strand@sundvik.example';

/** Jobs that came to their end, in the order they were done. */
const FINISHED: readonly JobPlan[] = [
  {
    tag: 'EF-101',
    day: 78,
    by: TECHNICIAN,
    reason: '1x has grown steadily for months and stands in zone C.',
    trials: 'taken off',
    targetOneX: 0.6,
    areaOwner: 'Marta Lowe',
  },
  {
    tag: 'KX-2',
    day: 96,
    by: ENGINEER,
    reason: 'Both bearings in zone C since the wheel was relined.',
    trials: 'taken off',
    targetOneX: 0.6,
    areaOwner: 'Marta Lowe',
  },
  {
    tag: 'WF-6',
    day: 140,
    by: MILL_TECHNICIAN,
    reason: 'Fibre build-up under the paint; 1x above the B/C boundary.',
    trials: 'taken off',
    targetOneX: 0.5,
    areaOwner: 'Lars Ekman',
  },
  {
    tag: 'DF-2',
    day: 190,
    by: ENGINEER,
    reason: 'New wheel, never balanced in its own bearings.',
    trials: 'taken off',
    targetOneX: 0.5,
    areaOwner: 'Lars Ekman',
  },
  {
    tag: 'CB-7',
    day: 236,
    by: TECHNICIAN,
    reason: 'Blades worn by dust on both sides; few starts allowed, so the trial weights stay.',
    trials: 'stays on',
    targetOneX: 0.6,
    areaOwner: 'Jon Pike',
  },
  {
    tag: 'EF-101',
    day: 262,
    by: TECHNICIAN,
    reason: 'Half a year on, the same growth again.',
    trials: 'taken off',
    targetOneX: 0.6,
    areaOwner: 'Marta Lowe',
  },
  {
    tag: 'RM-1',
    day: 305,
    by: ENGINEER,
    reason: 'Zone C although the wheel was cleaned: wear, not build-up.',
    trials: 'taken off',
    targetOneX: 0.6,
    areaOwner: 'Jon Pike',
  },
];

const HALF_WAY: JobPlan = {
  tag: 'VF-12',
  day: 426,
  by: TECHNICIAN,
  reason: '1x carries the vibration at both bearings, zone C since last month.',
  trials: 'taken off',
  targetOneX: 0.6,
  areaOwner: 'Jon Pike',
};

/** Does the jobs of the past through the commands, each at its time, and leaves one half-way. */
export async function seedJobs(em: EntityManager, plant: DemoPlant): Promise<number> {
  for (const plan of FINISHED) await jobOf(em, plant, plan).finish();
  await openAndDrop(em, plant);
  const open = jobOf(em, plant, HALF_WAY);
  await open.open();
  await open.base();
  await open.trial(0);
  return em.count(BalanceJob, {});
}

function jobOf(em: EntityManager, plant: DemoPlant, plan: JobPlan): DemoJob {
  const actor = actorOf(plant.actors, plan.by);
  const means = { actor, calendar: plant.calendar, random: randomSource(1000 * plan.day) };
  return new DemoJob(em, machineOf(plant, plan.tag), plan, means);
}

/** The ventilator with the soft foot: opened as a balance job, and seen not to be one. */
async function openAndDrop(em: EntityManager, plant: DemoPlant): Promise<void> {
  const { machineId, planeIds, pointIds } = machineOf(plant, 'AV-3');
  const actor = actorOf(plant.actors, ENGINEER);
  const opened = await atTime(plant.calendar.at(405, 9), () =>
    openBalanceJob(actor, {
      machineId,
      kind: 'one-plane',
      planeIds: [...planeIds],
      pointIds: pointIds.slice(0, 1),
      unit: 'mm/s rms',
      phaseSense: 'lag',
      angleSense: 'against',
      reason: 'Zone C with most of it at 1x.',
      targetOneX: '',
      startsAllowed: '',
      gradeTarget: 'false',
      cleaned: 'yes',
      nothingLoose: 'on',
      readingSteady: 'on',
      stateAgreed: 'on',
      setupConfirmed: 'on',
      standingSentence: 'on',
    }),
  );
  if (!opened.ok) throw new Error(opened.failure.message);
  const { jobId } = opened.value;
  const stopped = await atTime(plant.calendar.at(405, 10, 20), () =>
    stopJob(actor, {
      jobId,
      outcome: 'not a balance job',
      reason:
        'Horizontal shakes six times as much as vertical and in step with it; foot 3 is soft.',
      rotorState: 'Nothing was fitted.',
      safe: 'on',
    }),
  );
  if (!stopped.ok) throw new Error(stopped.failure.message);
}
