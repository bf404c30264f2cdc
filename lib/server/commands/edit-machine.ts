import 'server-only';
import { LimitSet, LimitUse } from '@/entities/limit-set';
import { Machine, MachineEvent } from '@/entities/machine';
import { Setup } from '@/entities/setup';
import { fail, ok } from '@/lib/domain/result';
import {
  editMachineInput,
  newSetupInput,
  recordEventInput,
  restoreMachineInput,
  retireMachineInput,
  chooseLimitSetInput,
} from '@/lib/schemas/register-input';
import { command } from '../command';
import { areaNamed } from '../register/area-named';
import { tagKeyOf } from '../register/tag-key';
import { notFound, visibleMachine } from '../scope';

/** Changes a machine's identity. A changed tag stays searchable as an older name. */
export const editMachine = command(
  { name: 'editMachine', permission: 'register:edit', input: editMachineInput },
  async (context, { machineId, reason, area, ...identity }) => {
    const { em, audit } = context;
    const machine = await visibleMachine(context, machineId);
    if (!machine) return notFound('machine');
    const tagKey = tagKeyOf(identity.tag);
    const taken = await em.findOne(Machine, {
      site: machine.site.id,
      tagKey,
      id: { $ne: machineId },
    });
    if (taken)
      return fail(
        'taken',
        `${taken.tag} (${taken.name}) has this tag already. Choose another.`,
        'tag',
      );
    const before = factsOf(machine);
    const older = tagKey === machine.tagKey ? [] : [machine.tag];
    const aliases = [...new Set([...machine.aliases, ...older])].filter(
      (alias) => tagKeyOf(alias) !== tagKey,
    );
    em.assign(machine, {
      ...identity,
      tagKey,
      aliases,
      area: await areaNamed(em, machine.site.id, area),
    });
    audit({
      siteId: machine.site.id,
      entity: 'Machine',
      entityId: machineId,
      before,
      after: { ...identity, area, aliases },
      reason,
    });
    return ok({ machineId });
  },
);

function factsOf(machine: Machine) {
  const { tag, name, kind, powerKw, speedMinRpm, speedMaxRpm, nominalSpeedRpm } = machine;
  const { drive, lineHz, criticality, support } = machine;
  return {
    ...{ tag, name, kind, powerKw, speedMinRpm, speedMaxRpm, nominalSpeedRpm },
    ...{ drive, lineHz, criticality, support },
  };
}

/** Takes a machine out of the lists; its history stays. */
export const retireMachine = command(
  { name: 'retireMachine', permission: 'register:edit', input: retireMachineInput },
  async (context, { machineId, reason }) => {
    const machine = await visibleMachine(context, machineId);
    if (!machine) return notFound('machine');
    if (machine.state === 'retired') return fail('already', 'This machine is retired already.');
    machine.state = 'retired';
    machine.retiredReason = reason;
    context.audit({
      siteId: machine.site.id,
      entity: 'Machine',
      entityId: machineId,
      before: { state: 'active' },
      after: { state: 'retired' },
      reason,
    });
    return ok({ machineId });
  },
);

/** Brings a retired machine back into the lists. */
export const restoreMachine = command(
  { name: 'restoreMachine', permission: 'register:edit', input: restoreMachineInput },
  async (context, { machineId, reason }) => {
    const machine = await visibleMachine(context, machineId);
    if (!machine) return notFound('machine');
    if (machine.state === 'active') return fail('already', 'This machine is in the lists already.');
    machine.state = 'active';
    machine.retiredReason = null;
    context.audit({
      siteId: machine.site.id,
      entity: 'Machine',
      entityId: machineId,
      before: { state: 'retired' },
      after: { state: 'active' },
      reason,
    });
    return ok({ machineId });
  },
);

/** Notes what happened to a machine; it stands on its trends. */
export const recordEvent = command(
  { name: 'recordEvent', permission: 'event:record', input: recordEventInput },
  async (context, { machineId, kind, text, breaksTrend }) => {
    const { em, actor, now, audit } = context;
    const machine = await visibleMachine(context, machineId);
    if (!machine) return notFound('machine');
    const event = em.create(MachineEvent, {
      machine,
      at: now,
      kind,
      text,
      breaksTrend,
      person: actor.personId,
    });
    await em.flush();
    const after = { kind, text, breaksTrend };
    audit({ siteId: machine.site.id, entity: 'MachineEvent', entityId: event.id, after });
    return ok({ eventId: event.id });
  },
);

/** Starts a new set-up: what was read before is not compared with what is read from now on. */
export const newSetup = command(
  { name: 'newSetup', permission: 'register:edit', input: newSetupInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const machine = await visibleMachine(context, input.machineId);
    if (!machine) return notFound('machine');
    const current = await em.findOne(Setup, { machine: machine.id, validTo: null });
    if (current) current.validTo = now;
    await em.flush();
    const setup = em.create(Setup, {
      machine,
      number: (current?.number ?? 0) + 1,
      markDescription: input.mark,
      tachoDeg: input.tachoDeg % 360,
      tachoEdge: input.tachoEdge,
      rotationFromDriveEnd: input.rotationFromDriveEnd,
      supportNote: input.supportNote === '' ? null : input.supportNote,
      sensorPlaces: current?.sensorPlaces ?? [],
      reason: input.reason,
      validFrom: now,
      person: actor.personId,
    });
    await em.flush();
    audit({
      siteId: machine.site.id,
      entity: 'Setup',
      entityId: setup.id,
      before: current ? { number: current.number } : null,
      after: input,
      reason: input.reason,
    });
    return ok({ setupId: setup.id, number: setup.number });
  },
);

/** Judges a machine by another limit set from now on; earlier judgements keep theirs by value. */
export const chooseLimitSet = command(
  { name: 'chooseLimitSet', permission: 'register:edit', input: chooseLimitSetInput },
  async (context, { machineId, limitSetId, reason }) => {
    const { em, actor, now, audit } = context;
    const machine = await visibleMachine(context, machineId);
    if (!machine) return notFound('machine');
    const limitSet = await em.findOne(LimitSet, {
      id: limitSetId,
      state: 'in use',
      $or: [{ site: null }, { site: machine.site.id }],
    });
    if (!limitSet) return notFound('limit set');
    const current = await em.findOne(LimitUse, { machine: machine.id, toAt: null });
    if (current) current.toAt = now;
    await em.flush();
    const use = em.create(LimitUse, {
      machine,
      limitSet,
      fromAt: now,
      reason,
      person: actor.personId,
    });
    await em.flush();
    audit({
      siteId: machine.site.id,
      entity: 'LimitUse',
      entityId: use.id,
      before: current ? { limitSetId: current.limitSet.id } : null,
      after: { limitSetId },
      reason,
    });
    return ok({ machineId });
  },
);
