import 'server-only';
import { ok, fail } from '@/lib/domain/result';
import { stopJobInput } from '@/lib/schemas/balance-job-input';
import { recordCautions } from '../balance-job/record-cautions';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/** Ends a job without a result. What hangs on the rotor stays in the ledger as it is. */
export const stopJob = command(
  { name: 'stopJob', permission: 'balanceJob:record', input: stopJobInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    if (job.closedAt) return fail('closed', 'This job is closed already.');
    const before = { state: job.state };
    job.state = input.outcome;
    job.closedAt = now;
    job.closingNote = `${input.reason}\nOn the rotor: ${input.rotorState}`;
    recordCautions(
      em,
      { jobId: job.id, personId: actor.personId, now, step: 'stop' },
      ['SAF-14'],
      null,
    );
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      before,
      after: { state: input.outcome, rotorState: input.rotorState },
      reason: input.reason,
    });
    return ok({ jobId: job.id });
  },
);
