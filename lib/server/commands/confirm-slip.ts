import 'server-only';
import type { BalanceJob } from '@/entities/balance-job';
import { slipRepair, type SlipRepair } from '@/lib/domain/balance-job/slip-repair';
import { fail, ok } from '@/lib/domain/result';
import { confirmSlipInput } from '@/lib/schemas/balance-job-input';
import { checkVerdict } from '../balance-job/check-verdict';
import { loadJob } from '../balance-job/load-job';
import { planeDtos } from '../balance-job/places';
import { repairRuns, repairWeights } from '../balance-job/repair-slip';
import { missedCheck, pitchOf, slipExplanations } from '../balance-job/slip-explanations';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/**
 * A person has looked and says which slip it was. Nothing is edited: the entries that were wrong are ended or
 * lined through, and newer ones say what really was.
 */
export const confirmSlip = command(
  { name: 'confirmSlip', permission: 'balanceJob:record', input: confirmSlipInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    if (loaded.step.step !== 'decide')
      return fail(
        'out-of-order',
        'A slip is confirmed after a check run that was not as predicted.',
      );
    const verdict = checkVerdict(loaded);
    const check = missedCheck(loaded, verdict);
    if (check?.run.id !== input.runId)
      return fail('changed', 'The newest check run is another one now. Look at it first.');
    const planes = await planeDtos(em, loaded.planes);
    const told = slipExplanations(loaded, planes, verdict).find(({ slip }) => slip === input.slip);
    if (!told?.confirmable)
      return fail(
        'does-not-explain',
        'This slip does not explain the check run. Choose one that does, or line the run through.',
        'slip',
      );
    const repair = slipRepair(input.slip, {
      planeIds: loaded.planes.map(({ id }) => id),
      pitchDeg: pitchOf(planes),
    });
    const by = { em, personId: actor.personId, now };
    const { reason } = input;
    const repaired = await repairWeights(by, loaded, { repair, check, reason });
    const runs = repairRuns(by, loaded, { repair, check, repaired, words: told.words });
    turnSenses(job, repair);
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      before: { runs, weights: [...repaired.keys()] },
      after: { slip: input.slip, miss: told.miss, phaseSense: job.phaseSense },
      reason,
    });
    return ok({ jobId: job.id, runs: runs.length, weights: repaired.size });
  },
);

/** From now on people read and count as it turned out that they do. */
function turnSenses(job: BalanceJob, { vectors, weights }: SlipRepair) {
  if (vectors === 'mirrored') job.phaseSense = job.phaseSense === 'lag' ? 'lead' : 'lag';
  if (weights === 'all') job.angleSense = job.angleSense === 'against' ? 'with' : 'against';
}
