import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Run, RunVector } from '@/entities/balance-job';
import { fail, ok, type Result } from '@/lib/domain/result';
import { recordRunInput } from '@/lib/schemas/balance-job-input';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { recordCautions } from '../balance-job/record-cautions';
import { jobVectors, type JobVector } from '../balance-job/run-vectors';
import { speedDoubt } from '../balance-job/speed-doubt';
import { changedOnRotor } from '../balance-job/weights-on-rotor';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

/**
 * Records a run with the weights that were on the rotor, taken from the ledger. A run whose speed is
 * off by more than the hold limit is saved and held: it feeds nothing until a person settles it.
 */
export const recordRun = command(
  { name: 'recordRun', permission: 'balanceJob:record', input: recordRunInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    const refusal = outOfOrder(loaded, input.purpose);
    if (refusal) return refusal;
    const vectors = await jobVectors(em, loaded, input);
    if (!vectors.ok) return vectors;
    const doubt = speedDoubt(loaded, input.speedRpm);
    const run = em.create(Run, {
      job,
      number: (loaded.runs.at(-1)?.run.number ?? 0) + 1,
      purpose: input.purpose,
      takenAt: now,
      speedRpm: input.speedRpm,
      setup: job.setup,
      weightsState: changedOnRotor(loaded),
      state: doubt ? 'held' : 'kept',
      stateReason: doubt,
      person: actor.personId,
      createdAt: now,
    });
    await em.flush();
    saveVectors(em, run, vectors.value);
    recordCautions(
      em,
      { jobId: job.id, personId: actor.personId, now, step: `before run ${run.number}` },
      RUN_CAUTIONS[input.purpose],
      input.namedPerson,
    );
    audit({
      siteId: job.site.id,
      entity: 'Run',
      entityId: run.id,
      after: { job: job.number, run: run.number, state: run.state, ...input },
    });
    return ok({ runId: run.id, number: run.number, held: doubt });
  },
);

/** What the form of such a run shows: nothing else may stand on the record as confirmed. */
const RUN_CAUTIONS = {
  base: ['SAF-04'],
  trial: ['SAF-02', 'SAF-04'],
  check: ['SAF-02', 'SAF-04'],
} as const;

function outOfOrder(loaded: LoadedJob, purpose: 'base' | 'trial' | 'check'): Result<never> | null {
  const { step } = loaded.step;
  if (step === 'closed')
    return fail('closed', 'This job is closed. Open a new one for further runs.');
  const expected = { base: ['base'], trial: ['trial run'], check: ['fit correction', 'decide'] };
  if (!expected[purpose].includes(step)) return fail('out-of-order', OUT_OF_ORDER[purpose]);
  const answeredAt = loaded.answers.at(-1)?.acceptedAt ?? loaded.job.openedAt;
  const corrected =
    loaded.weights.some((w) => w.purpose === 'correction') ||
    loaded.removed.some(({ endedAt }) => endedAt && endedAt >= answeredAt);
  if (purpose === 'check' && step === 'fit correction' && !corrected)
    return fail('out-of-order', 'Record what was fitted first, then the check run.');
  return null;
}

const OUT_OF_ORDER = {
  base: 'The base is already taken. The next runs are trial or check runs.',
  trial: 'No trial weight waits for its run. Follow the next step on the run sheet.',
  check: 'A check run comes after the answer was accepted and the weights were recorded.',
} as const;

function saveVectors(em: EntityManager, run: Run, vectors: JobVector[]) {
  for (const vector of vectors) {
    em.create(RunVector, {
      run,
      point: vector.pointId,
      amplitude: vector.amplitude,
      lagDeg: vector.lagDeg,
      overall: vector.overall,
      entered: vector.entered,
      record: vector.recordId,
    });
  }
}
