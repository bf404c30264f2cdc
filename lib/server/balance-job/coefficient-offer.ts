import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import { Coefficient } from '@/entities/answer';
import type { Setup } from '@/entities/setup';
import { convertCoefficient, type SetUpPlaces } from '@/lib/domain/balancing/convert-coefficient';
import {
  reusableCoefficients,
  type BookEstimate,
  type ReusableBook,
} from '@/lib/domain/balancing/reusable-coefficients';
import { fail, type Result } from '@/lib/domain/result';
import type { LoadedJob } from './load-job';

/**
 * What the coefficient book offers a job instead of trial runs: estimates of signed jobs on this rotor under
 * the same set-up (or one that converts to it), in the job's unit, at the speed of its base runs.
 */
export async function coefficientOffer(
  em: EntityManager,
  { job, planes, points, runs }: LoadedJob,
): Promise<Result<ReusableBook>> {
  const base = runs.filter(({ run }) => run.purpose === 'base' && run.state === 'kept');
  if (base.length === 0) return fail('no-base', 'Record the base run first.');
  const estimates = await em.find(
    Coefficient,
    {
      rotor: job.rotor.id,
      setup: { machine: job.machine.id },
      unit: job.unit,
      plane: { $in: planes.map(({ id }) => id) },
      point: { $in: points.map(({ id }) => id) },
      job: { state: 'signed', id: { $ne: job.id } },
    },
    { populate: ['setup', 'point'] },
  );
  return reusableCoefficients(
    estimates.flatMap((estimate) => underSetUp(estimate, job.setup.$)),
    {
      planes,
      points: points.map(({ id, label }) => ({ id, name: label })),
      speedRpm: base.reduce((total, { run }) => total + run.speedRpm, 0) / base.length,
    },
  );
}

/** An estimate under the set-up of the job: converted where only tacho or polarity differ, else left out. */
function underSetUp(
  estimate: Loaded<Coefficient, 'setup' | 'point'>,
  setup: Setup,
): BookEstimate[] {
  const { job, plane, point, speedRpm, rePerGmm, imPerGmm, source } = estimate;
  const { label } = point.$;
  const known = convertCoefficient(
    { re: rePerGmm, im: imPerGmm },
    placesOf(estimate.setup.$, label),
    placesOf(setup, label),
  );
  if (!known.ok) return [];
  const { re, im } = known.value.coefficient;
  const ids = { jobId: job.id, planeId: plane.id, pointId: point.id };
  const { converted } = known.value;
  return [{ ...ids, speedRpm, rePerGmm: re, imPerGmm: im, source, converted }];
}

function placesOf(setup: Setup, pointLabel: string): SetUpPlaces {
  const { markDescription: mark, tachoDeg, tachoEdge, rotationFromDriveEnd, sensorPlaces } = setup;
  const sensor = sensorPlaces.find((place) => place.pointLabel === pointLabel) ?? null;
  return { mark, tachoDeg, tachoEdge, rotationFromDriveEnd, sensor };
}
