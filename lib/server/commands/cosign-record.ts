import 'server-only';
import type { z } from 'zod';
import { SignOff } from '@/entities/caution';
import { allows } from '@/lib/domain/access/permissions';
import { fail, ok, type Result } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import { cosignRecordInput } from '@/lib/schemas/record-input';
import { loadSigned, type SignedRecord } from '../balance-job/load-signed';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

type Input = z.output<typeof cosignRecordInput>;

/** A further signature under a signed record: the same content, the same hash. */
export const cosignRecord = command(
  { name: 'cosignRecord', permission: 'balanceJob:cosign', input: cosignRecordInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const record = await loadSigned(em, job.id);
    if (!record)
      return fail(
        'not-signed',
        'This job is not signed yet: the technician signs it first, at the end of the job.',
      );
    const refusal = mayNotSign(actor, record, input);
    if (refusal) return refusal;
    const { contentHash, content } = record.first;
    em.create(SignOff, {
      job,
      person: actor.personId,
      personName: actor.name,
      role: input.capacity,
      statement: input.statement,
      at: now,
      contentHash,
      content,
    });
    await em.flush();
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      after: { cosignedAs: input.capacity, statement: input.statement, contentHash },
    });
    return ok({ jobId: job.id, contentHash });
  },
);

function mayNotSign(actor: Actor, record: SignedRecord, input: Input): Result<never> | null {
  if (record.signOffs.some(({ person }) => person.id === actor.personId))
    return fail(
      'signed-already',
      'You signed this record already. A second pair of eyes signs it.',
    );
  if (!record.intact)
    return fail(
      'content-changed',
      'The stored record no longer has the hash that was signed. Do not sign it; tell your administrator.',
    );
  if (input.capacity === 'reliability engineer' && !allows(actor.role, 'balanceJob:override'))
    return fail(
      'capacity',
      `Your role (${actor.role}) does not sign as reliability engineer. Sign as the area’s owner if you are, or ask an engineer.`,
      'capacity',
    );
  return null;
}
