import type { EntityManager } from '@mikro-orm/postgresql';
import { Bearing, Point } from '@/entities/bearing';
import { LimitSet, LimitUse } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Person, SiteAccess } from '@/entities/person';
import { Plane, Rotor, RotorStay } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import { Area, Site } from '@/entities/site';
import type { Role } from '@/lib/domain/access/permissions';
import type { Actor } from '@/lib/schemas/actor';

export type SeededMachine = {
  siteId: number;
  areaId: number;
  machineId: number;
  rotorId: number;
  planeIds: [number, number];
  bearingIds: [number, number];
  pointIds: [number, number];
  setupId: number;
};

export type SmallPlant = {
  home: SeededMachine;
  away: SeededMachine;
  limitSetId: number;
  /** An actor of each role with access to the home site only. */
  at: (role: Role) => Actor;
  /** An engineer with access to the other site only. */
  foreigner: Actor;
};

const NOW = new Date('2026-01-01T08:00:00Z');
const ROLES: Role[] = ['reader', 'technician', 'engineer', 'planner', 'administrator'];

/** Two sites with one machine each (a KX-2-like fan between bearings), and people of every role. */
export async function seedSmallPlant(em: EntityManager): Promise<SmallPlant> {
  const limitSet = em.create(LimitSet, {
    title: 'Test group 2, rigid',
    edition: 'test',
    quantity: 'velocity',
    unit: 'mm/s rms',
    bandLowHz: 10,
    bandHighHz: 1000,
    bAb: 1.4,
    bBc: 2.8,
    bCd: 4.5,
    citation: 'Test data',
    enteredAt: NOW,
  });
  const sites = ['Northbank Works', 'Millside'].map((name) =>
    em.create(Site, { name, timeZone: 'Europe/Berlin' }),
  );
  await em.flush();
  const [homeSite, awaySite] = sites as [Site, Site];
  const actors = await seedPeople(em, homeSite);
  const home = await seedMachine(em, homeSite, limitSet);
  const away = await seedMachine(em, awaySite, limitSet);
  const foreigner = await seedPerson(em, awaySite, 'engineer', 'away');
  return {
    home,
    away,
    limitSetId: limitSet.id,
    foreigner,
    at: (role) => {
      const actor = actors.get(role);
      if (!actor) throw new Error(`no actor for ${role}`);
      return actor;
    },
  };
}

async function seedPeople(em: EntityManager, site: Site): Promise<Map<Role, Actor>> {
  const actors = new Map<Role, Actor>();
  for (const role of ROLES) actors.set(role, await seedPerson(em, site, role, 'home'));
  return actors;
}

async function seedPerson(
  em: EntityManager,
  site: Site,
  role: Role,
  where: string,
): Promise<Actor> {
  const person = em.create(Person, {
    name: `${role} ${where}`,
    email: `${role}.${where}@example.test`,
    passwordHash: 'no password',
    role,
    createdAt: NOW,
  });
  em.create(SiteAccess, { person, site });
  await em.flush();
  return {
    personId: person.id,
    name: person.name,
    email: person.email,
    role,
    sites: [
      {
        id: site.id,
        name: site.name,
        timeZone: site.timeZone,
        decimalMark: '.',
        phaseShown: 'lag',
      },
    ],
  };
}

/** One fan between two bearings with two planes, its set-up and its limits. */
export async function seedMachine(
  em: EntityManager,
  site: Site,
  limitSet: LimitSet,
  tag = 'KX-2',
): Promise<SeededMachine> {
  const area = em.create(Area, { site, name: `Hall of ${tag}` });
  const machine = em.create(Machine, {
    site,
    area,
    tag,
    tagKey: tag.toLowerCase().replace(/\s/g, ''),
    name: 'Kiln exhaust fan',
    aliases: [],
    kind: 'fan between bearings',
    powerKw: 250,
    speedMinRpm: 950,
    speedMaxRpm: 1010,
    nominalSpeedRpm: 990,
    criticality: 'B',
    support: 'rigid',
    createdAt: NOW,
  });
  const rotor = em.create(Rotor, {
    site,
    serial: `${tag}-R1`,
    name: 'Wheel',
    massKg: 640,
    massSource: 'known',
    behaviour: 'rigid',
    balanceGrade: 6.3,
    bearingSpanM: 1.9,
    centreOfMassFromAM: 0.95,
  });
  em.create(RotorStay, { rotor, machine, fromAt: NOW });
  const planes = [
    { name: 'L', order: 1, fromAM: 0.4 },
    { name: 'R', order: 2, fromAM: 1.5 },
  ].map((plane) => em.create(Plane, { ...plane, rotor, radiusMm: 700, maxGTotal: 250, pieceG: 5 }));
  const bearings = ['A', 'B'].map((label, index) =>
    em.create(Bearing, { machine, label, order: index + 1, fromAM: index * 1.9 }),
  );
  const points = bearings.map((bearing, index) =>
    em.create(Point, {
      machine,
      bearing,
      label: `${bearing.label}-H`,
      direction: 'H',
      order: index + 1,
    }),
  );
  const person = em.create(Person, {
    name: `Set-up person ${tag} ${site.id}`,
    email: `setup.${tag.toLowerCase()}.${site.id}@example.test`,
    passwordHash: 'no password',
    role: 'engineer',
    createdAt: NOW,
  });
  const setup = em.create(Setup, {
    machine,
    number: 1,
    markDescription: 'Punch mark on the hub',
    tachoDeg: 0,
    rotationFromDriveEnd: 'clockwise',
    sensorPlaces: [],
    reason: 'First set-up',
    validFrom: NOW,
    person,
  });
  em.create(LimitUse, { machine, limitSet, fromAt: NOW, reason: 'Group 2, rigid' });
  await em.flush();
  const pair = (ids: number[]) => ids as [number, number];
  return {
    siteId: site.id,
    areaId: area.id,
    machineId: machine.id,
    rotorId: rotor.id,
    planeIds: pair(planes.map((plane) => plane.id)),
    bearingIds: pair(bearings.map((bearing) => bearing.id)),
    pointIds: pair(points.map((point) => point.id)),
    setupId: setup.id,
  };
}
