import type { EntityManager } from '@mikro-orm/postgresql';
import { AuditEvent } from '@/entities/audit-event';
import { Instrument } from '@/entities/setup';
import { Area, Site } from '@/entities/site';
import type { Actor } from '@/lib/schemas/actor';
import type { DemoCalendar } from './demo-calendar';
import { limitSetFor, seedLimitSets } from './demo-limit-sets';
import { seedMachine, type DemoMachine } from './demo-machine';
import { seedPeople } from './demo-people';
import type { MachineSpec } from './machine-spec';
import { NORTHBANK_FANS } from './northbank-fans';
import { NORTHBANK_OTHERS } from './northbank-others';
import { SUNDVIK_MACHINES } from './sundvik-machines';

/** The register before anything was measured. */
export type DemoPlant = {
  readonly calendar: DemoCalendar;
  readonly siteIds: readonly number[];
  /** By e-mail address. */
  readonly actors: ReadonlyMap<string, Actor>;
  /** By tag. */
  readonly machines: ReadonlyMap<string, DemoMachine>;
};

type SitePlan = {
  readonly specs: readonly MachineSpec[];
  readonly technician: string;
  readonly site: Pick<Site, 'name' | 'timeZone' | 'decimalMark'>;
};

const PLANS: readonly SitePlan[] = [
  {
    specs: [...NORTHBANK_FANS, ...NORTHBANK_OTHERS],
    technician: 'nora.field@northbank.example',
    site: { name: 'Northbank Works', timeZone: 'Europe/London', decimalMark: '.' },
  },
  {
    specs: SUNDVIK_MACHINES,
    technician: 'emil.strand@sundvik.example',
    site: { name: 'Sundvik Mill', timeZone: 'Europe/Stockholm', decimalMark: ',' },
  },
];

/** Makes sites, people, limit sets and machines with all that belongs to them. */
export async function seedPlant(em: EntityManager, calendar: DemoCalendar): Promise<DemoPlant> {
  const startedAt = calendar.at(0, 6);
  const limitSets = seedLimitSets(em, startedAt);
  const sites = PLANS.map(({ site }) => em.create(Site, site));
  await em.flush();
  const actors = await seedPeople(em, sites, startedAt);
  const machines = new Map<string, DemoMachine>();
  for (const [i, { specs, technician }] of PLANS.entries()) {
    const site = sites[i];
    if (!site) continue;
    const areas = seedAreas(em, site, specs);
    for (const [place, spec] of specs.entries()) {
      const area = areas.get(spec.area);
      if (!area) throw new Error(`${spec.tag} has no area`);
      const limitSet = limitSetFor(spec, limitSets);
      const by = actorOf(actors, technician);
      const number = machines.size + 1;
      const made = { site, area, limitSet, by, startedAt, number, roundHour: 8 + 0.4 * place };
      machines.set(spec.tag, await seedMachine(em, spec, made));
    }
    noteSeeding(em, { site, at: startedAt, count: specs.length });
  }
  await em.flush();
  return { calendar, siteIds: sites.map(({ id }) => id), actors, machines };
}

/** The actor with this address. */
export function actorOf(actors: ReadonlyMap<string, Actor>, email: string): Actor {
  const actor = actors.get(email);
  if (!actor) throw new Error(`Nobody of the demo plant has the address ${email}`);
  return actor;
}

/** The machine with this tag. */
export function machineOf({ machines }: DemoPlant, tag: string): DemoMachine {
  const machine = machines.get(tag);
  if (!machine) throw new Error(`The demo plant has no machine ${tag}`);
  return machine;
}

function seedAreas(
  em: EntityManager,
  site: Site,
  specs: readonly MachineSpec[],
): Map<string, Area> {
  const areas = new Map<string, Area>();
  for (const { area } of specs) {
    const parts = area.split(' / ');
    for (const depth of parts.keys()) {
      const path = parts.slice(0, depth + 1).join(' / ');
      const parent = areas.get(parts.slice(0, depth).join(' / ')) ?? null;
      const name = parts[depth] ?? area;
      if (!areas.has(path)) areas.set(path, em.create(Area, { site, name, parent }));
    }
  }
  return areas;
}

function noteSeeding(em: EntityManager, note: { site: Site; at: Date; count: number }): void {
  const { site, at, count } = note;
  em.create(Instrument, {
    site,
    name: 'Two-channel field instrument',
    serial: `FI-${site.name.length}07`,
    phaseSense: 'lag',
  });
  em.create(AuditEvent, {
    at,
    site,
    action: 'seedDemoPlant',
    entity: 'Site',
    entityId: site.id,
    after: { machines: count },
    reason: 'An invented plant, to look around in',
  });
}
