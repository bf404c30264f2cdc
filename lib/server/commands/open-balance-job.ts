import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { BalanceJob, JobPlane, JobPoint } from '@/entities/balance-job';
import { Point } from '@/entities/bearing';
import type { Machine } from '@/entities/machine';
import { Plane, RotorStay } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import { fail, ok, type Result } from '@/lib/domain/result';
import { openBalanceJobInput } from '@/lib/schemas/balance-job-input';
import { recordCautions } from '../balance-job/record-cautions';
import { command } from '../command';
import { notFound, visibleMachine } from '../scope';

/** Opens a balance job on the rotor that runs in a machine now, under its set-up of now. */
export const openBalanceJob = command(
  { name: 'openBalanceJob', permission: 'balanceJob:open', input: openBalanceJobInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const machine = await visibleMachine(context, input.machineId);
    if (!machine) return notFound('machine');
    const base = await placesOf(em, machine, input);
    if (!base.ok) return base;
    const { rotorId, setupId } = base.value;
    const job = em.create(BalanceJob, {
      site: machine.site,
      number: await nextNumber(em, machine.site.id),
      machine,
      rotor: rotorId,
      setup: setupId,
      kind: input.kind,
      reason: input.reason,
      unit: input.unit,
      phaseSense: input.phaseSense,
      angleSense: input.angleSense,
      targets: {
        oneX: input.targetOneX,
        zone: input.targetZone === '' ? null : input.targetZone,
        grade: input.gradeTarget,
      },
      startsAllowed: input.startsAllowed,
      cleaned: input.cleaned,
      state: 'opened',
      openedBy: actor.personId,
      openedAt: now,
    });
    await em.flush();
    input.planeIds.forEach((plane, index) => em.create(JobPlane, { job, plane, order: index + 1 }));
    input.pointIds.forEach((point, index) => em.create(JobPoint, { job, point, order: index + 1 }));
    const at = { jobId: job.id, personId: actor.personId, now, step: 'opened' };
    recordCautions(
      em,
      at,
      machine.confinedSpace ? ['standing sentence', 'SAF-05'] : ['standing sentence'],
      null,
    );
    audit({
      siteId: machine.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      after: { machine: machine.tag, number: job.number, ...input },
      reason: input.reason,
    });
    return ok({ jobId: job.id });
  },
);

async function placesOf(
  em: EntityManager,
  machine: Machine,
  input: { planeIds: number[]; pointIds: number[] },
): Promise<Result<{ rotorId: number; setupId: number }>> {
  if (machine.state === 'retired')
    return fail('retired', 'This machine is retired. Restore it before opening a balance job.');
  const stay = await em.findOne(RotorStay, { machine: machine.id, toAt: null });
  if (!stay)
    return fail(
      'no-rotor',
      'No rotor is recorded in this machine. Add it on the machine page first.',
    );
  const setup = await em.findOne(Setup, { machine: machine.id, validTo: null });
  if (!setup)
    return fail('no-setup', 'This machine has no set-up (mark, tacho, rotation). Record it first.');
  const rotorId = stay.rotor.id;
  const planes = await em.count(Plane, { id: { $in: input.planeIds }, rotor: rotorId });
  if (planes !== input.planeIds.length)
    return fail('other-rotor', 'A chosen plane is not on this machine’s rotor.', 'planeIds');
  const points = await em.count(Point, { id: { $in: input.pointIds }, machine: machine.id });
  if (points !== new Set(input.pointIds).size)
    return fail('other-machine', 'A chosen point is not on this machine.', 'pointIds');
  return ok({ rotorId, setupId: setup.id });
}

async function nextNumber(em: EntityManager, siteId: number): Promise<number> {
  const last = await em.findOne(BalanceJob, { site: siteId }, { orderBy: { number: 'desc' } });
  return (last?.number ?? 0) + 1;
}
