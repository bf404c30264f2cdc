import 'server-only';
import { CoefficientReuse } from '@/entities/coefficient-reuse';
import type { ReusableBook } from '@/lib/domain/balancing/reusable-coefficients';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fail, ok, type Result } from '@/lib/domain/result';
import {
  REUSE_CONDITIONS,
  reuseCoefficientsInput,
  withdrawReuseInput,
} from '@/lib/schemas/balance-job-input';
import { coefficientOffer } from '../balance-job/coefficient-offer';
import { jobInput } from '../balance-job/job-input';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/** Takes the coefficients of the book instead of trial runs; they are kept by value with the job. */
export const reuseCoefficients = command(
  { name: 'reuseCoefficients', permission: 'balanceJob:record', input: reuseCoefficientsInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    if (!mayReuse(loaded))
      return fail(
        'out-of-order',
        'The coefficient book is used after the base was accepted and before any trial weight is fitted.',
      );
    const book = await coefficientOffer(em, loaded);
    if (!book.ok) return book;
    if (book.value.grade === 'with care' && input.reason === '')
      return fail(
        'reason-needed',
        'These coefficients are graded with care. Say why you rely on them, or make the trial runs.',
        'reason',
      );
    const reuse = em.create(CoefficientReuse, {
      job,
      speedRpm: book.value.speedRpm,
      coefficients: book.value.coefficients.map(byValue),
      grade: book.value.grade,
      confirmed: REUSE_CONDITIONS.map(({ label }) => label),
      reason: input.reason || null,
      person: actor.personId,
      at: now,
    });
    await em.flush();
    audit({
      siteId: job.site.id,
      entity: 'CoefficientReuse',
      entityId: reuse.id,
      after: { job: job.number, grade: reuse.grade, coefficients: book.value.coefficients },
      reason: input.reason || null,
    });
    return ok({ reuseId: reuse.id, grade: reuse.grade });
  },
);

/**
 * Gives up the coefficient book: before an answer the job goes back to trial runs, after a check run it
 * learns from its own runs.
 */
export const withdrawReuse = command(
  { name: 'withdrawReuse', permission: 'balanceJob:record', input: withdrawReuseInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    if (!loaded.reuse) return fail('no-reuse', 'This job does not use the coefficient book.');
    const refusal = cannotWithdraw(loaded);
    if (refusal) return refusal;
    em.assign(loaded.reuse, {
      withdrawnAt: now,
      withdrawnBy: actor.personId,
      withdrawReason: input.reason,
    });
    audit({
      siteId: job.site.id,
      entity: 'CoefficientReuse',
      entityId: loaded.reuse.id,
      after: { job: job.number, withdrawn: true },
      reason: input.reason,
    });
    return ok({ jobId: job.id });
  },
);

function cannotWithdraw(loaded: LoadedJob): Result<never> | null {
  const { step } = loaded.step;
  if (step === 'answer') return null;
  if (step !== 'decide')
    return fail(
      'out-of-order',
      'An answer with these coefficients is being fitted. Make its check run first; it shows whether they still hold.',
    );
  const own = solveJob(jobInput({ ...loaded, reuse: null }));
  if (own.ok) return null;
  return fail(
    'too-few-runs',
    `The runs of this job alone do not tell how the rotor answers: ${own.failure.message}`,
  );
}

function mayReuse({ step, weights, reuse }: LoadedJob): boolean {
  const tried = weights.some(({ purpose }) => purpose === 'trial');
  return step.step === 'fit trial' && !tried && reuse === null;
}

function byValue(c: ReusableBook['coefficients'][number]) {
  const { planeId, pointId, rePerGmm, imPerGmm, spreadPerGmm } = c;
  return { planeId, pointId, rePerGmm, imPerGmm, spreadPerGmm: spreadPerGmm ?? null };
}
