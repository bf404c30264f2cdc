import 'server-only';
import type { WeightOnRotor } from '@/entities/balance-job';
import { rotorDeg } from '@/lib/domain/units';
import type { LoadedJob } from './load-job';

/** What has changed on the rotor since the job began: its own weights, and older ones it took off. */
export function changedOnRotor({ weights, removed }: Changes): WeightOnRotor[] {
  const own = weights
    .filter(({ endedAt }) => endedAt === null)
    .map(({ id, plane, massG, radiusMm, angleDeg }) => ({
      weightId: id,
      planeId: plane.id,
      massG,
      radiusMm,
      angleDeg,
    }));
  const gone = removed.map(({ id, plane, massG, radiusMm, angleDeg }) => ({
    weightId: id,
    planeId: plane.id,
    massG,
    radiusMm,
    angleDeg: rotorDeg(angleDeg + 180),
    takenOff: true as const,
  }));
  return [...own, ...gone];
}

type Changes = Pick<LoadedJob, 'weights' | 'removed'>;
