import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Coefficient } from '@/entities/answer';
import { BalanceJob } from '@/entities/balance-job';
import { Bearing } from '@/entities/bearing';
import { LimitUse } from '@/entities/limit-set';
import { MachineEvent, type Machine } from '@/entities/machine';
import { Plane, RotorStay, type Rotor } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import { Area } from '@/entities/site';
import { worstStanding } from '@/lib/domain/severity/worst-standing';
import type { Actor } from '@/lib/schemas/actor';
import type { MachinePageDto } from '@/lib/schemas/register';
import { setupDto } from '../balance-job/places';
import { query } from '../query';
import { coefficientLines, ledgerPlanes } from '../register/rotor-book';
import { pointStandings } from '../register/point-standings';
import { visibleMachine } from '../scope';

/** A machine's sheet: who it is, how it stands, what it was balanced with. */
export const machinePage = query(
  'register:read',
  async (context, machineId: number): Promise<MachinePageDto | null> => {
    const { em, actor } = context;
    const machine = await visibleMachine(context, machineId);
    if (!machine) return null;
    const area = await em.findOneOrFail(Area, machine.area.id);
    const stay = await em.findOne(
      RotorStay,
      { machine: machine.id, toAt: null },
      { populate: ['rotor'] },
    );
    const rotor = stay?.rotor.$ ?? null;
    const points = await pointStandings(em, machine.id);
    const bearings = await em.find(Bearing, { machine: machine.id }, { orderBy: { order: 'asc' } });
    return {
      ...identityOf(machine, actor),
      areaName: area.name,
      missing: missingFacts(machine, rotor, bearings),
      worst: worstStanding(points),
      bearings: bearings.map(({ id, label, place, type }) => ({
        id,
        label,
        place,
        type: type ?? null,
      })),
      points,
      ...(await rotorParts(em, rotor)),
      ...(await historyOf(em, machine)),
    };
  },
);

function identityOf(machine: Machine, actor: Actor) {
  const site = actor.sites.find(({ id }) => id === machine.site.id);
  return {
    id: machine.id,
    tag: machine.tag,
    name: machine.name,
    aliases: machine.aliases,
    kind: machine.kind,
    state: machine.state,
    retiredReason: machine.retiredReason ?? null,
    site: {
      id: machine.site.id,
      name: site?.name ?? '',
      timeZone: site?.timeZone ?? 'UTC',
      decimalMark: site?.decimalMark ?? '.',
    },
    powerKw: machine.powerKw ?? null,
    speedMinRpm: machine.speedMinRpm,
    speedMaxRpm: machine.speedMaxRpm,
    nominalSpeedRpm: machine.nominalSpeedRpm,
    drive: machine.drive,
    criticality: machine.criticality,
    support: machine.support,
  } as const;
}

/** Nameplate facts that are not known: listed, never guessed. */
function missingFacts(machine: Machine, rotor: Rotor | null, bearings: Bearing[]): string[] {
  const facts: [string, unknown][] = [
    ['power', machine.powerKw],
    ['support class', machine.support === 'unknown' ? null : machine.support],
    ['rotor', rotor],
    ['rotor mass', rotor?.massKg],
    ['balance quality grade', rotor?.balanceGrade],
    ['distance between bearings', rotor?.bearingSpanM],
    ['bearing types', bearings.every(({ type }) => type) ? true : null],
  ];
  return facts.filter(([, value]) => value === null || value === undefined).map(([name]) => name);
}

async function rotorParts(em: EntityManager, rotor: Rotor | null) {
  if (!rotor) return { rotor: null, planes: [], coefficients: [] };
  const planes = await em.find(Plane, { rotor: rotor.id }, { orderBy: { order: 'asc' } });
  const estimates = await em.find(
    Coefficient,
    { rotor: rotor.id },
    { orderBy: { madeAt: 'asc' }, populate: ['plane', 'point'] },
  );
  return {
    rotor: {
      name: rotor.name,
      serial: rotor.serial,
      massKg: rotor.massKg ?? null,
      balanceGrade: rotor.balanceGrade ?? null,
      overhung: rotor.overhung,
    },
    planes: await ledgerPlanes(em, rotor.id, planes),
    coefficients: coefficientLines(estimates),
  };
}

async function historyOf(em: EntityManager, machine: Machine) {
  const own = { machine: machine.id };
  const jobs = await em.find(BalanceJob, own, { orderBy: { openedAt: 'desc' }, limit: 50 });
  const events = await em.find(MachineEvent, own, {
    orderBy: { at: 'desc' },
    limit: 50,
    populate: ['person'],
  });
  const setups = await em.find(Setup, own, { orderBy: { number: 'desc' } });
  const use = await em.findOne(LimitUse, { ...own, toAt: null }, { populate: ['limitSet'] });
  return {
    balancedAt: events.find(({ kind }) => kind === 'balance')?.at.toISOString() ?? null,
    jobs: jobs.map((job) => ({
      id: job.id,
      number: job.number,
      kind: job.kind,
      state: job.state,
      openedAt: job.openedAt.toISOString(),
      closedAt: job.closedAt?.toISOString() ?? null,
    })),
    events: events.map((event) => ({
      id: event.id,
      at: event.at.toISOString(),
      kind: event.kind,
      text: event.text,
      person: event.person.$.name,
      balanceJobId: event.balanceJobId ?? null,
    })),
    setups: setups.map((setup) => ({
      ...setupDto(setup),
      reason: setup.reason,
      validFrom: setup.validFrom.toISOString(),
      validTo: setup.validTo?.toISOString() ?? null,
    })),
    limits: use ? limitsOf(use.limitSet.$, use.reason) : null,
  };
}

function limitsOf(
  set: Pick<
    NonNullable<MachinePageDto['limits']>,
    'title' | 'edition' | 'citation' | 'bAb' | 'bBc' | 'bCd'
  >,
  reason: string,
) {
  const { title, edition, citation, bAb, bBc, bCd } = set;
  return { title, edition, citation, bAb, bBc, bCd, reason };
}
