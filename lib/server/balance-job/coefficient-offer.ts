import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Coefficient } from '@/entities/answer';
import {
  reusableCoefficients,
  type ReusableBook,
} from '@/lib/domain/balancing/reusable-coefficients';
import { fail, type Result } from '@/lib/domain/result';
import type { LoadedJob } from './load-job';

/**
 * What the coefficient book offers a job instead of trial runs: estimates of signed jobs on this rotor under
 * the same set-up, in the job's unit, at the speed of its base runs.
 */
export async function coefficientOffer(
  em: EntityManager,
  { job, planes, points, runs }: LoadedJob,
): Promise<Result<ReusableBook>> {
  const base = runs.filter(({ run }) => run.purpose === 'base' && run.state === 'kept');
  if (base.length === 0) return fail('no-base', 'Record the base run first.');
  const estimates = await em.find(Coefficient, {
    rotor: job.rotor.id,
    setup: job.setup.id,
    unit: job.unit,
    plane: { $in: planes.map(({ id }) => id) },
    point: { $in: points.map(({ id }) => id) },
    job: { state: 'signed', id: { $ne: job.id } },
  });
  return reusableCoefficients(
    estimates.map(({ job: { id }, plane, point, speedRpm, rePerGmm, imPerGmm, source }) => ({
      jobId: id,
      planeId: plane.id,
      pointId: point.id,
      speedRpm,
      rePerGmm,
      imPerGmm,
      source,
    })),
    {
      planes,
      points: points.map(({ id, label }) => ({ id, name: label })),
      speedRpm: base.reduce((total, { run }) => total + run.speedRpm, 0) / base.length,
    },
  );
}
