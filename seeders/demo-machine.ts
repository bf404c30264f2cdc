import type { EntityManager } from '@mikro-orm/postgresql';
import { Bearing, Point } from '@/entities/bearing';
import { LimitUse, type LimitSet } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Plane, Rotor, RotorStay } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import type { Area, Site } from '@/entities/site';
import type { ModelledMachine } from '@/lib/domain/plant-model/modelled-machine';
import type { Actor } from '@/lib/schemas/actor';
import { demoSerial } from './demo-serial';
import { modelOf, type MachineSpec } from './machine-spec';

/** A machine of the register together with the model that shakes it. */
export type DemoMachine = {
  readonly spec: MachineSpec;
  /** Counted through the plant: what its random numbers start from, whatever the ids are. */
  readonly number: number;
  readonly model: ModelledMachine;
  readonly siteId: number;
  readonly machineId: number;
  readonly rotorId: number;
  readonly setupId: number;
  /** In the order of the model's planes. */
  readonly planeIds: readonly number[];
  /** In the order of the model's points. */
  readonly pointIds: readonly number[];
  readonly limitSet: LimitSet;
  /** Who walks its rounds, and when in the day. */
  readonly by: Actor;
  readonly roundHour: number;
};

type Place = {
  readonly site: Site;
  readonly area: Area;
  readonly limitSet: LimitSet;
  readonly by: Actor;
  readonly startedAt: Date;
  readonly number: number;
  readonly roundHour: number;
};

/** Makes a machine with rotor, planes, bearings, points, set-up and limits. */
export async function seedMachine(
  em: EntityManager,
  spec: MachineSpec,
  place: Place,
): Promise<DemoMachine> {
  const { site, limitSet, by, startedAt, number, roundHour } = place;
  const model = modelOf(spec);
  const machine = createMachine(em, spec, place);
  const rotor = createRotor(em, spec, site);
  em.create(RotorStay, { rotor, machine, fromAt: startedAt });
  const planes = createPlanes(em, spec, rotor);
  const points = createPoints(em, spec, { machine, model });
  const setup = createSetup(em, { machine, model, by, startedAt });
  const reason = `${limitSet.title}: fits power, speed and support`;
  em.create(LimitUse, { machine, limitSet, fromAt: startedAt, reason });
  await em.flush();
  return {
    spec,
    number,
    model,
    siteId: site.id,
    machineId: machine.id,
    rotorId: rotor.id,
    setupId: setup.id,
    planeIds: planes.map(({ id }) => id),
    pointIds: points.map(({ id }) => id),
    limitSet,
    by,
    roundHour,
  };
}

function createMachine(em: EntityManager, spec: MachineSpec, { site, area, startedAt }: Place) {
  const { tag, name, kind, powerKw, speedRpm, criticality } = spec;
  const span = spec.drive === 'variable speed' ? [0.6, 1.05] : [0.985, 1.012];
  return em.create(Machine, {
    site,
    area,
    tag,
    tagKey: tag.toLowerCase().replace(/\s/g, ''),
    name,
    aliases: [],
    kind,
    powerKw,
    speedMinRpm: Math.floor(speedRpm * (span[0] ?? 1)),
    speedMaxRpm: Math.ceil(speedRpm * (span[1] ?? 1)),
    nominalSpeedRpm: speedRpm,
    criticality,
    drive: spec.drive ?? 'direct',
    support: spec.support ?? 'rigid',
    bladeCount: spec.bladeCount ?? null,
    confinedSpace: kind.startsWith('fan'),
    createdAt: startedAt,
  });
}

function createRotor(em: EntityManager, spec: MachineSpec, site: Site): Rotor {
  return em.create(Rotor, {
    site,
    serial: demoSerial(spec.tag),
    name: spec.kind.includes('fan') || spec.kind === 'blower' ? 'Wheel' : 'Rotor',
    massKg: spec.massKg,
    massSource: 'known',
    behaviour: 'rigid',
    balanceGrade: spec.grade ?? 6.3,
    bearingSpanM: spec.spanM,
    centreOfMassFromAM: spec.spanM / 2,
  });
}

function createPlanes(em: EntityManager, spec: MachineSpec, rotor: Rotor): Plane[] {
  return spec.planes.map(({ name, place, radiusMm }, i) =>
    em.create(Plane, {
      rotor,
      name,
      order: i + 1,
      fromAM: Number((place * spec.spanM).toFixed(3)),
      radiusMm,
      maxGTotal: Math.max(100, Math.round(1.5 * spec.massKg)),
      pieceG: 5,
    }),
  );
}

function createPoints(
  em: EntityManager,
  spec: MachineSpec,
  { machine, model }: { machine: Machine; model: ModelledMachine },
): Point[] {
  const bearings = new Map(
    ['A', 'B'].map((label, i) => [
      label,
      em.create(Bearing, {
        machine,
        label,
        order: i + 1,
        place: spec.kind.includes('motor') ? 'driver' : 'driven',
        fromAM: i * spec.spanM,
        staticLoadN: Math.round((spec.massKg * 9.81) / 2),
        ...spec.ball,
      }),
    ]),
  );
  return model.points.map(({ name, direction }, i) => {
    const bearing = bearings.get(name.charAt(0));
    if (!bearing) throw new Error(`${spec.tag} has no bearing for ${name}`);
    const mounting = 'magnet on a machined pad';
    return em.create(Point, { machine, bearing, label: name, direction, order: i + 1, mounting });
  });
}

function createSetup(
  em: EntityManager,
  set: { machine: Machine; model: ModelledMachine; by: Actor; startedAt: Date },
): Setup {
  const { machine, model, by, startedAt } = set;
  return em.create(Setup, {
    machine,
    number: 1,
    markDescription: 'Punch mark on the shaft end, painted white; leading edge counts',
    tachoDeg: 0,
    rotationFromDriveEnd: 'clockwise',
    sensorPlaces: model.points.map(({ name, fromTachoDeg }) => ({
      pointLabel: name,
      place: `${fromTachoDeg}° from the tacho in the direction of rotation`,
      turnedOver: false,
    })),
    reason: 'First set-up',
    validFrom: startedAt,
    person: by.personId,
  });
}
