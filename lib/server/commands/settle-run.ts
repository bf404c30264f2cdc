import 'server-only';
import { Run } from '@/entities/balance-job';
import { fail, ok } from '@/lib/domain/result';
import { keepRunInput, lineThroughRunInput } from '@/lib/schemas/balance-job-input';
import { command, type CommandContext } from '../command';
import { notFound, visibleJob } from '../scope';

/** Lines a run through: it stays visible with its reason and feeds nothing. */
export const lineThroughRun = command(
  { name: 'lineThroughRun', permission: 'balanceJob:record', input: lineThroughRunInput },
  (context, input) => settle(context, input, 'lined through'),
);

/** Keeps a held run after an engineer has judged it. */
export const keepRun = command(
  { name: 'keepRun', permission: 'balanceJob:override', input: keepRunInput },
  (context, input) => settle(context, input, 'kept'),
);

async function settle(
  context: CommandContext,
  input: { jobId: number; runId: number; reason: string },
  state: 'kept' | 'lined through',
) {
  const { em, audit } = context;
  const job = await visibleJob(context, input.jobId);
  if (!job) return notFound('balance job');
  if (job.closedAt) return fail('closed', 'This job is closed: its runs stay as they were signed.');
  const run = await em.findOne(Run, { id: input.runId, job: job.id });
  if (!run) return notFound('run');
  if (run.state === state) return fail('already', `Run ${run.number} is ${state} already.`);
  if (state === 'kept' && run.state !== 'held')
    return fail('not-held', `Run ${run.number} is lined through. Record the run again instead.`);
  const before = { state: run.state };
  run.state = state;
  run.stateReason = input.reason;
  audit({
    siteId: job.site.id,
    entity: 'Run',
    entityId: run.id,
    before,
    after: { state },
    reason: input.reason,
  });
  return ok({ runId: run.id });
}
