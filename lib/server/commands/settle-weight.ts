import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { BalanceJob } from '@/entities/balance-job';
import { Weight } from '@/entities/weight';
import { fail, ok } from '@/lib/domain/result';
import { settleTrialInput, takeOffWeightInput } from '@/lib/schemas/balance-job-input';
import { recordCautions } from '../balance-job/record-cautions';
import { command, type CommandContext } from '../command';
import { notFound, visibleJob } from '../scope';

/** After a trial run: is the trial weight still on the rotor? There is no default. */
export const settleTrial = command(
  { name: 'settleTrial', permission: 'balanceJob:record', input: settleTrialInput },
  async (context, input) => {
    const { em, audit } = context;
    const found = await openWeight(context, input);
    if (!found.ok) return found;
    const { job, weight } = found.value;
    if (weight.purpose !== 'trial' || weight.job?.id !== job.id)
      return fail('not-a-trial', 'Only a trial weight is asked about after its run.');
    if (weight.stays !== null && weight.stays !== undefined)
      return fail('already', 'This question was answered a moment ago. Reload the page.');
    weight.stays = input.stays === 'stays on';
    if (!weight.stays) end(context, found.value, 'trial weight taken off after its run');
    noteCautions(em, context, job, weight, input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      before: { stays: null },
      after: { stays: input.stays, namedPerson: input.namedPerson },
    });
    return ok({ weightId: weight.id });
  },
);

/** Ends a weight in the ledger, of this job or an earlier one: it is not on the rotor any more. */
export const takeOffWeight = command(
  { name: 'takeOffWeight', permission: 'balanceJob:record', input: takeOffWeightInput },
  async (context, input) => {
    const { em, audit } = context;
    const found = await openWeight(context, input);
    if (!found.ok) return found;
    const { job, weight } = found.value;
    end(context, found.value, input.reason);
    if (weight.purpose === 'trial' && weight.job?.id === job.id) weight.stays = false;
    noteCautions(em, context, job, weight, input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      before: { on: true },
      after: { ending: 'taken off' },
      reason: input.reason,
    });
    return ok({ weightId: weight.id });
  },
);

async function openWeight(context: CommandContext, input: { jobId: number; weightId: number }) {
  const job = await visibleJob(context, input.jobId);
  if (!job) return notFound('balance job');
  if (job.closedAt) return fail('closed', 'This job is closed. Open a new one to change weights.');
  const weight = await context.em.findOne(Weight, { id: input.weightId, rotor: job.rotor.id });
  if (!weight) return notFound('weight on this rotor');
  if (weight.endedAt) return fail('already', 'This weight is already recorded as off the rotor.');
  return ok({ job, weight });
}

type Found = { job: BalanceJob; weight: Weight };

/** A weight of an earlier job is ended in this one: the arithmetic counts it from then on. */
function end({ actor, em, now }: CommandContext, { job, weight }: Found, reason: string) {
  em.assign(weight, {
    endedAt: now,
    ending: 'taken off',
    endedBy: actor.personId,
    endReason: reason,
    endedInJob: weight.job?.id === job.id ? null : job.id,
  });
}

function noteCautions(
  em: EntityManager,
  { actor, now }: CommandContext,
  job: BalanceJob,
  ...[weight, namedPerson]: [Weight, string]
) {
  const at = { jobId: job.id, personId: actor.personId, now, step: `weight ${weight.id}` };
  recordCautions(em, at, ['SAF-01', 'SAF-03'], namedPerson);
}
