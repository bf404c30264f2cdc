import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { Plane } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { allows, type Role } from '@/lib/domain/access/permissions';
import { fail, ok, type Result } from '@/lib/domain/result';
import { fitWeightInput } from '@/lib/schemas/balance-job-input';
import { baseInZoneD } from '../balance-job/before-first-run';
import { keepFixing, readFixing } from '../balance-job/fixing';
import { limitsOf } from '../balance-job/limits-of';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { recordCautions } from '../balance-job/record-cautions';
import { resolvePlace } from '../balance-job/resolve-place';
import { roomFailure } from '../balance-job/room-left';
import { command } from '../command';
import { notFound, visibleJob } from '../scope';

type Input = z.output<typeof fitWeightInput>;

/** Writes a weight to the ledger the moment it is fitted, where it really hangs. */
export const fitWeight = command(
  { name: 'fitWeight', permission: 'balanceJob:record', input: fitWeightInput },
  async (context, input) => {
    const { em, actor, now, audit } = context;
    const job = await visibleJob(context, input.jobId);
    if (!job) return notFound('balance job');
    const loaded = await loadJob(em, job);
    const refusal = outOfOrder(loaded, input);
    if (refusal) return refusal;
    const unagreed = await needsConsent(em, loaded, input, actor.role);
    if (unagreed) return unagreed;
    const place = await resolvePlace(em, input);
    if (!place.ok) return place;
    const { plane, position, angleDeg } = place.value;
    const full =
      recordedAgain(loaded, place.value, input) ??
      (await roomFailure(em, plane, position, input.massG));
    if (full) return full;
    const fixing = await readFixing(input);
    if (!fixing.ok) return fixing;
    const weight = em.create(Weight, {
      rotor: job.rotor,
      plane,
      position,
      angleDeg,
      radiusMm: input.radiusMm,
      massG: input.massG,
      massSource: input.massSource,
      purpose: input.purpose,
      answerNumber: answerFor(loaded, input),
      fixing: input.fixing,
      entered: {
        angleDeg: input.angleDeg ?? angleDeg,
        angleSense: input.angleSense === '' ? 'against' : input.angleSense,
      },
      fittedAt: now,
      fittedBy: actor.personId,
      job,
    });
    await em.flush();
    await keepFixing(context, job, weight, fixing.value);
    const at = { jobId: job.id, personId: actor.personId, now, step: `fit weight ${weight.id}` };
    recordCautions(em, at, ['SAF-01', 'SAF-03', 'SAF-06'], input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      after: {
        job: job.number,
        plane: plane.name,
        ...input,
        photo: fixing.value.photoName,
        angleDeg,
      },
    });
    return ok({ weightId: weight.id, angleDeg });
  },
);

/** Zone D: a trial weight can raise it further, so an engineer decides (lower speed, or the book). */
async function needsConsent(
  em: EntityManager,
  loaded: LoadedJob,
  { purpose, consent }: Input,
  role: Role,
): Promise<Result<never> | null> {
  if (purpose !== 'trial' || consent !== '' || allows(role, 'balanceJob:override')) return null;
  if (!baseInZoneD(loaded, await limitsOf(em, loaded.job.machine.id))) return null;
  return fail(
    'zone-d',
    'The base is in zone D, and a trial weight can raise it. Name the engineer who agrees; a lower speed or the coefficient book may do without it.',
    'consent',
  );
}

function answerFor({ answers }: LoadedJob, { purpose }: Input): number | null {
  return purpose === 'correction' ? (answers.at(-1)?.number ?? null) : null;
}

function outOfOrder(loaded: LoadedJob, input: Input): Result<never> | null {
  const { step } = loaded;
  if (step.step === 'closed') return fail('closed', 'This job is closed. Open a new one.');
  if (!loaded.planes.some((plane) => plane.id === input.planeId))
    return notFound('plane of this job');
  if (input.purpose === 'trial') return trialOutOfOrder(loaded, input.planeId);
  if (step.step === 'fit correction') return null;
  return fail('out-of-order', 'Accept an answer first; then record what was really fitted.');
}

/** Fitted twice at one place is possible; pressed twice is likelier, and a rotor is not guessed about. */
function recordedAgain(
  { weights }: LoadedJob,
  { plane, angleDeg }: { plane: Plane; angleDeg: number },
  { massG, radiusMm, purpose }: Input,
): Result<never> | null {
  const same = weights.some(
    (weight) =>
      weight.endedAt === null &&
      weight.purpose === purpose &&
      weight.plane.id === plane.id &&
      weight.massG === massG &&
      weight.radiusMm === radiusMm &&
      weight.angleDeg === angleDeg,
  );
  if (!same) return null;
  return fail(
    'recorded-already',
    `${massG} g at this place in plane ${plane.name} are recorded already. If two such weights hang there, record them as one: take the first off in the ledger and enter both masses together.`,
    'massG',
  );
}

function trialOutOfOrder({ step, planes }: LoadedJob, planeId: number): Result<never> | null {
  if (step.step !== 'fit trial')
    return fail(
      'out-of-order',
      'No trial weight is due now. Follow the next step on the run sheet.',
    );
  if (step.planeId === planeId) return null;
  const due = planes.find((plane) => plane.id === step.planeId);
  return fail('other-plane', `The next trial weight goes in plane ${due?.name ?? ''}.`, 'planeId');
}
