import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { BalanceJob, Run, RunVector } from '@/entities/balance-job';
import { Machine, MachineEvent } from '@/entities/machine';
import { inZoneD } from '@/lib/domain/balance-job/in-zone-d';
import { startsPlanned } from '@/lib/domain/balance-job/starts-planned';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { LastJobDto } from '@/lib/schemas/balance-job-parts';
import type { LoadedJob } from './load-job';

type Part = Pick<BalanceJobDto, 'startsPlanned' | 'neighbours' | 'lastJob' | 'needsConsent'>;

/** Speeds nearer than this can beat with one another, share (practice). */
const BEAT_SHARE = 0.03;
const EVENTS_SHOWN = 6;

/** What a person should know before weights are hung. */
export async function beforeFirstRun(
  em: EntityManager,
  loaded: LoadedJob,
  limits: BalanceJobDto['limits'],
): Promise<Part> {
  const { job, planes, reuse } = loaded;
  return {
    startsPlanned: startsPlanned(job.kind, {
      planes: planes.length,
      reusesBook: reuse !== null,
    }),
    neighbours: job.closedAt ? [] : await neighbours(em, loaded),
    lastJob: await lastJob(em, job),
    needsConsent: baseInZoneD(loaded, limits),
  };
}

/** Whether the base was read in zone D. */
export function baseInZoneD({ runs }: LoadedJob, limits: BalanceJobDto['limits']): boolean {
  const base = runs.filter(({ run }) => run.purpose === 'base' && run.state === 'kept');
  const overalls = base.flatMap(({ vectors }) => vectors.map(({ overall }) => overall ?? null));
  return inZoneD(overalls, limits?.bCd ?? null);
}

async function neighbours(em: EntityManager, { job }: LoadedJob): Promise<Part['neighbours']> {
  const machine = job.machine.$;
  const speed = machine.nominalSpeedRpm;
  const near = await em.find(Machine, {
    area: machine.area.id,
    id: { $ne: machine.id },
    state: 'active',
    nominalSpeedRpm: { $gte: speed * (1 - BEAT_SHARE), $lte: speed * (1 + BEAT_SHARE) },
  });
  return near.map(({ tag, nominalSpeedRpm }) => ({ tag, speedRpm: nominalSpeedRpm }));
}

async function lastJob(em: EntityManager, job: BalanceJob): Promise<LastJobDto | null> {
  const last = await em.findOne(
    BalanceJob,
    { rotor: job.rotor.id, state: 'signed', id: { $ne: job.id }, closedAt: { $lte: job.openedAt } },
    { orderBy: { closedAt: 'desc' } },
  );
  if (!last?.closedAt) return null;
  const events = await em.find(
    MachineEvent,
    { machine: job.machine.id, at: { $gt: last.closedAt, $lte: job.openedAt } },
    { orderBy: { at: 'desc' }, limit: EVENTS_SHOWN },
  );
  return {
    id: last.id,
    number: last.number,
    closedAt: last.closedAt.toISOString(),
    before: await largest(em, last.id, 'base'),
    after: await largest(em, last.id, 'check'),
    unit: last.unit,
    sameSetup: last.setup.id === job.setup.id,
    events: events.map(({ at, kind, text }) => ({ at: at.toISOString(), kind, text })),
  };
}

/** Largest 1x of the first base run or of the last check run. */
async function largest(em: EntityManager, jobId: number, purpose: 'base' | 'check') {
  const run = await em.findOne(
    Run,
    { job: jobId, purpose, state: 'kept' },
    { orderBy: { number: purpose === 'base' ? 'asc' : 'desc' } },
  );
  if (!run) return null;
  const vectors = await em.find(RunVector, { run: run.id });
  return Math.max(...vectors.map(({ amplitude }) => amplitude));
}
