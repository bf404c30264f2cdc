import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { Plane, Position } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { placeOfWeight } from '@/lib/domain/balance-job/place-of-weight';
import { fail, ok, type Result } from '@/lib/domain/result';
import { fitWeightInput } from '@/lib/schemas/balance-job-input';
import { loadJob, type LoadedJob } from '../balance-job/load-job';
import { recordCautions } from '../balance-job/record-cautions';
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
    const place = await resolvePlace(em, input);
    if (!place.ok) return place;
    const { plane, position, angleDeg } = place.value;
    const full = await roomFailure(em, plane, position, input.massG);
    if (full) return full;
    const weight = em.create(Weight, {
      rotor: job.rotor,
      plane,
      position,
      angleDeg,
      radiusMm: input.radiusMm,
      massG: input.massG,
      massSource: input.massSource,
      purpose: input.purpose,
      answerNumber: input.purpose === 'correction' ? (loaded.answers.at(-1)?.number ?? null) : null,
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
    const at = { jobId: job.id, personId: actor.personId, now, step: `fit weight ${weight.id}` };
    recordCautions(em, at, ['SAF-01', 'SAF-03', 'SAF-06'], input.namedPerson);
    audit({
      siteId: job.site.id,
      entity: 'Weight',
      entityId: weight.id,
      after: { job: job.number, plane: plane.name, ...input, angleDeg },
    });
    return ok({ weightId: weight.id, angleDeg });
  },
);

function outOfOrder(loaded: LoadedJob, input: Input): Result<never> | null {
  const { step } = loaded;
  if (step.step === 'closed') return fail('closed', 'This job is closed. Open a new one.');
  if (!loaded.planes.some((plane) => plane.id === input.planeId))
    return notFound('plane of this job');
  if (input.purpose === 'trial') return trialOutOfOrder(loaded, input.planeId);
  if (step.step === 'fit correction') {
    if (step.planeIds.includes(input.planeId)) return null;
    return fail(
      'fitted',
      'A weight for this answer is already recorded in this plane. Take it off in the ledger first if it was moved.',
    );
  }
  return fail('out-of-order', 'Accept an answer first; then record what was really fitted.');
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

async function resolvePlace(em: EntityManager, input: Input) {
  const plane = await em.findOneOrFail(Plane, { id: input.planeId });
  const position =
    input.positionId === null
      ? null
      : await em.findOne(Position, { id: input.positionId, plane: plane.id });
  if (input.positionId !== null && !position)
    return fail('other-plane', 'This position is not in that plane.', 'positionId');
  if (plane.kind === 'fixed positions' && !position)
    return fail('input', `Plane ${plane.name} has fixed positions: choose one.`, 'positionId');
  const angle = placeOfWeight({ ...input, position });
  return angle.ok ? ok({ plane, position, angleDeg: angle.value }) : angle;
}
