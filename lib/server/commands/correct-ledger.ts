import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Run, type BalanceJob } from '@/entities/balance-job';
import { Plane } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { fail, ok, type Result } from '@/lib/domain/result';
import { correctLedgerInput, recordFoundWeightInput } from '@/lib/schemas/balance-job-input';
import { recordCautions } from '../balance-job/record-cautions';
import { resolvePlace } from '../balance-job/resolve-place';
import { command, type CommandContext } from '../command';
import { notFound, visibleJob } from '../scope';

/**
 * Ledger check: a listed weight of an earlier job is missing or worn. Before the first run this only puts
 * the ledger right; later a missing weight counts as having come off during the job.
 */
export const correctLedger = command(
  { name: 'correctLedger', permission: 'balanceJob:record', input: correctLedgerInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    if (job.closedAt)
      return fail('closed', 'This job is closed. Open a new one to check the ledger.');
    const found = await olderWeight(em, job, input);
    if (!found.ok) return found;
    const weight = found.value;
    em.assign(weight, {
      endedAt: now,
      ending: input.found === 'worn' ? 'found worn' : 'found missing',
      endedBy: actor.personId,
      endReason: input.reason,
      endedInJob: job.id,
    });
    if (input.found === 'worn' && input.massG) keepWorn(context, weight, input.massG);
    const at = { jobId: job.id, personId: actor.personId, now, step: 'ledger check' };
    recordCautions(em, at, ['SAF-01', 'SAF-03'], input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      before: { massG: weight.massG },
      after: { found: input.found, massG: input.massG },
      reason: input.reason,
    });
    return ok({ weightId: weight.id });
  },
);

async function olderWeight(
  em: EntityManager,
  job: BalanceJob,
  { weightId, found }: { weightId: number; found: 'missing' | 'worn' },
): Promise<Result<Weight>> {
  const weight = await em.findOne(Weight, { id: weightId, rotor: job.rotor.id, endedAt: null });
  if (!weight || weight.job?.id === job.id) return notFound('older weight on this rotor');
  if (found === 'missing' || (await em.count(Run, { job: job.id })) === 0) return ok(weight);
  return fail(
    'runs-made',
    'The ledger is put right before the first run. Line the runs through, stop this job and begin again with the mass that is left.',
    'found',
  );
}

/** What is left of a worn weight, as an entry of its own. */
function keepWorn({ em, actor, now }: CommandContext, weight: Weight, massG: number) {
  const { rotor, plane, position, angleDeg, radiusMm, fixing, permanent, entered } = weight;
  em.create(Weight, {
    ...{ rotor, plane, position, angleDeg, radiusMm, fixing, permanent, entered, massG },
    massSource: 'scale',
    purpose: 'found',
    fittedAt: now,
    fittedBy: actor.personId,
    replaces: weight,
  });
}

/** Ledger check: a weight hangs on the rotor that no ledger lists. It was there in every run. */
export const recordFoundWeight = command(
  { name: 'recordFoundWeight', permission: 'balanceJob:record', input: recordFoundWeightInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    if (job.closedAt)
      return fail('closed', 'This job is closed. Open a new one to check the ledger.');
    const own = await em.findOne(Plane, { id: input.planeId, rotor: job.rotor.id });
    if (!own) return notFound('plane of this rotor');
    const place = await resolvePlace(em, input);
    if (!place.ok) return place;
    const { plane, position, angleDeg } = place.value;
    const weight = em.create(Weight, {
      rotor: job.rotor,
      plane,
      position,
      angleDeg,
      radiusMm: input.radiusMm,
      massG: input.massG,
      massSource: 'nominal',
      purpose: 'found',
      fixing: input.fixing,
      permanent: true,
      entered: {
        angleDeg: input.angleDeg ?? angleDeg,
        angleSense: input.angleSense === '' ? 'against' : input.angleSense,
      },
      fittedAt: now,
      fittedBy: actor.personId,
    });
    await em.flush();
    const at = { jobId: job.id, personId: actor.personId, now, step: 'ledger check' };
    recordCautions(em, at, ['SAF-01', 'SAF-03'], input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      after: { foundIn: job.number, plane: plane.name, ...input, angleDeg },
    });
    return ok({ weightId: weight.id, angleDeg });
  },
);
