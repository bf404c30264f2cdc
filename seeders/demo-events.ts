import type { EntityManager } from '@mikro-orm/postgresql';
import { MachineEvent } from '@/entities/machine';
import { Weight } from '@/entities/weight';
import { AuditEvent } from '@/entities/audit-event';
import { machineOf, type DemoPlant } from './demo-plant';

type Happening = Pick<MachineEvent, 'kind' | 'text'> & {
  readonly tag: string;
  readonly day: number;
  readonly hour: number;
  readonly breaksTrend?: boolean;
};

/** Day and hour KX-2 was stopped and a weight of its last balance was found gone. */
const LOST_DAY = 350;
const LOST_HOUR = 14;

const HAPPENINGS: readonly Happening[] = [
  {
    tag: 'RM-1',
    day: 150,
    hour: 0,
    kind: 'cleaning',
    text: 'Wheel scraped clean on all blades; 14 kg of raw meal taken out.',
    breaksTrend: true,
  },
  {
    tag: 'P-31',
    day: 239,
    hour: 15,
    kind: 'repair',
    text: 'Motor exchanged. Coupling set with a straight edge; the laser was at the other site.',
    breaksTrend: true,
  },
  {
    tag: 'KX-2',
    day: LOST_DAY,
    hour: LOST_HOUR,
    kind: 'trip',
    text: 'Shook hard after a bang and was stopped. The clamp of the weight in plane R had cracked; the weight is gone.',
    breaksTrend: true,
  },
  {
    tag: 'SB-2',
    day: 130,
    hour: 11,
    kind: 'repair',
    text: 'Base plate grouted anew after the separator was moved.',
  },
  { tag: 'CP-1', day: 212, hour: 10, kind: 'other', text: 'Air end oil changed, filter replaced.' },
  { tag: 'CB-7', day: 367, hour: 7, kind: 'process', text: 'Standing: cooler rebuilt below it.' },
  { tag: 'ID-1', day: 61, hour: 9, kind: 'cleaning', text: 'Inlet box cleared of ash.' },
  { tag: 'FP-2', day: 301, hour: 13, kind: 'trip', text: 'Tripped on low suction pressure.' },
];

/** What happened to machines beside their balances, and the weight that one of them lost. */
export async function seedEvents(em: EntityManager, plant: DemoPlant): Promise<void> {
  for (const { tag, day, hour, kind, text, breaksTrend = false } of HAPPENINGS) {
    const { machineId, by } = machineOf(plant, tag);
    em.create(MachineEvent, {
      machine: machineId,
      at: plant.calendar.at(day, hour),
      kind,
      text,
      breaksTrend,
      person: by.personId,
    });
  }
  await loseWeight(em, plant);
  await em.flush();
}

async function loseWeight(em: EntityManager, plant: DemoPlant): Promise<void> {
  const { rotorId, planeIds, siteId, by } = machineOf(plant, 'KX-2');
  const at = plant.calendar.at(LOST_DAY, LOST_HOUR);
  const [weight] = await em.find(
    Weight,
    { rotor: rotorId, plane: planeIds[1], endedAt: null },
    { orderBy: { massG: 'desc' }, limit: 1 },
  );
  if (!weight) throw new Error('KX-2 has no weight to lose');
  const endReason = 'Clamp cracked; the weight was not found in the casing.';
  em.assign(weight, { endedAt: at, ending: 'found missing', endedBy: by.personId, endReason });
  em.create(AuditEvent, {
    at,
    person: by.personId,
    site: siteId,
    action: 'seedDemoPlant',
    entity: 'Weight',
    entityId: weight.id,
    before: { on: true },
    after: { ending: 'found missing' },
    reason: endReason,
  });
}
