import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Answer, Coefficient } from '@/entities/answer';
import { gradeOf } from '@/lib/domain/balancing/coefficient-book';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fail, ok, type Result } from '@/lib/domain/result';
import { acceptAnswerInput } from '@/lib/schemas/balance-job-input';
import { answerDto } from '../balance-job/answer-dto';
import { jobInput } from '../balance-job/job-input';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/** Accepts the answer the person looked at: it is kept with its inputs, so that it recomputes. */
export const acceptAnswer = command(
  { name: 'acceptAnswer', permission: 'balanceJob:record', input: acceptAnswerInput },
  async (context, { jobId, fingerprint }) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    const kind = kindOf(loaded);
    if (!kind.ok) return kind;
    const input = jobInput(loaded);
    const solution = solveJob(input);
    if (!solution.ok) return solution;
    const dto = answerDto(input, solution.value, kind.value);
    if (!dto) return { ok: false, failure: withheldFailure(solution.value) };
    if (dto.fingerprint !== fingerprint)
      return fail(
        'changed',
        'The runs have changed since this answer was shown. Look at the new one.',
      );
    const answer = em.create(Answer, {
      job,
      ...numbersOf(loaded),
      kind: kind.value,
      method: dto.method,
      inputs: input,
      result: solution.value,
      acceptedBy: actor.personId,
      acceptedAt: now,
    });
    job.state = 'answered';
    const { number } = answer;
    if (number === 1 && !loaded.reuse) keepCoefficients(em, loaded, solution.value, now);
    await em.flush();
    audit({
      siteId: job.site.id,
      entity: 'Answer',
      entityId: answer.id,
      after: { job: job.number, answer: number, planes: dto.planes },
    });
    return ok({ answerId: answer.id, number });
  },
);

function kindOf({ step }: LoadedJob): Result<'correction' | 'trim'> {
  if (step.step === 'answer') return ok('correction');
  if (step.step === 'decide') return ok('trim');
  return fail(
    'out-of-order',
    'There is no answer to accept now. Follow the next step on the run sheet.',
  );
}

function numbersOf({ answers, runs }: LoadedJob) {
  return {
    number: (answers.at(-1)?.number ?? 0) + 1,
    afterRunNumber: runs.at(-1)?.run.number ?? 0,
  };
}

function withheldFailure({ withheld }: JobSolution) {
  return withheld?.failure ?? { code: 'no-answer', message: 'These runs give no answer.' };
}

function keepCoefficients(em: EntityManager, { job }: LoadedJob, solution: JobSolution, now: Date) {
  for (const h of solution.model.coefficients) {
    em.create(Coefficient, {
      rotor: job.rotor,
      plane: h.planeId,
      point: h.pointId,
      setup: job.setup,
      speedRpm: solution.speed.meanRpm,
      unit: job.unit,
      rePerGmm: h.rePerGmm,
      imPerGmm: h.imPerGmm,
      source: 'trial',
      job,
      grade: gradeOf(null),
      madeAt: now,
    });
  }
}
