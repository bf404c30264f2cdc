import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { Plane } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { allows, type Role } from '@/lib/domain/access/permissions';
import { centrifugalForceN, weightN } from '@/lib/domain/balancing/centrifugal-force';
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

/** Share of the static load from which a trial weight is asked about (practice). */
const HEAVY_SHARE = 0.2;

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
    const place = await resolvePlace(em, input);
    if (!place.ok) return place;
    const { plane, position, angleDeg } = place.value;
    const full =
      recordedAgain(loaded, place.value, input) ??
      (await roomFailure(em, plane, position, input.massG)) ??
      (await needsConsent(em, loaded, input, actor.role));
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
  input: Input,
  role: Role,
): Promise<Result<never> | null> {
  const { purpose, consent } = input;
  if (purpose !== 'trial' || consent !== '') return null;
  const heavy = heavyTrial(loaded, input);
  if (heavy) return heavy;
  if (allows(role, 'balanceJob:override')) return null;
  if (!baseInZoneD(loaded, await limitsOf(em, loaded.job.machine.id))) return null;
  return fail(
    'zone-d',
    'The base is in zone D, and a trial weight can raise it. Name the engineer who agrees; a lower speed or the coefficient book may do without it.',
    'consent',
  );
}

/** Twice the usual pull of a trial weight is more often a slip of the pen than a wish. */
function heavyTrial({ job, planes }: LoadedJob, { massG, radiusMm }: Input): Result<never> | null {
  const massKg = job.rotor.$.massKg;
  if (!massKg) return null;
  const speedRpm = job.machine.$.nominalSpeedRpm;
  const loadN = weightN(massKg) / (planes.length > 1 ? 2 : 1);
  const forceN = centrifugalForceN(massG * radiusMm, speedRpm);
  if (forceN <= HEAVY_SHARE * loadN) return null;
  return fail(
    'trial-heavy',
    `${massG} g at ${radiusMm} mm pull ${forceN.toFixed(0)} N at ${speedRpm} r/min, ${((100 * forceN) / loadN).toFixed(0)} % of the load they rest on; 10 % is usual for a trial. Weigh it again. If it is right, name the engineer who agrees.`,
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
