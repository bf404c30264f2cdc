import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { Coefficient } from '@/entities/answer';
import { SignOff } from '@/entities/caution';
import { MachineEvent } from '@/entities/machine';
import { gradeOf } from '@/lib/domain/balancing/coefficient-book';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fail, ok, type Result } from '@/lib/domain/result';
import { signJobInput } from '@/lib/schemas/balance-job-input';
import { contentHash as hashOf } from '../balance-job/canonical-json';
import { checkVerdict } from '../balance-job/check-verdict';
import { jobInput } from '../balance-job/job-input';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { recordCautions } from '../balance-job/record-cautions';
import { recordExtras } from '../balance-job/record-extras';
import { changedOnRotor } from '../balance-job/weights-on-rotor';
import { command, type CommandContext } from '../command';
import { balanceJobDto } from '../queries/balance-job';
import { notFound, visibleJob } from '../scope';

type Input = z.output<typeof signJobInput>;

/** Signs and closes a job: the rotor's state is known, the record frozen with its hash. */
export const signJob = command(
  { name: 'signJob', permission: 'balanceJob:sign', input: signJobInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    const refusal = notReady(loaded, input);
    if (refusal) return refusal;
    makePermanent(loaded, input);
    job.state = 'signed';
    job.closedAt = now;
    job.closingNote = input.reason || null;
    keepEstimates(em, loaded, now);
    recordEvent(context, loaded);
    recordCautions(
      em,
      { jobId: job.id, personId: actor.personId, now, step: 'sign' },
      ['SAF-14'],
      input.areaOwner,
    );
    await em.flush();
    const contentHash = await freeze(context, loaded, input);
    audit({
      siteId: job.site.id,
      entity: 'BalanceJob',
      entityId: job.id,
      before: { state: loaded.answers.length > 0 ? 'answered' : 'base taken' },
      after: { state: 'signed', contentHash, areaOwner: input.areaOwner },
      reason: input.reason || null,
    });
    return ok({ jobId: job.id, contentHash });
  },
);

function notReady(loaded: LoadedJob, input: Input): Result<never> | null {
  if (loaded.step.step === 'closed') return fail('closed', 'This job is closed already.');
  if (loaded.step.step !== 'decide')
    return fail('no-check', 'A job is signed after a check run with the weights as they stay.');
  if (hasChangedSinceCheck(loaded))
    return fail(
      'changed-since-check',
      'The weights on the rotor changed after the last check run. Take another check run, then sign.',
    );
  const temporary = loaded.weights.filter(
    ({ id, endedAt, permanent }) =>
      endedAt === null && !permanent && !input.permanentWeightIds.includes(id),
  );
  const [first] = temporary;
  if (first)
    return fail(
      'temporary',
      `The ${first.massG} g in plane ${first.plane.$.name} is not said to be permanent. Make it permanent and tick it, or take it off and check again.`,
      'permanentWeightIds',
    );
  const missed = missedTargets(loaded);
  if (missed.length > 0 && input.reason === '')
    return fail(
      'reason-needed',
      `${missed.join(' ')} Say why the job is signed all the same.`,
      'reason',
    );
  return null;
}

function hasChangedSinceCheck(loaded: LoadedJob): boolean {
  const check = loaded.runs.findLast(({ run }) => run.purpose === 'check' && run.state === 'kept');
  const checked = new Set(check?.run.weightsState.map(({ weightId }) => weightId));
  const now = changedOnRotor(loaded);
  return now.length !== checked.size || now.some(({ weightId }) => !checked.has(weightId));
}

function missedTargets(loaded: LoadedJob): string[] {
  const check = checkVerdict(loaded);
  if (!check) return missedByBase(loaded);
  const { job } = loaded;
  const target = job.targets.oneX;
  const above = check.points.filter(({ now }) => target !== null && now > target);
  const off = check.points.filter(
    ({ miss, band }) => miss !== null && band !== null && miss > band,
  );
  const worse = check.points.filter(({ reductionPct }) => reductionPct < 0);
  return [
    ...(worse.length > 0 ? [`It runs rougher than before at ${labels(worse)}.`] : []),
    ...(above.length > 0
      ? [`The 1x target of ${target} ${job.unit} is missed at ${labels(above)}.`]
      : []),
    ...(off.length > 0 ? [`The check run is not as predicted at ${labels(off)}.`] : []),
  ];
}

/** A check only has its base runs and nothing else. */
function missedByBase({ job, runs, points }: LoadedJob): string[] {
  const last = runs.findLast(({ run }) => run.purpose === 'base' && run.state === 'kept');
  const target = job.targets.oneX;
  const above = points.filter(({ id }) => {
    const vector = last?.vectors.find(({ point }) => point.id === id);
    return target !== null && (vector?.amplitude ?? 0) > target;
  });
  if (above.length === 0) return [];
  return [`The 1x target of ${target} ${job.unit} is missed at ${labels(above)}.`];
}

function labels(points: readonly { label: string }[]): string {
  return points.map(({ label }) => label).join(', ');
}

function makePermanent({ weights }: LoadedJob, { permanentWeightIds }: Input) {
  for (const weight of weights) {
    if (weight.endedAt === null && permanentWeightIds.includes(weight.id)) weight.permanent = true;
  }
}

/** What this job taught beyond its trials: the fit over all its runs. */
function keepEstimates(em: EntityManager, loaded: LoadedJob, now: Date) {
  const { job } = loaded;
  const solution = solveJob(jobInput(loaded));
  if (!solution.ok || !solution.value.allRuns) return;
  for (const h of solution.value.allRuns.coefficients) {
    em.create(Coefficient, {
      rotor: job.rotor,
      plane: h.planeId,
      point: h.pointId,
      setup: job.setup,
      speedRpm: solution.value.speed.meanRpm,
      unit: job.unit,
      rePerGmm: h.rePerGmm,
      imPerGmm: h.imPerGmm,
      source: 'fit over all runs',
      job,
      grade: gradeOf(null),
      madeAt: now,
    });
  }
}

function recordEvent({ em, actor, now }: CommandContext, { job, weights, removed }: LoadedJob) {
  const on = weights.filter(({ endedAt }) => endedAt === null);
  const hung = on.map(({ massG, plane }) => `${massG} g in plane ${plane.$.name}`).join(', ');
  const changed = on.length + removed.length > 0;
  em.create(MachineEvent, {
    machine: job.machine,
    at: now,
    kind: changed ? 'balance' : 'other',
    text: changed
      ? `Balanced, job ${job.number}: ${hung || 'older weights taken off'}`
      : `Checked, job ${job.number}: nothing was hung`,
    breaksTrend: changed,
    balanceJobId: job.id,
    person: actor.personId,
  });
}

async function freeze(
  { em, actor, now }: CommandContext,
  loaded: LoadedJob,
  { statement, areaOwner }: Input,
): Promise<string> {
  const content = {
    ...(await balanceJobDto(em, await loadJob(em, loaded.job))),
    ...(await recordExtras(em, loaded.job)),
    areaOwner,
  };
  const contentHash = hashOf(content);
  em.create(SignOff, {
    job: loaded.job,
    person: actor.personId,
    personName: actor.name,
    role: actor.role,
    statement,
    at: now,
    contentHash,
    content,
  });
  return contentHash;
}
