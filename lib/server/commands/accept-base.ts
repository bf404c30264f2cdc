import 'server-only';
import { fail, ok, type Result } from '@/lib/domain/result';
import { acceptBaseInput } from '@/lib/schemas/balance-job-input';
import { baseRepeats } from '../balance-job/base-repeats';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/** So many repeats are wanted (common practice; no published source). */
const WANTED = 3;

/** Accepts the base runs. Fewer than three, or runs that scatter, need a reason. */
export const acceptBase = command(
  { name: 'acceptBase', permission: 'balanceJob:record', input: acceptBaseInput },
  async (context, input) => {
    const { em, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    if (loaded.step.step !== 'base')
      return fail('out-of-order', 'The base is already taken, or the job is closed.');
    const doubt = doubtOf(loaded);
    if (!doubt.ok) return doubt;
    if (doubt.value && input.reason === '') return fail('reason-needed', doubt.value, 'reason');
    job.state = 'base taken';
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      before: { state: 'opened' },
      after: { state: 'base taken', doubt: doubt.value },
      reason: input.reason || null,
    });
    return ok({ jobId: job.id });
  },
);

function doubtOf(loaded: LoadedJob): Result<string | null> {
  const base = loaded.runs.filter(({ run }) => run.purpose === 'base' && run.state === 'kept');
  if (base.length === 0)
    return fail('no-base', 'Record a base run first. Held runs do not count until they are kept.');
  const loose = baseRepeats(loaded).filter(({ test }) => test?.good === false);
  if (loose.length > 0) {
    const names = loaded.points
      .filter((point) => loose.some(({ pointId }) => pointId === point.id))
      .map((point) => point.label);
    return ok(
      `The base runs do not repeat at ${names.join(', ')}. Wait until the machine is warm, look for ` +
        'looseness, resonance or a beat, and repeat; or say why you go on.',
    );
  }
  if (base.length < WANTED)
    return ok(
      `${base.length} of ${WANTED} base runs: the scatter is not known well. Repeat, or say why you go on.`,
    );
  return ok(null);
}
