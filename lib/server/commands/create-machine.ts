import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { Bearing, Point } from '@/entities/bearing';
import { LimitSet, LimitUse } from '@/entities/limit-set';
import { Machine } from '@/entities/machine';
import { Plane, Position, Rotor, RotorStay } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import { checkPositions } from '@/lib/domain/balancing/check-positions';
import { angleOfPosition } from '@/lib/domain/balancing/convert-angle';
import { fail, ok, type Result } from '@/lib/domain/result';
import { createMachineInput } from '@/lib/schemas/register-input';
import { command, type CommandContext } from '../command';
import { areaNamed } from '../register/area-named';
import { tagKeyOf } from '../register/tag-key';
import { notFound } from '../scope';

type Input = z.output<typeof createMachineInput>;

/** Enters a machine with its rotor, planes, bearings, points, first set-up and limits. */
export const createMachine = command(
  { name: 'createMachine', permission: 'register:edit', input: createMachineInput },
  async (context, input) => {
    const { em, siteIds, now, audit } = context;
    if (!siteIds.includes(input.siteId)) return notFound('site');
    const taken = await em.findOne(Machine, { site: input.siteId, tagKey: tagKeyOf(input.tag) });
    if (taken)
      return fail(
        'taken',
        `${taken.tag} (${taken.name}) has this tag already. Choose another.`,
        'tag',
      );
    const limits = await limitsOf(context, input);
    if (!limits.ok) return limits;
    const machine = em.create(Machine, {
      ...identityOf(input),
      site: input.siteId,
      area: await areaNamed(em, input.siteId, input.area),
      aliases: [],
      createdAt: now,
    });
    await em.flush();
    const planes = addRotor(context, machine, input);
    if (!planes.ok) return planes;
    addBearings(em, machine, input);
    addSetup(context, machine, input);
    if (limits.value)
      em.create(LimitUse, { machine, limitSet: limits.value, fromAt: now, reason: 'First choice' });
    audit({
      siteId: input.siteId,
      entity: 'Machine',
      entityId: machine.id,
      after: input,
    });
    return ok({ machineId: machine.id });
  },
);

function identityOf(input: Input) {
  return {
    tag: input.tag,
    tagKey: tagKeyOf(input.tag),
    name: input.name,
    kind: input.kind,
    powerKw: input.powerKw,
    speedMinRpm: input.speedMinRpm,
    speedMaxRpm: input.speedMaxRpm,
    nominalSpeedRpm: input.nominalSpeedRpm,
    drive: input.drive,
    lineHz: input.lineHz,
    criticality: input.criticality,
    support: input.support,
  };
}

async function limitsOf(
  { em }: CommandContext,
  { limitSetId, siteId }: Input,
): Promise<Result<LimitSet | null>> {
  if (limitSetId === null) return ok(null);
  const set = await em.findOne(LimitSet, {
    id: limitSetId,
    $or: [{ site: null }, { site: siteId }],
  });
  if (!set) return fail('not-found', 'This limit set does not exist.', 'limitSetId');
  if (set.state === 'in use') return ok(set);
  const words = `The limit set “${set.title}, ${set.edition}” is retired. Choose one in use.`;
  return fail('retired', words, 'limitSetId');
}

function addRotor({ em, now }: CommandContext, machine: Machine, input: Input): Result<null> {
  const rotor = em.create(Rotor, {
    site: input.siteId,
    serial: input.rotorSerial,
    name: `Rotor ${input.rotorSerial}`,
    massKg: input.rotorMassKg,
    massSource: 'known',
    balanceGrade: input.balanceGrade,
    bearingSpanM: input.bearingSpanM,
    centreOfMassFromAM: input.centreOfMassFromAM,
    overhung: input.overhung,
  });
  em.create(RotorStay, { rotor, machine, fromAt: now });
  for (const [index, plane] of input.planes.entries()) {
    const added = addPlane(em, rotor, { ...plane, order: index + 1 });
    if (!added.ok) {
      const field = `planes.${index}.${added.failure.field ?? 'name'}`;
      return { ok: false, failure: { ...added.failure, field } };
    }
  }
  return ok(null);
}

function addPlane(
  em: EntityManager,
  rotor: Rotor,
  input: Input['planes'][number] & { order: number },
): Result<null> {
  const plane = em.create(Plane, {
    rotor,
    name: input.name,
    order: input.order,
    radiusMm: input.radiusMm,
    fromAM: input.fromAM,
    maxGTotal: input.maxGTotal,
    pieceG: input.pieceG,
    kind: input.positions === null ? 'free' : 'fixed positions',
  });
  const placed = positionAngles(input);
  if (!placed.ok) return placed;
  const angles = placed.value;
  const apart = checkPositions(angles);
  if (!apart.ok) return apart;
  for (const [index, angleDeg] of angles.entries()) {
    em.create(Position, {
      plane,
      number: index + 1,
      label: `position ${index + 1}`,
      angleDeg,
      maxG: input.positionMaxG,
    });
  }
  return ok(null);
}

/** Rotor angles of the fixed positions; none on a free rim. */
function positionAngles(input: Input['planes'][number]): Result<number[]> {
  const { positions: count, firstDeg, numbering: numbered } = input;
  // The input's schema has asked for all three where there are positions.
  if (count === null || firstDeg === null || numbered === '') return ok([]);
  const angles: number[] = [];
  for (let position = 1; position <= count; position++) {
    const angle = angleOfPosition(position, { count, firstDeg, numbered });
    if (!angle.ok) return angle;
    angles.push(angle.value);
  }
  return ok(angles);
}

const DIRECTIONS = [
  { ticked: 'horizontal', direction: 'H' },
  { ticked: 'vertical', direction: 'V' },
  { ticked: 'axial', direction: 'A' },
] as const;

function addBearings(em: EntityManager, machine: Machine, { bearings }: Input) {
  let order = 0;
  for (const [index, input] of bearings.entries()) {
    const bearing = em.create(Bearing, {
      machine,
      label: input.label,
      order: index + 1,
      fromAM: input.fromAM,
      type: input.type === '' ? null : input.type,
    });
    for (const { direction } of DIRECTIONS.filter(({ ticked }) => input[ticked])) {
      order += 1;
      const label = `${input.label}-${direction}`;
      em.create(Point, { machine, bearing, label, direction, order });
    }
  }
}

function addSetup({ em, actor, now }: CommandContext, machine: Machine, input: Input) {
  em.create(Setup, {
    machine,
    number: 1,
    markDescription: input.mark,
    tachoDeg: input.tachoDeg % 360,
    tachoEdge: input.tachoEdge,
    rotationFromDriveEnd: input.rotationFromDriveEnd,
    supportNote: input.supportNote === '' ? null : input.supportNote,
    sensorPlaces: [],
    reason: 'First set-up',
    validFrom: now,
    person: actor.personId,
  });
}
