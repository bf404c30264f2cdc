import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import type { EnteredVector } from '@/entities/balance-job';
import { OneXVector } from '@/entities/measured-record';
import { convertOneX } from '@/lib/domain/balance-job/convert-one-x';
import { fail, ok, type Result } from '@/lib/domain/result';
import { lagDeg } from '@/lib/domain/units';
import type { recordRunInput } from '@/lib/schemas/balance-job-input';
import type { LoadedJob } from './load-job';

type Input = z.output<typeof recordRunInput>;
type TypedVector = Input['vectors'][number];

export type JobVector = {
  pointId: number;
  amplitude: number;
  lagDeg: number;
  overall: number | null;
  entered: EnteredVector | null;
  recordId: number | null;
};

/** The readings of a run in the job's unit as lag: one per point of the job, no more and no fewer. */
export async function jobVectors(
  em: EntityManager,
  loaded: LoadedJob,
  input: Input,
): Promise<Result<JobVector[]>> {
  const vectors: JobVector[] = [];
  for (const point of loaded.points) {
    const index = input.vectors.findIndex((vector) => vector.pointId === point.id);
    const typed = input.vectors[index];
    if (!typed)
      return fail(
        'missing-point',
        `The reading at ${point.label} is missing. Every run reads every point.`,
      );
    const vector =
      typed.recordId === null
        ? fromTyped(loaded, input, typed)
        : await fromRecord(em, loaded, typed);
    if (!vector.ok) return { ok: false, failure: placed(vector.failure, index) };
    vectors.push(vector.value);
  }
  if (input.vectors.length !== loaded.points.length)
    return fail('extra-point', 'A reading belongs to no point of this job. Reload the page.');
  return ok(vectors);
}

function placed(failure: { code: string; message: string; field?: string }, index: number) {
  return { ...failure, field: `vectors.${index}.${failure.field ?? 'amplitude'}` };
}

function fromTyped(loaded: LoadedJob, input: Input, typed: TypedVector): Result<JobVector> {
  const { job } = loaded;
  const amplitude = convertOneX(typed.amplitude, input.unit, job.unit);
  if (!amplitude.ok) return amplitude;
  const lag = job.phaseSense === 'lag' ? typed.phaseDeg : 360 - typed.phaseDeg;
  return ok({
    pointId: typed.pointId,
    amplitude: amplitude.value,
    lagDeg: lagDeg(lag),
    overall: typed.overall,
    entered: {
      amplitude: typed.amplitude,
      unit: input.unit,
      phaseDeg: typed.phaseDeg,
      phaseSense: job.phaseSense,
    },
    recordId: null,
  });
}

async function fromRecord(
  em: EntityManager,
  loaded: LoadedJob,
  typed: TypedVector,
): Promise<Result<JobVector>> {
  const vector = await em.findOne(OneXVector, {
    record: typed.recordId,
    point: typed.pointId,
    status: 'kept',
  });
  if (!vector)
    return fail('no-vector', 'This record has no kept 1x vector at this point.', 'recordId');
  const stale = notOfThisRun(loaded, vector);
  if (stale) return stale;
  const lag = vector.lagDeg;
  if (lag === null || lag === undefined)
    return fail('no-phase', 'This record had no tacho, so it has a size but no phase.', 'recordId');
  if (vector.unit !== loaded.job.unit)
    return fail(
      'unit',
      `This record is in ${vector.unit}, the job in ${loaded.job.unit}.`,
      'recordId',
    );
  return ok({
    pointId: typed.pointId,
    amplitude: vector.amplitude,
    lagDeg: lag,
    overall: typed.overall,
    entered: null,
    recordId: typed.recordId,
  });
}

/** A record shows what hung on the rotor when it was taken, and belongs to one run only. */
function notOfThisRun(loaded: LoadedJob, vector: OneXVector): Result<never> | null {
  if (vector.takenAt < rotorAsItIsSince(loaded))
    return fail(
      'older-than-weights',
      'This record was taken before the weights on the rotor last changed, so it does not show them. Take a new one.',
      'recordId',
    );
  const used = loaded.runs.find(
    ({ run, vectors }) =>
      run.state !== 'lined through' &&
      vectors.some(({ record }) => record?.id === vector.record.id),
  );
  if (!used) return null;
  return fail(
    'used',
    `Run ${used.run.number} has its reading from this record already. Every run needs its own.`,
    'recordId',
  );
}

const DAY_MS = 86_400_000;

/** Since when the rotor carries what it carries now: the last weight on or off; a day before the job. */
export function rotorAsItIsSince({ job, weights, removed }: LoadedJob): Date {
  const changes = [...weights, ...removed].flatMap(({ fittedAt, endedAt }) => [
    fittedAt,
    endedAt ?? fittedAt,
  ]);
  return changes.reduce(
    (latest, at) => (at > latest ? at : latest),
    new Date(job.openedAt.getTime() - DAY_MS),
  );
}
