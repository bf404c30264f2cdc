import 'server-only';
import { Addendum } from '@/entities/addendum';
import { fail, ok } from '@/lib/domain/result';
import { addAddendumInput } from '@/lib/schemas/record-input';
import { addendumHash } from '../balance-job/addendum-hash';
import { loadSigned } from '../balance-job/load-signed';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/** Adds a remark to a signed record; what was signed stays as it is. */
export const addAddendum = command(
  { name: 'addAddendum', permission: 'balanceJob:addendum', input: addAddendumInput },
  async (context, { jobId, text, reason }) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, jobId);
    if (!job) return notFound('balance job');
    const record = await loadSigned(em, job.id);
    if (!record)
      return fail(
        'not-signed',
        'This job is not signed, so it has no record to add to. Write it into the job itself.',
      );
    if (!record.addendaIntact)
      return fail(
        'chain-broken',
        'The addenda before this one are not as they were written. Tell your administrator first.',
      );
    const words = {
      number: record.addenda.length + 1,
      text,
      reason,
      personName: actor.name,
      role: actor.role,
      at: now.toISOString(),
      previousHash: record.addenda.at(-1)?.hash ?? record.first.contentHash,
    };
    const hash = addendumHash(words);
    em.create(Addendum, { ...words, at: now, hash, job: job.id, person: actor.personId });
    await em.flush();
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      after: { addendum: words.number, text, hash },
      reason,
    });
    return ok({ jobId: job.id, number: words.number });
  },
);
